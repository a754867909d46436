import type { Exact } from '../../money/exact.ts';
import { dilutedWeightPercent } from '../dilution/concentration.ts';
import type { DilutionRatio } from '../dilution/dilution-ratio.ts';
import { classOfMixture, type IrritationClass, type MixtureIngredient } from './mixture-class.ts';

export interface DilutedClass extends IrritationClass {
  /** Percent by weight of each ingredient in the bottle, in the given order. */
  percents: Exact[];
}

export const ESTIMATE_CAUTION =
  'Estimate from the data entered. It does not replace the supplier’s sheet or a competent person.';

/**
 * Skin and eye class of a bottle mixed from a concentrate. Keeping the concentrate's label is always allowed and is the safe
 * default; this stands beside it as an aid. Flash point and corrosion of metals do not follow from percentages.
 * @param ingredients as they are in the concentrate, percent by weight
 * @param density of the concentrate, g/mL
 * @param measuredPh of the mixed bottle; null where it was not measured
 */
export function classOfDilution(
  ingredients: readonly MixtureIngredient[],
  density: Exact,
  ratio: DilutionRatio,
  measuredPh: number | null = null,
): DilutedClass {
  const percents = ingredients.map((item) => dilutedWeightPercent(item.percent, density, ratio));

  const inBottle = ingredients.map((item, index) => ({ ...item, percent: percents[index] ?? item.percent }));
  return { ...classOfMixture(inBottle, measuredPh), percents };
}
