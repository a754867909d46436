import type { Exact } from '../../money/exact.ts';
import { concentrateShare, MixError, totalParts, type DilutionRatio } from './dilution-ratio.ts';

/** Amounts of one mix; all in the unit that was given. */
export interface Mix {
  concentrate: Exact;
  water: Exact;
  total: Exact;
}

/**
 * Fill to a volume: what a bottle of that size takes.
 * @throws {MixError} where the size is not more than zero
 */
export function mixToFill(total: Exact, ratio: DilutionRatio): Mix {
  needsMore(total, 'The size of the mix');
  const concentrate = total.mul(concentrateShare(ratio));
  return { concentrate, water: total.sub(concentrate), total };
}

/**
 * Add to a full volume of water, as some charts do: the mix comes out larger than the water.
 * @throws {MixError} where the water is not more than zero, or the ratio is straight
 */
export function mixWithWater(water: Exact, ratio: DilutionRatio): Mix {
  needsMore(water, 'The water');
  if (ratio.waterParts.equals(0)) throw new MixError('A straight product takes no water.');
  const concentrate = water.div(ratio.waterParts);
  return { concentrate, water, total: water.add(concentrate) };
}

/**
 * What an amount of concentrate makes: a gallon at 10:1 makes 11 gallons.
 * @throws {MixError} where the concentrate is not more than zero
 */
export function mixFromConcentrate(concentrate: Exact, ratio: DilutionRatio): Mix {
  needsMore(concentrate, 'The concentrate');
  return { concentrate, water: concentrate.mul(ratio.waterParts), total: concentrate.mul(totalParts(ratio)) };
}

/**
 * Cost of one unit of the finished mix, from the cost of one unit of concentrate; water costs nothing here.
 * @throws {MixError} where the cost is negative
 */
export function costOfMix(costOfConcentrate: Exact, ratio: DilutionRatio): Exact {
  if (costOfConcentrate.lt(0)) throw new MixError('A cost may not be negative.');
  return costOfConcentrate.mul(concentrateShare(ratio));
}

export function needsMore(amount: Exact, name: string): void {
  if (amount.lte(0)) throw new MixError(`${name} must be more than 0.`);
}
