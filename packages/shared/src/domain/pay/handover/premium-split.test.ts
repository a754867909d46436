import { describe, expect, test } from 'vitest';
import { exact } from '../../money/exact.ts';
import { toCents } from '../../money/rounding.ts';
import { aLine } from '../pay-line.ts';
import type { PayLine } from '../pay-week.types.ts';
import examples from '../testing/published-examples.json' with { type: 'json' };
import { premiumSplit } from './premium-split.ts';

const line = (kind: PayLine['kind'], amountCents: number, key: string = kind): PayLine =>
  aLine({ key, personId: 'ada', kind, label: '', amountCents, rule: '', working: [] });
const nothingSettled = () => [];

/** IRC 225 / IRS FS-2026-01, as the example states it: the figures are worked by hand from the rule. */
describe('qualified-overtime-2026', () => {
  const example = examples.find((one) => one.id === 'qualified-overtime-2026');
  const { cases } = example?.inputs as {
    cases: { jurisdiction: string; hourly_rate: string; hours_worked: string; paid_multiplier: string }[];
  };
  const expected = example?.expected as { qualified_overtime: string[]; premium_paid: string[] };
  const centsOf = (text: string | undefined) => toCents(exact(text ?? '0'));

  test.each([0, 1, 2])('case %i', (index) => {
    const { hourly_rate: regularRate = '', hours_worked: hoursWorked = '' } = cases[index] ?? {};
    const paid = centsOf(expected.premium_paid[index]);
    const split = premiumSplit(
      { hoursWorked, regularRate, lines: [line('overtime_premium', paid)] },
      { isFederalOnly: false, settledHours: nothingSettled },
    );
    const qualified = centsOf(expected.qualified_overtime[index]);
    expect(split).toEqual({ flsaCents: qualified, stateOnlyCents: paid - qualified });
  });
});

test('under the federal rule alone every premium is its half, rounded as it was', () => {
  const week = { hoursWorked: '41', regularRate: '61/3', lines: [line('overtime_premium', 1017)] };
  const facts = { isFederalOnly: true, settledHours: nothingSettled };
  expect(premiumSplit(week, facts)).toEqual({ flsaCents: 1017, stateOnlyCents: 0 });
});

/** Ours, by 29 CFR 778.120(a)(1): 80.00 over a week of 50 h and one of 38 h; 40.00 / 50 h x 10 h / 2 = 4.00. */
test('of the overtime on a settled commission only hours over 40 of its weeks count', () => {
  const week = {
    hoursWorked: '38',
    regularRate: '20',
    lines: [line('commission_settlement', 8000), line('settlement_premium', 700)],
  };
  const split = premiumSplit(week, { isFederalOnly: false, settledHours: () => ['50', '38'] });
  expect(split).toEqual({ flsaCents: 400, stateOnlyCents: 300 });
  const late = {
    ...week,
    lines: [
      line('commission_settlement', 8000, 'commission_settlement:2026-04-27'),
      line('settlement_premium', 700, 'settlement_premium:2026-04-27'),
    ],
  };
  const asked: string[] = [];
  const settledHours = (key: string) => {
    asked.push(key);
    return ['50'];
  };
  // 80.00 / 50 h x 10 h / 2 = 8.00, more than was paid.
  expect(premiumSplit(late, { isFederalOnly: false, settledHours })).toEqual({ flsaCents: 700, stateOnlyCents: 0 });
  expect(asked).toEqual(['commission_settlement:2026-04-27']);
});
