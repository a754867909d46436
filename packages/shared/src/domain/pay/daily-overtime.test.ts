import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact, fractionText, sum } from '../money/exact.ts';
import { dailyGate, splitHours } from './daily-overtime.ts';
import { OVERTIME_RULE_SETS, overtimeRuleSet } from './overtime-rule-sets.ts';

function split(key: string, hoursByDay: number[]): string[] {
  const hours = hoursByDay.map((day) => exact(day));
  const { straight, overtime, double } = splitHours(hours, overtimeRuleSet(key));
  return [straight, overtime, double].map(fractionText);
}

describe('places with daily overtime', () => {
  it('California Labor Code 510: the seventh day in a row has no straight hours (figures ours)', () => {
    expect(split('us_ca', [4, 4, 4, 4, 4, 4, 10])).toEqual(['24', '8', '2']);
    expect(split('us_ca', [4, 4, 0, 4, 4, 4, 10])).toEqual(['28', '2', '0']);
  });

  it('COMPS Order rule 4.1: over 12 a day or 40 a week, whichever is more, never both (figures ours)', () => {
    expect(split('us_co', [13, 13, 8, 8, 8])).toEqual(['40', '10', '0']);
    expect(split('us_co', [14, 0, 0, 0, 0])).toEqual(['12', '2', '0']);
  });

  it('KRS 337.050, from memory: the seventh day only in a week over 40 hours (figures ours)', () => {
    expect(split('us_ky', [7, 7, 7, 7, 7, 7, 3])).toEqual(['40', '5', '0']);
    expect(split('us_ky', [5, 5, 5, 5, 5, 5, 5])).toEqual(['35', '0', '0']);
  });

  it('NRS 608.018: the gate is 1.5 times the minimum wage; elsewhere there is none', () => {
    expect(dailyGate(overtimeRuleSet('us_nv'), exact('12.00'))?.toString()).toBe('18');
    expect(dailyGate(overtimeRuleSet('us_ca'), exact('16.90'))).toBeNull();
  });

  it('puts every hour in exactly one place, with no more straight hours than the week allows', () => {
    const days = fc.array(fc.integer({ min: 0, max: 96 }), { minLength: 7, maxLength: 7 });
    fc.assert(
      fc.property(fc.constantFrom(...OVERTIME_RULE_SETS), days, (rules, quarters) => {
        const hours = quarters.map((quarter) => exact(quarter).div(4));
        const { straight, overtime, double } = splitHours(hours, rules);
        expect(straight.add(overtime).add(double).equals(sum(hours))).toBe(true);
        expect(straight.lte(40) && overtime.gte(0) && double.gte(0)).toBe(true);
      }),
    );
  });

  it('names the key of rules that are not known', () => {
    expect(() => overtimeRuleSet('us_zz')).toThrow('No overtime rules are known under "us_zz".');
  });
});
