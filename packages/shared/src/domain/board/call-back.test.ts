import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { callBackMinutes } from './call-back.ts';

describe('a call-back’s minutes', () => {
  it('go by what the lines once took', () => {
    expect(callBackMinutes(30, [90, 30])).toEqual([25, 5]);
    expect(callBackMinutes(5, [90])).toEqual([5]);
  });

  it('give every line at least five, and add up where there is room', () => {
    const lines = fc.array(fc.integer({ min: 5, max: 400 }), { minLength: 1, maxLength: 8 });
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), lines, (fives, usual) => {
        const parts = callBackMinutes(fives * 5, usual);
        expect(Math.min(...parts)).toBeGreaterThanOrEqual(5);
        const sum = parts.reduce((a, b) => a + b, 0);
        expect(sum).toBeGreaterThanOrEqual(Math.max(fives, usual.length) * 5);
        if (fives >= usual.length * 2) expect(sum).toBeLessThanOrEqual((fives + usual.length) * 5);
      }),
    );
  });
});
