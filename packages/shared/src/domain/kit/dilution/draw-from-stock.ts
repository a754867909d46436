import { sum, ZERO, type Exact } from '../../money/exact.ts';
import { MixError, type DilutionRatio } from './dilution-ratio.ts';
import { costOfMix, mixToFill, needsMore } from './mix.ts';

export interface Draw {
  concentrate: Exact;
  water: Exact;
  /** What stock lacks; zero where it is enough. */
  short: Exact;
}

/**
 * From a wanted total to what to draw from stock; one unit throughout.
 * @throws {MixError} where the total is not more than zero or the stock is negative
 */
export function drawFor(wantedTotal: Exact, ratio: DilutionRatio, inStock: Exact): Draw {
  if (inStock.lt(0)) throw new MixError('Stock may not be negative: count it again.');
  const { concentrate, water } = mixToFill(wantedTotal, ratio);
  return { concentrate, water, short: concentrate.gt(inStock) ? concentrate.sub(inStock) : ZERO };
}

export interface JobUse {
  /** Finished mix, in the unit that the cost is for. */
  amount: Exact;
  ratio: DilutionRatio;
  /** Dollars for one unit of concentrate. */
  costOfConcentrate: Exact;
}

/** Dollars of chemistry that a job uses, exactly; rounded only where it is shown. */
export function costOfJob(uses: readonly JobUse[]): Exact {
  return sum(
    uses.map(({ amount, ratio, costOfConcentrate }) => {
      needsMore(amount, 'What a job uses');
      return amount.mul(costOfMix(costOfConcentrate, ratio));
    }),
  );
}
