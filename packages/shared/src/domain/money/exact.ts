import Fraction from 'fraction.js';

/** Exact rational numbers for pay and money: no floating point ever touches an amount. */
export type Exact = Fraction;

export const ZERO: Exact = new Fraction(0);
export const ONE: Exact = new Fraction(1);
export const HALF: Exact = new Fraction(1, 2);

const NUMBER = /^[+-]?\d+(\.\d+)?(\/\d+)?$/;

/**
 * Reads "12.50", "-3", "169/4" or a whole number exactly.
 * @throws {RangeError} for anything else, so that "12,50" or "" is never taken for an amount.
 */
export function exact(value: string | number | bigint): Exact {
  const text = String(value).trim();
  if (!NUMBER.test(text) || /\/0+$/.test(text)) throw new RangeError(`"${text}" is not a number.`);
  return new Fraction(text);
}

/** Integer cents as exact dollars. */
export function dollars(cents: number): Exact {
  return new Fraction(BigInt(cents), 100n);
}

/** Seconds as exact hours. */
export function hoursOf(seconds: number): Exact {
  return new Fraction(BigInt(seconds), 3600n);
}

export function sum(values: Iterable<Exact>): Exact {
  let total = ZERO;
  for (const value of values) total = total.add(value);
  return total;
}

export function least(a: Exact, b: Exact): Exact {
  return a.lt(b) ? a : b;
}

export function greatest(a: Exact, b: Exact): Exact {
  return a.lt(b) ? b : a;
}

/** "n/d", or "n" when whole: what is stored, and read back by `exact` without loss. */
export function fractionText(value: Exact): string {
  return value.toFraction();
}
