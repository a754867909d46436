import { exact, ONE, type Exact } from '../../money/exact.ts';
import { concentrateShare, MixError, type DilutionRatio } from './dilution-ratio.ts';

/** Percent of an active after dilution, by volume (or with densities left out). */
export function dilutedPercent(stockPercent: Exact, ratio: DilutionRatio): Exact {
  return percent(stockPercent).mul(concentrateShare(ratio));
}

/** Parts per million: percent x 10,000. */
export function ppm(percentActive: Exact): Exact {
  return percentActive.mul(10_000);
}

/**
 * Percent by weight after dilution: w x d / (d + N). Leaving the density out understates it where the stock is heavier than
 * water, and can lower a hazard class.
 * @param stockPercent percent by weight in the stock, from the upper end of the data sheet's range
 * @param density of the stock in grams per milliliter (data sheet, section 9)
 * @throws {MixError} for a percentage out of 0 to 100 or a density that is not more than zero
 */
export function dilutedWeightPercent(stockPercent: Exact, density: Exact, ratio: DilutionRatio): Exact {
  needsDensity(density);
  return percent(stockPercent).mul(density).div(density.add(ratio.waterParts));
}

/** Grams of the active in 100 mL of the mix. */
export function dilutedGramsPer100Ml(stockPercent: Exact, density: Exact, ratio: DilutionRatio): Exact {
  needsDensity(density);
  return percent(stockPercent).mul(density).mul(concentrateShare(ratio));
}

/**
 * The pH of a strong, unbuffered acid or base after dilution: the most that water alone can change. It shows how little
 * that is (1.04 at 10:1); a bottle's pH is measured, never computed.
 * @param stockPh 0 to 14
 */
export function unbufferedPh(stockPh: number, ratio: DilutionRatio): number {
  const shift = Math.log10(ratio.waterParts.add(ONE).valueOf());
  return stockPh >= 7 ? Math.max(7, stockPh - shift) : Math.min(7, stockPh + shift);
}

function percent(value: Exact): Exact {
  if (value.lt(0) || value.gt(exact(100))) throw new MixError('A percentage is between 0 and 100.');
  return value;
}

function needsDensity(density: Exact): void {
  if (density.lte(0)) throw new MixError('A density is more than 0 g/mL: read it from the data sheet, section 9.');
}
