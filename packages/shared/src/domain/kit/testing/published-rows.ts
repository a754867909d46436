import { expect } from 'vitest';

/** A figure with its source and how it was come by. */
export interface PublishedRow {
  id: string;
  source: string;
  basis: string;
  inputs: Readonly<Record<string, unknown>>;
  expected: Readonly<Record<string, unknown>>;
}

/** What a source printed after rounding to its own marks: not what the rules are held to. */
const PRINTED = /^(printed|ppmPrinted$|maxRelativeRounding)/;

/** Rows as vitest's `each` wants them, named by their source. */
export function named(rows: readonly PublishedRow[]): [string, PublishedRow][] {
  return rows.map((row) => [`${row.id}: ${row.source} (${row.basis})`, row]);
}

/** Compares what was found with every published field; numbers to the places they are printed with. */
export function expectPublished(found: Readonly<Record<string, unknown>>, row: PublishedRow): void {
  const { tolerance, ...expected } = row.expected;
  for (const [name, wanted] of Object.entries(expected))
    if (!PRINTED.test(name)) expectSame(found[name], wanted, Number(tolerance ?? 0), `${row.id}.${name}`);
}

function expectSame(found: unknown, wanted: unknown, tolerance: number, name: string): void {
  if (typeof wanted === 'number') {
    expect(typeof found, name).toBe('number');
    expect(Math.abs((found as number) - wanted), `${name}: ${String(found)} for ${wanted}`).toBeLessThanOrEqual(
      Math.max(tolerance, lastPlace(wanted)),
    );
  } else if (Array.isArray(wanted)) {
    expect(found, name).toHaveLength(wanted.length);
    wanted.forEach((item, index) => expectSame((found as unknown[])[index], item, tolerance, `${name}.${index}`));
  } else if (typeof wanted === 'object' && wanted !== null) {
    for (const [key, value] of Object.entries(wanted))
      if (!PRINTED.test(key)) expectSame((found as Record<string, unknown>)[key], value, tolerance, `${name}.${key}`);
  } else {
    expect(found, name).toEqual(wanted);
  }
}

/** Half a unit in the last printed place, with room for the nearest binary fraction; whole numbers are exact. */
function lastPlace(wanted: number): number {
  const places = String(wanted).split('.')[1]?.length;
  return places === undefined ? 1e-9 : 0.5001 * 10 ** -places;
}
