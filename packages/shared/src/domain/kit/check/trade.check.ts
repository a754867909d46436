import type { Exact } from '../../money/exact.ts';
import {
  AEROSOL_CAN,
  AGGREGATE,
  CLASSES_BY_PACKING_GROUP,
  CYLINDER,
  DILUTED_CLASS_9,
  EXCLUDED,
  isTradeClass,
  MOUNTED_TANK,
  packageLimit,
  TRADE_RULES,
  WATER_REACTIVE,
} from '../transport/materials-of-trade.ts';
import { metricFigure } from '../transport/printed-limits.ts';
import { countsTowardsTotal, grossTotal } from '../transport/van-load.ts';
import { readAmount } from '../units/read-amount.ts';
import { convertVolume, convertWeight } from '../units/units.ts';
import { plainNumber, ScenarioError, type CheckResult, type ScenarioInputs } from './scenario-inputs.ts';

/**
 * Limits of 49 CFR 173.6 for a class, a package or a van; the section's rules in words where nothing is asked.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkTrade(inputs: ScenarioInputs): CheckResult {
  if (inputs.isEmpty) return reference();
  if (inputs.has('us')) return printedFigure(inputs.text('us'));
  if (inputs.has('items')) return van(inputs);
  const capacity = inputs.firstOf('packageGal', 'packageL', 'packageKg', 'packageLb');
  if (capacity !== undefined) return packages(inputs, capacity);
  if (inputs.has('question')) return { answer: 'not found' };
  if (inputs.has('aerosol'))
    return { maxCapacityL: plainNumber(AEROSOL_CAN.maxL), cuIn: plainNumber(AEROSOL_CAN.cubicInches) };
  if (inputs.raw('material') === 'gasoline') return { container: TRADE_RULES.gasolineContainer, ...ofGroup('II') };
  return byClass(inputs);
}

function byClass(inputs: ScenarioInputs): CheckResult {
  const packaging = inputs.has('packaging') ? inputs.text('packaging').toLowerCase() : '';
  const name = inputs.firstOf('classes', 'class', 'division');
  const words = name === undefined ? [] : Array.isArray(inputs.raw(name)) ? inputs.texts(name) : [inputs.text(name)];
  const classes = words.flatMap((text) => classesIn(text));
  if (/asme|mounted/.test(packaging)) return { maxWaterCapacityGal: plainNumber(MOUNTED_TANK.maxGal) };
  if (packaging.includes('class 9')) return { mark: TRADE_RULES.dilutedTankMark };
  if (packaging.includes('cylinder')) {
    return {
      mark: TRADE_RULES.cylinderMark,
      maxGrossKg: plainNumber(CYLINDER.maxKg),
      maxPerPackageKg: plainNumber(CYLINDER.maxKg),
      printedUS: CYLINDER.printedUS,
    };
  }
  if (classes.length === 0) throw new ScenarioError('The inputs name no class, no package, no items and no figure.');
  const allowed = classes.every(isTradeClass);
  if (!allowed) return { allowed };
  if (inputs.has('maxConcentrationPercent') && classes.every((item) => item === '9')) return diluted(inputs);
  if (inputs.has('packingGroup')) return { allowed, ...perPackage(classes, inputs.text('packingGroup')) };
  if (classes.length > 1) return { allowed };
  return { allowed, ...ofDivision(classes[0] ?? '') };
}

/** "4.3 PG II/III" names Division 4.3; "2.1 or 2.2" names both. */
function classesIn(text: string): string[] {
  return text
    .replace(/\b(?:PG|packing group)\b.*$/i, '')
    .split(/\s*(?:,|;|\bor\b|\band\b)\s*/)
    .flatMap((part) => /^(?:class|division)?\s*(\d(?:\.\d)?|ORM-D)\b/i.exec(part.trim())?.[1]?.toUpperCase() ?? []);
}

function diluted(inputs: ScenarioInputs): CheckResult {
  if (inputs.percent('maxConcentrationPercent').gt(DILUTED_CLASS_9.maxPercent))
    return { allowed: true, ...ofGroup('III') };
  return { allowed: true, maxL: plainNumber(DILUTED_CLASS_9.maxL), printedUS: DILUTED_CLASS_9.printedUS };
}

function perPackage(classes: readonly string[], packingGroup: string): CheckResult {
  const groups = packingGroup
    .toUpperCase()
    .split(/[\s,/]+|\bOR\b|\bAND\b|\bPG\b/)
    .filter((group) => group !== '');
  if (groups.length === 0 || !groups.every((group) => ['I', 'II', 'III'].includes(group)))
    throw new ScenarioError('packingGroup is none of I, II and III.');
  if (classes.every((item) => CLASSES_BY_PACKING_GROUP.some((known) => known === item)))
    return ofGroup(groups.includes('I') ? 'I' : 'II');
  if (classes.includes('4.3') && groups.includes('I')) return { allowed: false };
  return ofDivision(classes[0] ?? '');
}

