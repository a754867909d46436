/** Model-year codes in order from 1980 on, 30 to a cycle (49 CFR 565.15 Table VII as reprinted on public pages). */
const CODES = 'ABCDEFGHJKLMNPRSTVWXY123456789';
const FIRST_YEAR = 1980;
const CYCLE = CODES.length;

export const YEAR_CODES_NOT_USED = ['I', 'O', 'Q', 'U', 'Z', '0'] as const;
export const YEAR_POSITION = 10;

/** The two years that a code stands for, or null for a character that is no code. */
export function yearsOfCode(code: string): [number, number] | null {
  const index = code.length === 1 ? CODES.indexOf(code.toUpperCase()) : -1;
  return index < 0 ? null : [FIRST_YEAR + index, FIRST_YEAR + CYCLE + index];
}

/**
 * Model year by the code at position 10 and the cycle by position 7: a digit is 1980 to 2009, a letter 2010 to 2039. The
 * rule holds for cars and light trucks up to 10,000 lb; for others, trailers too, it is a hint.
 * @param vin 17 characters as `readVin` gives them
 * @returns null where position 10 holds no code
 */
export function modelYear(vin: string): number | null {
  const years = yearsOfCode(vin[YEAR_POSITION - 1] ?? '');
  if (vin.length !== 17 || years === null) return null;
  return /\d/.test(vin[6] ?? '') ? years[0] : years[1];
}

/** Every code with its two years. */
export function yearCodes(): Record<string, [number, number]> {
  return Object.fromEntries([...CODES].map((code, index) => [code, [FIRST_YEAR + index, FIRST_YEAR + CYCLE + index]]));
}
