import { sum, type Exact } from '../../money/exact.ts';
import {
  EXTREME_PH,
  EYE_LIMITS,
  INGREDIENT_LIMITS,
  NON_ADDITIVE_LIMITS,
  RELEVANT_FROM,
  SKIN_LIMITS,
  type LimitedHazard,
} from './mixture-limits.ts';
import { specificClass } from './specific-limits.ts';

/** 1 corrosive or damaging, 2 irritant, null not classified from the data given. */
export type IrritationCategory = 1 | 2 | null;

export interface MixtureIngredient {
  /** Percent by weight in the mixture; from the upper end of the data sheet's range. */
  percent: Exact;
  skin: IrritationCategory;
  eye: IrritationCategory;
  /** Measured pH of the ingredient, null where it is not known. */
  ph?: number | null;
  /** False for a corrosive or irritant to which adding up may not apply, as the data sheet says. */
  isAdditive?: boolean;
  /** Known by name, its own limits count too where they are stricter. */
  substance?: string;
}

export interface IrritationClass {
  skin: IrritationCategory;
  eye: IrritationCategory;
}

/**
 * Skin and eye class by the sums of Tables A.2.3 and A.3.3. Ingredients under 1 % stay in the sums: that is the careful side.
 * An ingredient that is both skin 1 and eye 1 counts once (footnote a, from memory).
 */
export function classBySums(ingredients: readonly MixtureIngredient[]): IrritationClass {
  const total = (counts: (item: MixtureIngredient) => boolean) =>
    sum(ingredients.filter(counts).map((item) => item.percent));
  const skin1 = total((item) => item.skin === 1);
  const skin2 = total((item) => item.skin === 2);
  const eye1 = total((item) => item.skin === 1 || item.eye === 1);
  const eye2 = total((item) => item.skin !== 1 && item.eye === 2);
  return {
    skin: bySums(skin1, skin2, SKIN_LIMITS.corrosive, SKIN_LIMITS.corrosiveToIrritant, SKIN_LIMITS.irritant),
    eye: bySums(eye1, eye2, EYE_LIMITS.damaging, EYE_LIMITS.damagingToIrritant, EYE_LIMITS.irritant),
  };
}

function bySums(first: Exact, second: Exact, to1: Exact, to2: Exact, weighted: Exact): IrritationCategory {
  if (first.gte(to1)) return 1;
  return first.gte(to2) || first.mul(10).add(second).gte(weighted) ? 2 : null;
}

/**
 * Skin and eye class of a mixture: the gravest of the sums, of ingredients that do not add up, of substances' own limits and
 * of an extreme measured pH. An estimate from the data entered; the supplier's sheet and a competent person decide.
 * @param mixturePh measured, never computed; null where it was not measured
 * @param hasBetterData true where test data overrule the pH (buffer reserve)
 */
export function classOfMixture(
  ingredients: readonly MixtureIngredient[],
  mixturePh: number | null = null,
  hasBetterData = false,
): IrritationClass {
  const found = [classBySums(ingredients), ...ingredients.map(classAlone), ...ingredients.map(ownLimits)];
  if (mixturePh !== null && isExtremePh(mixturePh) && !hasBetterData) found.push({ skin: 1, eye: 1 });
  return { skin: gravest(found.map((item) => item.skin)), eye: gravest(found.map((item) => item.eye)) };
}

/** pH at most 2 or at least 11.5. */
export function isExtremePh(ph: number): boolean {
  return ph <= EXTREME_PH.low || ph >= EXTREME_PH.high;
}

/** True where the ingredient has to be considered (A.1.3.3(a)). */
export function isRelevant(ingredient: MixtureIngredient): boolean {
  return (ingredient.skin !== null || ingredient.eye !== null) && ingredient.percent.gte(RELEVANT_FROM);
}

/** Same category as the ingredient's, or null below its limit. */
export function reachesLimit(hazard: LimitedHazard, percent: Exact): boolean {
  return percent.gte(INGREDIENT_LIMITS[hazard].from);
}

/** Tables A.2.4 and A.3.4: 1 % of a strong acid or base is enough for Category 1, 3 % of another irritant for 2. */
function classAlone({ percent, skin, eye, ph, isAdditive = true }: MixtureIngredient): IrritationClass {
  const isStrong = ph !== undefined && ph !== null && isExtremePh(ph);
  const isCorrosive = skin === 1 || eye === 1;
  if (isStrong || (isCorrosive && !isAdditive)) {
    if (percent.lt(NON_ADDITIVE_LIMITS.corrosive)) return { skin: null, eye: null };
    return { skin: isStrong || skin === 1 ? 1 : null, eye: 1 };
  }
  if (isAdditive || percent.lt(NON_ADDITIVE_LIMITS.irritant)) return { skin: null, eye: null };
  return { skin: skin === 2 ? 2 : null, eye: eye === 2 ? 2 : null };
}

function ownLimits({ percent, substance }: MixtureIngredient): IrritationClass {
  const own = substance === undefined ? null : specificClass(substance, percent);
  return { skin: own?.skin ?? null, eye: own?.eye ?? null };
}

function gravest(categories: readonly IrritationCategory[]): IrritationCategory {
  if (categories.includes(1)) return 1;
  return categories.includes(2) ? 2 : null;
}
