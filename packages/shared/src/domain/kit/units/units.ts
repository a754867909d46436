import { exact, type Exact } from '../../money/exact.ts';

/*
 * Exact factors: NIST Handbook 44 App. C and SP 811 App. B.8, as quoted in public unit tables. The US gallon is 231 cubic
 * inches; the imperial gallon is a fifth larger and never a silent default.
 */

/** Milliliters in one of each unit of volume. */
const ML_PER = {
  mL: exact(1),
  L: exact(1000),
  'US gal': exact('3785.411784'),
  'US liquid qt': exact('946.352946'),
  'US liquid pt': exact('473.176473'),
  'US cup': exact('236.5882365'),
  'US fl oz': exact('29.5735295625'),
  'US tbsp': exact('14.78676478125'),
  'US tsp': exact('4.92892159375'),
  'imperial gal': exact('4546.09'),
};

/** Grams in one of each unit of weight. A weight ounce is never a fluid ounce. */
const G_PER = {
  g: exact(1),
  kg: exact(1000),
  'oz (weight)': exact('28.349523125'),
  lb: exact('453.59237'),
};

/** Meters in one of each unit of length. */
const M_PER = { km: exact(1000), mi: exact('1609.344') };

export type VolumeUnit = keyof typeof ML_PER;
export type WeightUnit = keyof typeof G_PER;
export type LengthUnit = keyof typeof M_PER;

export function convertVolume(value: Exact, from: VolumeUnit, to: VolumeUnit): Exact {
  return value.mul(ML_PER[from]).div(ML_PER[to]);
}

export function convertWeight(value: Exact, from: WeightUnit, to: WeightUnit): Exact {
  return value.mul(G_PER[from]).div(G_PER[to]);
}

export function convertLength(value: Exact, from: LengthUnit, to: LengthUnit): Exact {
  return value.mul(M_PER[from]).div(M_PER[to]);
}

/** Degrees Fahrenheit to Celsius, exactly. */
export function celsius(fahrenheit: Exact): Exact {
  return fahrenheit.sub(32).mul(5).div(9);
}

/** Degrees Celsius to Fahrenheit, exactly. */
export function fahrenheit(degreesCelsius: Exact): Exact {
  return degreesCelsius.mul(9).div(5).add(32);
}

export function isVolumeUnit(unit: string): unit is VolumeUnit {
  return Object.hasOwn(ML_PER, unit);
}

export function isWeightUnit(unit: string): unit is WeightUnit {
  return Object.hasOwn(G_PER, unit);
}

/**
 * The volume of a weight, in milliliters: the only way from one to the other.
 * @param density grams per milliliter, from the data sheet (section 9)
 * @throws {RangeError} where the density is not more than zero
 */
export function millilitersOf(weight: Exact, unit: WeightUnit, density: Exact): Exact {
  if (density.lte(0)) throw new RangeError('A density is more than 0 g/mL: read it from the data sheet, section 9.');
  return weight.mul(G_PER[unit]).div(density);
}
