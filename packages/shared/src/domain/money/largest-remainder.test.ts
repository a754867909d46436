import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact } from './exact.ts';
import { splitByLargestRemainder } from './largest-remainder.ts';

const weights = fc.array(fc.nat(1000), { minLength: 1, maxLength: 8 });
const split = (cents: number, parts: number[]): number[] =>
  splitByLargestRemainder(
    cents,
    parts.map((part) => exact(part)),
  );

describe('a split by largest remainder', () => {
  it('gives left-over cents to the largest remainders, ties to the earlier', () => {
    expect(split(100, [1, 1, 1])).toEqual([34, 33, 33]);
    expect(split(100, [1, 2, 3])).toEqual([17, 33, 50]);
    expect(split(-101, [1, 1])).toEqual([-51, -50]);
    expect(split(10, [0, 0])).toEqual([5, 5]);
    expect(split(10, [])).toEqual([]);
  });

  it('always adds up, and no part is a cent or more away from its exact share', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1_000_000, max: 1_000_000 }), weights, (cents, parts) => {
        const shares = split(cents, parts);
        expect(shares.reduce((sum, share) => sum + share, 0)).toBe(cents);
        const total = parts.reduce((sum, part) => sum + part, 0);
        if (total === 0) return;
        shares.forEach((share, index) =>
          expect(
            exact(cents)
              .mul(parts[index] ?? 0)
              .div(total)
              .sub(share)
              .abs()
              .lt(1),
          ).toBe(true),
        );
      }),
    );
  });
});
