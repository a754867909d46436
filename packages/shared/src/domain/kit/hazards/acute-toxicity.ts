import { exact, ONE, sum, type Exact } from '../../money/exact.ts';

export type AcuteRoute = 'oral' | 'dermal' | 'gases' | 'vapors' | 'dusts/mists';
export type AcuteCategory = 1 | 2 | 3 | 4;

/** Upper limits of Categories 1 to 4, inclusive: mg/kg, ppmV for gases, mg/L for vapors, dusts and mists (Table A.1.1). */
const BANDS = {
  oral: bands('5', '50', '300', '2000'),
  dermal: bands('50', '200', '1000', '2000'),
  gases: bands('100', '500', '2500', '20000'),
  vapors: bands('0.5', '2', '10', '20'),
  'dusts/mists': bands('0.05', '0.5', '1', '5'),
};

/** Point estimates where only the category is known (Table A.1.2). */
const CONVERSION = {
  oral: bands('0.5', '5', '100', '500'),
  dermal: bands('5', '50', '300', '1100'),
  gases: bands('10', '100', '700', '4500'),
  vapors: bands('0.05', '0.5', '3', '11'),
  'dusts/mists': bands('0.005', '0.05', '0.5', '1.5'),
};

/** More than this percent of unknown toxicity changes the formula (A.1.3.6.2.3). */
const UNKNOWN_AT_MOST = exact(10);

export interface ToxicIngredient {
  /** Percent by weight. Kept under 1 % too: some are toxic by skin contact at a fraction of a percent. */
  percent: Exact;
  /** Acute toxicity estimate in the route's unit, more than zero. */
  ate: Exact;
}

/** The point estimate for an ingredient of which only the category is known. */
export function convertedEstimate(route: AcuteRoute, category: AcuteCategory): Exact {
  return CONVERSION[route][category - 1] ?? ONE;
}

/**
 * Acute toxicity estimate of a mixture: 100 / ATEmix = sum of C / ATE (29 CFR 1910.1200 App. A, A.1.3.6.1).
 * @param unknownPercent of ingredients of unknown toxicity; above 10 % the 100 becomes 100 less that
 * @returns null where nothing toxic is in it
 */
export function estimateOfMixture(ingredients: readonly ToxicIngredient[], unknownPercent: Exact): Exact | null {
  const load = sum(ingredients.map(({ percent, ate }) => percent.div(ate)));
  if (load.equals(0)) return null;
  const whole = unknownPercent.gt(UNKNOWN_AT_MOST) ? exact(100).sub(unknownPercent) : exact(100);
  return whole.div(load);
}

/** Water has no toxicity: an estimate grows as the share of the concentrate shrinks. */
export function estimateAfterDilution(concentrate: Exact, shareByWeight: Exact): Exact {
  return concentrate.div(shareByWeight);
}

/** The first band whose upper limit is at least the estimate; null above the last: OSHA has no Category 5. */
export function acuteCategory(route: AcuteRoute, estimate: Exact | null): AcuteCategory | null {
  if (estimate === null) return null;
  const index = BANDS[route].findIndex((limit) => estimate.lte(limit));
  return index < 0 ? null : ((index + 1) as AcuteCategory);
}

function bands(...limits: string[]): Exact[] {
  return limits.map((limit) => exact(limit));
}
