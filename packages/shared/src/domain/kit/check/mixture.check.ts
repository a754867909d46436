import { exact, ONE, ZERO, sum, type Exact } from '../../money/exact.ts';
import { chartRatio } from '../dilution/chart-ratio.ts';
import { unbufferedPh } from '../dilution/concentration.ts';
import { classOfDilution } from '../hazards/diluted-class.ts';
import {
  classBySums,
  classOfMixture,
  isExtremePh,
  isRelevant,
  type IrritationCategory,
  type MixtureIngredient,
} from '../hazards/mixture-class.ts';
import { acuteToxicity } from './acute-toxicity.check.ts';
import { readHazardClass } from './hazard-class-words.ts';
import { plainNumber, ScenarioError, type CheckResult, type ScenarioInputs } from './scenario-inputs.ts';

/**
 * Class of a mixture from its ingredients, from sums, from a measured pH, or of a bottle from its concentrate.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkMixture(inputs: ScenarioInputs): CheckResult {
  const toxicity = acuteToxicity(inputs);
  if (toxicity !== null) return toxicity;
  if (inputs.has('stockPH')) return dilutedPh(inputs);
  if (inputs.has('stockPercentWW')) return bottle(inputs);
  if (inputs.has('ingredients')) return mixture(inputs);
  if (SUMS.some((name) => inputs.has(name))) return bySums(inputs);
  const ph = mixturePh(inputs);
  if (ph === null) throw new ScenarioError('The inputs hold no ingredients, no sums and no measured pH.');
  return words(classOfMixture([], ph, inputs.flag('otherData')));
}

const SUMS = ['skinCat1Pct', 'skinCat2Pct', 'eyeCat1Pct', 'eyeCat2Pct'];

function bySums(inputs: ScenarioInputs): CheckResult {
  const one = (name: string, skin: IrritationCategory, eye: IrritationCategory): MixtureIngredient => ({
    percent: inputs.has(name) ? inputs.percent(name) : ZERO,
    skin,
    eye,
  });
  const ingredients = [
    one('skinCat1Pct', 1, 1),
    one('skinCat2Pct', 2, null),
    one('eyeCat1Pct', null, 1),
    one('eyeCat2Pct', null, 2),
  ];
  // One substance may stand in a skin sum and in an eye sum, so that only each of the two has to fit into the whole.
  atMostWhole(ingredients.slice(0, 2).map((item) => item.percent));
  atMostWhole(ingredients.slice(2).map((item) => item.percent));
  return words(classOfMixture(ingredients, mixturePh(inputs), inputs.flag('otherData')));
}

function mixture(inputs: ScenarioInputs): CheckResult {
  const ingredients = inputs.objects('ingredients').map(ingredient);
  atMostWhole(ingredients.map((item) => item.percent));
  const found = classOfMixture(ingredients, mixturePh(inputs), inputs.flag('otherData'));
  const sums = words(classBySums(ingredients));
  return {
    ...words(found),
    skinBySum: sums.skin ?? null,
    eyeBySum: sums.eye ?? null,
    byAdditivityOnly: sums.skin ?? null,
    eyeByAdditivityOnly: sums.eye ?? null,
    relevant: ingredients.some(isRelevant),
  };
}

function ingredient(item: ScenarioInputs): MixtureIngredient {
  const phName = item.firstOf('pH', 'ph', 'PH');
  const classes = Array.isArray(item.raw('class'))
    ? item.texts('class')
    : [item.has('class') ? item.text('class') : ''];
  return {
    percent: item.percent(item.firstOf('pct', 'percent') ?? 'pct'),
    ...readHazardClass(classes.join(';')),
    ph: phName === undefined ? null : phOf(item, phName),
    isAdditive: item.has('additive') ? item.flag('additive') : true,
    ...(item.has('substance') ? { substance: item.text('substance') } : {}),
  };
}

function bottle(inputs: ScenarioInputs): CheckResult {
  const className = inputs.firstOf('ingredientClass', 'class') ?? 'ingredientClass';
  const concentrate: MixtureIngredient = {
    percent: inputs.percent('stockPercentWW'),
    ...readHazardClass(inputs.text(className)),
    ...(inputs.has('substance') ? { substance: inputs.text('substance') } : {}),
  };
  const ratio = chartRatio(inputs.text('ratio'));
  const density = inputs.has('stockDensity') ? inputs.amount('stockDensity') : ONE;
  const found = classOfDilution([concentrate], density, ratio, mixturePh(inputs));
  const ignored = words(classOfDilution([concentrate], ONE, ratio, mixturePh(inputs)));
  return {
    percentWW: plainNumber(found.percents[0] ?? ZERO),
    ...words(found),
    skinIfDensityIgnored: ignored.skin ?? null,
    eyeIfDensityIgnored: ignored.eye ?? null,
  };
}

function dilutedPh(inputs: ScenarioInputs): CheckResult {
  const ph = unbufferedPh(phOf(inputs, 'stockPH'), chartRatio(inputs.text('ratio')));
  return { ph, stillExtreme: isExtremePh(ph) };
}

function mixturePh(inputs: ScenarioInputs): number | null {
  const name = inputs.firstOf('mixturePH', 'measuredPH', 'measuredPh', 'mixturePh');
  return name === undefined ? null : phOf(inputs, name);
}

function phOf(inputs: ScenarioInputs, name: string): number {
  const ph = plainNumber(inputs.number(name));
  // Concentrated acids and bases really read below 0 and above 14.
  if (ph < -2 || ph > 16) throw inputs.problem(name, 'is no pH: it lies between 0 and 14, or a little beyond');
  return ph;
}

function atMostWhole(percents: readonly Exact[]): void {
  if (sum(percents).gt(exact(100))) throw new ScenarioError('The percentages add up to more than 100.');
}

function words(found: { skin: IrritationCategory; eye: IrritationCategory }): { skin: string; eye: string } {
  return { skin: categoryText(found.skin), eye: categoryText(found.eye) };
}

function categoryText(category: IrritationCategory): string {
  return category === null ? 'not classified' : `Category ${category}`;
}