function ofGroup(group: 'I' | 'II' | 'III'): CheckResult {
  const { maxKg, maxL, printedUS } = packageLimit(group);
  return { maxPerPackageKg: plainNumber(maxKg), maxPerPackageL: plainNumber(maxL), printedUS: [...printedUS] };
}

function ofDivision(division: string): CheckResult {
  if (division === '4.3')
    return { maxPerPackageMl: plainNumber(WATER_REACTIVE.maxMl), printedUS: WATER_REACTIVE.printedUS };
  if (division === '6.2') return { note: TRADE_RULES.samplesOnly };
  return {};
}

function printedFigure(text: string): CheckResult {
  const ounces = /^\s*(\d+(?:\.\d+)?)\s*oz\s*$/i.exec(text)?.[1];
  // The section prints "1 ounce" beside 30 mL: there, and only there, an ounce is a fluid one.
  const amount = ounces === undefined ? readAmount(text) : readAmount(`${ounces} fl oz`);
  if (amount.kind === 'unreadable') throw new ScenarioError(amount.reason);
  if (amount.kind === 'question') throw new ScenarioError(amount.question);
  const { metric, unit, limit, usExceedsMetric } = metricFigure(amount.value, amount.unit);
  return {
    metric: plainNumber(metric),
    unit,
    ...(limit === null ? {} : { limit: plainNumber(limit), usExceedsMetric }),
  };
}

function van(inputs: ScenarioInputs): CheckResult {
  const counted = inputs.objects('items').map(item);
  const totalKg = grossTotal(counted.filter(({ isCounted }) => isCounted));
  return { totalKg: plainNumber(totalKg), withinAggregate: totalKg.lte(AGGREGATE.maxKg) };
}

function item(fields: ScenarioInputs): { grossKg: Exact; count: number; isCounted: boolean } {
  const count = fields.has('count') ? plainNumber(fields.amount('count')) : 1;
  if (!Number.isInteger(count)) throw fields.problem('count', 'needs a whole number');
  const grossKg = fields.has('grossLb')
    ? convertWeight(fields.amount('grossLb'), 'lb', 'kg')
    : fields.amount('grossKg');
  const [hazardClass = '9'] = fields.has('class') ? [fields.text('class')] : [];
  const concentration = fields.firstOf('concentrationPercent', 'maxConcentrationPercent');
  const concentrationPercent = concentration === undefined ? null : fields.percent(concentration);
  const isHarmless = fields.raw('hazardous') === false || /^(none|not regulated|water)$/i.test(hazardClass);
  return {
    grossKg,
    count,
    isCounted: countsTowardsTotal({ hazardClass: isHarmless ? null : hazardClass, concentrationPercent }),
  };
}

function packages(inputs: ScenarioInputs, name: string): CheckResult {
  const given = Array.isArray(inputs.raw(name)) ? inputs.numbers(name) : [inputs.amount(name)];
  if (given.some((value) => value.lt(0))) throw inputs.problem(name, 'may not be negative');
  const limit = packageLimit('II');
  if (name === 'packageKg' || name === 'packageLb') {
    const kilograms = name === 'packageLb' ? given.map((value) => convertWeight(value, 'lb', 'kg')) : given;
    return { kg: kilograms.map(plainNumber), within30Kg: kilograms.map((value) => value.lte(limit.maxKg)) };
  }
  const litres = name === 'packageGal' ? given.map((value) => convertVolume(value, 'US gal', 'L')) : given;
  return { litres: litres.map(plainNumber), within30L: litres.map((value) => value.lte(limit.maxL)) };
}

function reference(): CheckResult {
  return {
    isMaterialOfTrade: TRADE_RULES.definition,
    excluded: [...EXCLUDED],
    maxAggregateGrossKg: plainNumber(AGGREGATE.maxKg),
    printedUS: AGGREGATE.printedUS,
    packaging: TRADE_RULES.packaging,
    mark: TRADE_RULES.mark,
    rq: TRADE_RULES.reportableQuantity,
    tightness: TRADE_RULES.tightness,
    outer: TRADE_RULES.outer,
    rule: TRADE_RULES.driver,
    exempt: [...TRADE_RULES.exempt],
    stillNeeded: [...TRADE_RULES.stillNeeded],
  };
}
