import { exact, ONE, sum, ZERO, type Exact } from '../../money/exact.ts';
import { chartRatio } from '../dilution/chart-ratio.ts';
import { dilutedWeightPercent } from '../dilution/concentration.ts';
import {
  acuteCategory,
  convertedEstimate,
  estimateAfterDilution,
  estimateOfMixture,
  type AcuteCategory,
  type AcuteRoute,
  type ToxicIngredient,
} from '../hazards/acute-toxicity.ts';
import { plainNumber, ScenarioError, type CheckResult, type ScenarioInputs } from './scenario-inputs.ts';

const ROUTES: Record<string, AcuteRoute> = {
  oral: 'oral',
  dermal: 'dermal',
  gas: 'gases',
  gases: 'gases',
  vapor: 'vapors',
  vapors: 'vapors',
  dust: 'dusts/mists',
  mist: 'dusts/mists',
  dusts: 'dusts/mists',
  mists: 'dusts/mists',
  'dusts/mists': 'dusts/mists',
  'dust/mist': 'dusts/mists',
};

const CONCENTRATE = {
  concentrateAteOral: 'oral',
  concentrateAteDermal: 'dermal',
  concentrateAteGases: 'gases',
  concentrateAteVapors: 'vapors',
  concentrateAteMists: 'dusts/mists',
} as const satisfies Record<string, AcuteRoute>;

/** The mixture's acute toxicity estimate and category; null where the inputs are about something else. */
export function acuteToxicity(inputs: ScenarioInputs): CheckResult | null {
  for (const [name, route] of Object.entries(CONCENTRATE)) {
    if (inputs.has(name)) return fields(route, estimateAfterDilution(estimate(inputs, name), share(inputs)));
  }
  if (!inputs.has('route')) return null;
  const route = routeOf(inputs);
  const ingredients = inputs.objects('ingredients').map((item) => ingredient(route, item));
  const unknown = inputs.has('unknownPct') ? inputs.percent('unknownPct') : ZERO;
  if (
    sum(ingredients.map((item) => item.percent))
      .add(unknown)
      .gt(100)
  )
    throw new ScenarioError('The percentages add up to more than 100.');
  return fields(route, estimateOfMixture(ingredients, unknown));
}

function routeOf(inputs: ScenarioInputs): AcuteRoute {
  const text = inputs
    .text('route')
    .trim()
    .toLowerCase()
    .replace(/^inhalation[\s,:(]*/, '')
    .replace(/\)$/, '');
  const route = Object.hasOwn(ROUTES, text) ? ROUTES[text] : undefined;
  if (route === undefined) throw inputs.problem('route', 'is none of oral, dermal, gases, vapors and dusts/mists');
  return route;
}

function ingredient(route: AcuteRoute, item: ScenarioInputs): ToxicIngredient {
  const percent = item.percent(item.firstOf('pct', 'percent') ?? 'pct');
  if (item.has('ate') || !item.has('category')) return { percent, ate: estimate(item, 'ate') };
  const category = plainNumber(item.number('category'));
  if (![1, 2, 3, 4].includes(category)) throw item.problem('category', 'is none of 1, 2, 3 and 4');
  return { percent, ate: convertedEstimate(route, category as AcuteCategory) };
}

function estimate(inputs: ScenarioInputs, name: string): Exact {
  const ate = inputs.amount(name);
  if (ate.equals(0)) throw inputs.problem(name, 'must be more than 0');
  return ate;
}

/** Share of the concentrate by weight, 0 to 1: given, or from the ratio and the density. */
function share(inputs: ScenarioInputs): Exact {
  if (!inputs.has('fractionWW')) {
    const density = inputs.has('stockDensity') ? inputs.amount('stockDensity') : ONE;
    return dilutedWeightPercent(exact(100), density, chartRatio(inputs.text('ratio'))).div(100);
  }
  const fraction = inputs.amount('fractionWW');
  if (fraction.equals(0) || fraction.gt(1)) throw inputs.problem('fractionWW', 'is more than 0 and at most 1');
  return fraction;
}

function fields(route: AcuteRoute, ateMix: Exact | null): CheckResult {
  return {
    ateMix: ateMix === null ? null : plainNumber(ateMix),
    category: acuteCategory(route, ateMix) ?? 'not classified',
  };
}
