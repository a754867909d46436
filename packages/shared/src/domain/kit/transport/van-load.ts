import { sum, ZERO, type Exact } from '../../money/exact.ts';
import {
  AGGREGATE,
  CYLINDER,
  DILUTED_CLASS_9,
  isTradeClass,
  packageLimit,
  WATER_REACTIVE,
  type PackingGroup,
} from './materials-of-trade.ts';

export interface VanPackage {
  name: string;
  count: number;
  /** Of one package with its packaging; null where nobody weighed it. */
  grossKg: Exact | null;
  /** Capacity of one package; null for solids. */
  litres: Exact | null;
  /** "8", "2.1"; null for what is not a hazardous material in transport, such as plain wash water. */
  hazardClass: string | null;
  packingGroup: PackingGroup | null;
  isCylinder?: boolean;
  /** A flammable aerosol: its weight counts, its class is left to the reader, for no clear rule was found. */
  isAerosol?: boolean;
  /** Percent of the material in the mix, where it is Class 9 in a tank. */
  concentrationPercent?: Exact | null;
}

export interface VanLoad {
  /** What counts towards the total, packaging included. */
  totalKg: Exact;
  withinAggregate: boolean;
  /** Each a sentence that names the package. */
  problems: string[];
  /** Names of what is aboard but does not count. */
  notCounted: string[];
}

/**
 * What a van carries against the materials-of-trade limits of 49 CFR 173.6. An aid: the regulation in force and the data
 * sheet (section 14) decide.
 */
export function vanLoad(packages: readonly VanPackage[]): VanLoad {
  const totalKg = grossTotal(packages.filter(countsTowardsTotal));
  const withinAggregate = totalKg.lte(AGGREGATE.maxKg);
  const problems = packages.flatMap((item) => packageProblem(item) ?? []);
  if (!withinAggregate)
    problems.push('The van carries more than 200 kg of materials of trade in all: leave some at the shop.');
  return {
    totalKg,
    withinAggregate,
    problems,
    notCounted: packages.filter((item) => !countsTowardsTotal(item)).map(({ name }) => name),
  };
}

/** Kilograms of all packages together; what nobody weighed adds nothing and is named among the problems. */
export function grossTotal(packages: readonly Pick<VanPackage, 'grossKg' | 'count'>[]): Exact {
  return sum(packages.map(({ grossKg, count }) => (grossKg ?? ZERO).mul(count)));
}

/** Hazardous materials and aerosols count; a tank of Class 9 at 2 % or less and plain wash water do not. */
export function countsTowardsTotal(
  item: Pick<VanPackage, 'hazardClass' | 'isAerosol' | 'concentrationPercent'>,
): boolean {
  return (item.hazardClass !== null || item.isAerosol === true) && !isDilutedTank(item);
}

function isDilutedTank({
  hazardClass,
  concentrationPercent,
}: Pick<VanPackage, 'hazardClass' | 'concentrationPercent'>): boolean {
  return hazardClass === '9' && concentrationPercent != null && concentrationPercent.lte(DILUTED_CLASS_9.maxPercent);
}

/** A sentence where one package alone is not within the section; null where it is, or where it does not count. */
export function packageProblem(item: VanPackage): string | null {
  const { name, hazardClass, grossKg, litres, packingGroup, isCylinder = false } = item;
  if (hazardClass === null)
    return item.isAerosol && grossKg === null ? `${name}: weigh it, for its weight counts.` : null;
  if (!isTradeClass(hazardClass)) return `${name}: class ${hazardClass} can’t be a material of trade.`;
  if (hazardClass === '6.2') return `${name}: Division 6.2 is for samples and medical waste only.`;
  if (isDilutedTank(item))
    return over(litres, DILUTED_CLASS_9.maxL) ? `${name}: more than 1,500 L of diluted Class 9.` : null;
  if (grossKg === null) return `${name}: weigh it with its packaging, for the weight counts.`;
  if (hazardClass.startsWith('2.'))
    return isCylinder && over(grossKg, CYLINDER.maxKg) ? `${name}: a cylinder may weigh at most 100 kg.` : null;
  if (packingGroup === null) return `${name}: the packing group is missing (data sheet, section 14).`;
  if (hazardClass === '4.3') return waterReactive(name, packingGroup, litres);
  const limit = packageLimit(packingGroup);
  if (!over(grossKg, limit.maxKg) && !over(litres, limit.maxL)) return null;
  const most = packingGroup === 'I' ? '0.5 kg and 0.5 L' : '30 kg and 30 L';
  return `${name}: a package of packing group ${packingGroup} may be at most ${most}.`;
}

function waterReactive(name: string, packingGroup: PackingGroup, litres: Exact | null): string | null {
  if (packingGroup === 'I') return `${name}: Division 4.3 of packing group I can’t be a material of trade.`;
  return over(litres, WATER_REACTIVE.maxMl.div(1000)) ? `${name}: at most 30 mL of Division 4.3 in a package.` : null;
}

function over(amount: Exact | null, limit: Exact): boolean {
  return amount !== null && amount.gt(limit);
}
