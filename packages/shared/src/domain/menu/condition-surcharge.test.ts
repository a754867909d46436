import { describe, expect, it } from 'vitest';
import { surchargesOn, usualSurcharges } from './condition-surcharge.ts';

describe('surcharges by condition', () => {
  it('are the usual ones until the owner’s have started, each condition by itself', () => {
    const rows = [
      { condition: 'dirty' as const, pricePercent: 10, minutesPercent: 15, startsOn: '2026-02-01' },
      { condition: 'dirty' as const, pricePercent: 25, minutesPercent: 20, startsOn: '2026-05-01' },
    ];
    expect(surchargesOn(rows, '2026-01-31')).toEqual(usualSurcharges);
    expect(surchargesOn(rows, '2026-04-30').dirty.pricePercent).toBe(10);
    expect(surchargesOn(rows, '2026-05-01')).toEqual({
      dirty: { pricePercent: 25, minutesPercent: 20 },
      very_dirty: usualSurcharges.very_dirty,
    });
  });
});
