import { exact, type Exact } from '../../money/exact.ts';

/*
 * Materials of trade, 49 CFR 173.6: what a business whose main work is not transport may carry for its own use without
 * shipping papers and placards. (a)(1) to (a)(4) read in a law-school copy. Metric limits are the law; the US figures
 * printed beside them are rounded and may be larger.
 */

/** Classes and divisions that can be materials of trade; the old ORM-D is kept for labels that still say so. */
export const CLASSES_BY_PACKING_GROUP = ['3', '8', '9', '4.1', '5.1', '5.2', '6.1', 'ORM-D'] as const;
export const OTHER_DIVISIONS = ['2.1', '2.2', '4.3', '6.2'] as const;

export type TradeClass = (typeof CLASSES_BY_PACKING_GROUP)[number] | (typeof OTHER_DIVISIONS)[number];
export type PackingGroup = 'I' | 'II' | 'III';

export function isTradeClass(hazardClass: string): hazardClass is TradeClass {
  return [...CLASSES_BY_PACKING_GROUP, ...OTHER_DIVISIONS].some((known) => known === hazardClass);
}

/** Never materials of trade, whatever the amount (article on rule HM-200). */
export const EXCLUDED = ['self-reactive', 'poisonous by inhalation', 'hazardous waste'] as const;

/** Everything together on one vehicle, packaging included (compliance note to 49 CFR 392.51). */
export const AGGREGATE = { maxKg: exact(200), printedUS: '440 pounds' } as const;

/** Class 9 at this percent or less may go in a tank, outside the total (the latter from memory). */
export const DILUTED_CLASS_9 = { maxPercent: exact(2), maxL: exact(1500), printedUS: '400 gallons' } as const;

/** Gross weight of one cylinder of Division 2.1 or 2.2. */
export const CYLINDER = { maxKg: exact(100), printedUS: '220 pounds' } as const;

/** A permanently mounted ASME tank of a non-liquefied Division 2.2 gas without subsidiary hazard: water capacity. */
export const MOUNTED_TANK = { maxGal: exact(70) } as const;

/** Division 4.3, packing group II or III, per package; group I is not allowed. */
export const WATER_REACTIVE = { maxMl: exact(30), printedUS: '1 ounce' } as const;

/** A metal aerosol can, 49 CFR 173.306(a)(3), from memory. */
export const AEROSOL_CAN = { maxL: exact(1), cubicInches: exact(61) } as const;

export interface PackageLimit {
  maxKg: Exact;
  maxL: Exact;
  printedUS: readonly string[];
}

/** Gross mass or capacity of one package of a class that goes by packing group. */
export function packageLimit(packingGroup: PackingGroup): PackageLimit {
  return packingGroup === 'I'
    ? { maxKg: exact('0.5'), maxL: exact('0.5'), printedUS: ['1 pound', '1 pint'] }
    : { maxKg: exact(30), maxL: exact(30), printedUS: ['66 pounds', '8 gallons'] };
}

/** Rules that are words. The first four from brochures and letters of the agency, the driver's from memory. */
export const TRADE_RULES = {
  definition:
    'hazardous material, not hazardous waste, carried on a motor vehicle to protect people aboard, to run or maintain the vehicle, or by a private carrier in direct support of a main business other than transport by motor vehicle',
  packaging: "maker's own packaging or one of equal strength",
  mark: 'common name or proper shipping name on each',
  reportableQuantity: 'add RQ if a reportable quantity',
  tightness: 'leak tight, sift proof, closed, secured against shifting, protected from damage',
  outer: 'not needed when bottles stand secured in cages, bins, boxes or compartments',
  cylinderMark: 'proper shipping name, identification number, hazard class label',
  dilutedTankMark: 'identification number on two opposing sides',
  gasolineContainer: 'metal or plastic meeting the DOT rules or 29 CFR 1910.106',
  samplesOnly: 'samples and medical waste only, combination packaging',
  driver: 'the driver is told what is aboard, whether a reportable quantity is, and what this section requires',
  exempt: ['shipping papers', 'placards'],
  stillNeeded: ['packaging', 'marking'],
} as const;
