import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import vanAndHeat from '../testing/published-van-and-heat.json' with { type: 'json' };
import { heatRisk } from './heat-bands.ts';
import { heatIndex } from './heat-index.ts';

/* The published cells are run beside the other sections' in check/. */

describe('a printed table against the formula', () => {
  const row = vanAndHeat.heatIndex.find(({ id }) => id === 'table-mismatches');
  const differ = (row?.expected as { differ: { T: number; RH: number; printed: number; computed: number }[] }).differ;

  it.each(differ)(
    '$T °F and $RH % compute to $computed, where the table prints $printed',
    ({ T, RH, printed, computed }) => {
      const { value } = heatIndex(T, RH);
      expect(value).toBeCloseTo(computed, 2);
      expect(Math.round(value)).not.toBe(printed);
    },
  );
});

describe('risk', () => {
  it.each([
    [90.9, false, 'Lower (Caution)'],
    [115, false, 'High'],
    [115.01, false, 'Very High to Extreme'],
    [90, true, 'Moderate'],
    [103, true, 'Very High to Extreme'],
    [130, true, 'Very High to Extreme'],
  ])('%s °F, hard work %s: %s (OSHA bands)', (index, isHard, risk) => {
    expect(heatRisk(index, { isHard })).toBe(risk);
  });
});

it('rises with the temperature at one humidity where the regression is meant for', () => {
  fc.assert(
    fc.property(fc.integer({ min: 40, max: 85 }), fc.integer({ min: 82, max: 109 }), (humidity, temperature) => {
      expect(heatIndex(temperature + 1, humidity).value).toBeGreaterThan(heatIndex(temperature, humidity).value);
    }),
  );
});
