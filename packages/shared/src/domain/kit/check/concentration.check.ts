import { exact, ONE, type Exact } from '../../money/exact.ts';
import { chartRatio } from '../dilution/chart-ratio.ts';
import { dilutedGramsPer100Ml, dilutedPercent, dilutedWeightPercent, ppm } from '../dilution/concentration.ts';
import { MixError, ratioFromAmounts, totalParts } from '../dilution/dilution-ratio.ts';
import { inUnit, plainNumber, type CheckResult, type ScenarioInputs } from './scenario-inputs.ts';

/** The household bleach that a published page figures with, percent. */
const HOUSEHOLD_BLEACH = exact('5.25');

/** Percent and parts per million after dilution; null where the inputs are about something else. */
export function concentrations(inputs: ScenarioInputs): CheckResult | null {
  if (inputs.has('stockPercentWW')) return byWeight(inputs);
  if (inputs.has('activePercent')) return chartPpm(inputs);
  if (inputs.has('stockPercentRange')) return range(inputs);
  const added = inputs.volume('add', 'addStock');
  const filled = inputs.volume('fillTo');
  const water = inputs.volume('toWater');
  if (added && filled) return filledUp(inputs, inUnit(added, 'mL'), inUnit(filled, 'mL'));
  if (added && water) {
    const ratio = ratioFromAmounts(inUnit(added, 'mL'), inUnit(water, 'mL'));
    return {
      addFlOz: plainNumber(inUnit(added, 'US fl oz')),
      ratio: plainNumber(ratio.waterParts),
      ...(inputs.has('stockPercent') ? strength(dilutedPercent(inputs.percent('stockPercent'), ratio)) : {}),
    };
  }
  if (!inputs.has('stockPercent')) return null;
  const ratio = inputs.has('ratio')
    ? chartRatio(inputs.text('ratio'))
    : ratioFromAmounts(inputs.amount('partsStock'), inputs.amount('partsWater'));
  return strength(dilutedPercent(inputs.percent('stockPercent'), ratio));
}

function byWeight(inputs: ScenarioInputs): CheckResult {
  const [stock, density] = [inputs.percent('stockPercentWW'), inputs.amount('stockDensity')];
  const ratio = chartRatio(inputs.text('ratio'));
  return {
    percentWW: plainNumber(dilutedWeightPercent(stock, density, ratio)),
    percentWV: plainNumber(dilutedGramsPer100Ml(stock, density, ratio)),
    densityIgnoredPercent: plainNumber(dilutedWeightPercent(stock, ONE, ratio)),
  };
}

/** Some charts divide by N, the water, instead of N + 1, the whole: both figures stand beside each other. */
function chartPpm(inputs: ScenarioInputs): CheckResult {
  const ratio = chartRatio(inputs.text('ratio'));
  const active = inputs.percent('activePercent');
  const whole = ppm(dilutedPercent(active, ratio));
  return {
    ppmExact: plainNumber(whole),
    ppm: plainNumber(whole),
    ...(ratio.waterParts.gt(0) ? { ppmPrintedMethod: plainNumber(ppm(active).div(ratio.waterParts)) } : {}),
  };
}

function range(inputs: ScenarioInputs): CheckResult {
  const ratio = chartRatio(inputs.text('ratio'));
  const ends = inputs.numbers('stockPercentRange');
  const [from, to] = ends;
  if (ends.length !== 2 || !from || !to || from.gt(to))
    throw new MixError('stockPercentRange needs the lower and the upper end.');
  const percents = [dilutedPercent(from, ratio), dilutedPercent(to, ratio)];
  return { ppmRange: percents.map((value) => plainNumber(ppm(value))), percentRange: percents.map(plainNumber) };
}

function filledUp(inputs: ScenarioInputs, added: Exact, filled: Exact): CheckResult {
  if (added.lte(0)) throw new MixError('Without concentrate there is no ratio: add more than 0 of it.');
  if (added.gt(filled)) throw new MixError('There is more concentrate than the bottle holds.');
  const ratio = ratioFromAmounts(added, filled.sub(added));
  return {
    oneIn: plainNumber(totalParts(ratio)),
    ratioExact: plainNumber(ratio.waterParts),
    ppmFrom525Percent: plainNumber(ppm(dilutedPercent(HOUSEHOLD_BLEACH, ratio))),
    ...(inputs.has('stockPercent') ? strength(dilutedPercent(inputs.percent('stockPercent'), ratio)) : {}),
  };
}

function strength(percent: Exact): CheckResult {
  return { percent: plainNumber(percent), ppm: plainNumber(ppm(percent)) };
}
