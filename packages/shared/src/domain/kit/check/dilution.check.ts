import { exact, ONE, type Exact } from '../../money/exact.ts';
import { chartRatio } from '../dilution/chart-ratio.ts';
import {
  concentrateShare,
  MixError,
  ratioFromAmounts,
  ratioOfPercent,
  ratioText,
  totalParts,
  type DilutionRatio,
} from '../dilution/dilution-ratio.ts';
import { costOfMix, mixFromConcentrate, mixToFill, mixWithWater } from '../dilution/mix.ts';
import { concentrations } from './concentration.check.ts';
import { inUnit, plainNumber, type CheckResult, type GivenVolume, type ScenarioInputs } from './scenario-inputs.ts';

/**
 * Amounts, yields, costs and ratios. Ratios are printed ones, in either order: the larger number is the water.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkDilution(inputs: ScenarioInputs): CheckResult {
  const result = concentrations(inputs) ?? (inputs.has('ratio') ? byRatio(inputs) : ratioFound(inputs));
  if (result === null)
    throw new MixError('The inputs hold nothing to work out: give a ratio with a size, or two amounts.');
  return result;
}

function byRatio(inputs: ScenarioInputs): CheckResult {
  const text = inputs.text('ratio');
  if (/\bN\s*:\s*1\b|\b1\s*:\s*N\b/i.test(text))
    return { productFraction: '1/(N+1)', waterFraction: 'N/(N+1)', totalParts: 'N+1' };
  const ratio = chartRatio(text);
  const concentrate = inputs.volume('concentrate', 'product');
  const size = inputs.volume('bottle', 'total', 'finished', 'fillTo', 'readyToUse', 'bucket', 'lance', 'tank');
  if (concentrate !== null && size !== null)
    throw new MixError('Give the size of the mix or the concentrate, not both.');
  const filled = inputs.volume('');
  const water = inputs.volume('toWater', 'water');
  return {
    ratio: ratioText(ratio),
    percentVV: plainNumber(concentrateShare(ratio).mul(100)),
    productFraction: plainNumber(concentrateShare(ratio)),
    waterFraction: plainNumber(ONE.sub(concentrateShare(ratio))),
    totalParts: plainNumber(totalParts(ratio)),
    ...(size ? filledUp(size, ratio) : {}),
    ...(concentrate ? made(concentrate, ratio) : {}),
    ...(filled ? fillAndAdd(filled, ratio) : {}),
    ...(water ? addedTo(water, ratio) : {}),
    ...costs(inputs, ratio, size),
  };
}

function filledUp(size: GivenVolume, ratio: DilutionRatio): CheckResult {
  const { concentrate, water } = mixToFill(size.value, ratio);
  return { ...named('product', { ...size, value: concentrate }), ...named('water', { ...size, value: water }) };
}

function made(given: GivenVolume, ratio: DilutionRatio): CheckResult {
  const { total, water } = mixFromConcentrate(given.value, ratio);
  return { ...named('readyToUse', { ...given, value: total }), ...named('water', { ...given, value: water }) };
}

function addedTo(given: GivenVolume, ratio: DilutionRatio): CheckResult {
  const { concentrate, total } = mixWithWater(given.value, ratio);
  return { ...named('product', { ...given, value: concentrate }), ...named('total', { ...given, value: total }) };
}

/** The two conventions of charts beside each other. */
function fillAndAdd({ value, suffix }: GivenVolume, ratio: DilutionRatio): CheckResult {
  const added = mixWithWater(value, ratio);
  return {
    [`fillTo${suffix}`]: plainNumber(mixToFill(value, ratio).concentrate),
    [`addTo${suffix}`]: plainNumber(added.concentrate),
    [`addToTotal${suffix}`]: plainNumber(added.total),
  };
}

const COSTS = { costPerGal: 'Gal', costPerQt: 'Qt', costPerFlOz: 'FlOz', costPerL: 'L', costPerMl: 'Ml' } as const;

function costs(inputs: ScenarioInputs, ratio: DilutionRatio, size: GivenVolume | null): CheckResult {
  const result: Record<string, number> = {};
  for (const [name, suffix] of Object.entries(COSTS)) {
    if (!inputs.has(name)) continue;
    const ready = costOfMix(inputs.amount(name), ratio);
    result[`costPerReady${suffix}`] = plainNumber(ready);
    if (size)
      result.costPerBottle = plainNumber(ready.mul(inUnit(size, 'mL')).div(inUnit({ value: ONE, suffix }, 'mL')));
  }
  return result;
}

function ratioFound(inputs: ScenarioInputs): CheckResult | null {
  if (inputs.has('rows')) return chart(inputs);
  const percentName = inputs.firstOf('percentVV', 'percent');
  if (percentName !== undefined) return ratioFields(ratioOfPercent(inputs.percent(percentName)));
  if (inputs.has('flOzPerGallonOfWater')) {
    return ratioFields(ratioFromAmounts(inputs.amount('flOzPerGallonOfWater'), exact(128)));
  }
  if (inputs.has('flOz', 'gallonsOfWater')) {
    const gallons = inputs.amount('gallonsOfWater');
    if (gallons.equals(0)) throw inputs.problem('gallonsOfWater', 'must be more than 0');
    const perGallon = inputs.amount('flOz').div(gallons);
    return { flOzPerGallon: plainNumber(perGallon), ...ratioFields(ratioFromAmounts(perGallon, exact(128))) };
  }
  const product = inputs.volume('product', 'concentrate', 'add');
  const water = inputs.volume('toWater', 'water');
  const total = inputs.volume('fillTo', 'total', 'bottle', 'finished');
  if (product === null) return null;
  const poured = inUnit(product, 'mL');
  if (water) return ratioFields(ratioFromAmounts(poured, inUnit(water, 'mL')));
  if (total === null) return null;
  if (poured.gt(inUnit(total, 'mL'))) throw new MixError('There is more concentrate than the bottle holds.');
  return ratioFields(ratioFromAmounts(poured, inUnit(total, 'mL').sub(poured)));
}

/** A chart's column: the exact figure for each printed ratio. */
function chart(inputs: ScenarioInputs): CheckResult {
  const size = inputs.volume('finished', 'total', 'bottle', 'fillTo');
  const water = inputs.volume('toWater', 'water', 'addTo');
  const given = size ?? water;
  if (given === null)
    throw new MixError('A chart needs the size it makes (finishedFlOz) or the water it adds to (waterFlOz).');
  return {
    rows: inputs.texts('rows').map((text) => {
      const mix = size ? mixToFill(given.value, chartRatio(text)) : mixWithWater(given.value, chartRatio(text));
      return { ratio: text, [`exact${given.suffix}`]: plainNumber(mix.concentrate) };
    }),
  };
}

function ratioFields(ratio: DilutionRatio): CheckResult {
  return {
    ratio: ratioText(ratio),
    ratioExact: plainNumber(ratio.waterParts),
    percentVV: plainNumber(concentrateShare(ratio).mul(100)),
  };
}

/** The amount in its own unit, in fluid ounces and in milliliters. */
function named(what: string, given: GivenVolume): CheckResult {
  const at = (value: Exact) => plainNumber(value);
  return {
    [`${what}FlOz`]: at(inUnit(given, 'US fl oz')),
    [`${what}Ml`]: at(inUnit(given, 'mL')),
    [`${what}${given.suffix}`]: at(given.value),
  };
}
