import { expect, test } from 'vitest';
import { computePayWeek } from './compute-pay-week.ts';
import { overtimeRuleSet } from './overtime-rule-sets.ts';
import type { PayWeekInput, PersonPlace } from './pay-week.types.ts';
import { roundPunches } from './punch-rounding.ts';
import { anEntry, aRate, aWeek, aWorkedWeek } from './testing/pay-week.factory.ts';

const aPlace = (parts: Partial<PersonPlace> = {}): PersonPlace => ({
  ...{ personId: 'ada', placeId: 'place', name: 'There', minimumWages: [] },
  ruleSet: overtimeRuleSet('us_ak'),
  ...parts,
});
const ada = (input: Partial<PayWeekInput>) => computePayWeek(aWeek(input)).people[0];

test('a place’s daily rule pays beside the federal one, a premium is credited once (29 USC 207(h), figures ours)', () => {
  const entries = aWorkedWeek([600, 600, 600, 600, 600]);
  const week = { entries, rates: [aRate('hourly', '20')], places: [aPlace()] };
  expect(ada(week)?.totals).toMatchObject({ overtimePremium: 10_000, gross: 110_000 });
  const daily = ada({ ...week, entries: aWorkedWeek([600]) });
  expect([daily?.overtimeHours, daily?.totals.overtimePremium]).toEqual(['2', 2000]);
});

test('the higher of the company’s and the place’s minimum wage holds, each hour at the wage of its own day', () => {
  const minimumWages = [
    { startsOn: '2026-01-01', amount: '13.00' },
    { startsOn: '2026-05-06', amount: '14.00' },
  ];
  const week = {
    entries: aWorkedWeek([480, 480, 480, 480]),
    rates: [aRate('hourly', '10')],
    places: [aPlace({ minimumWages })],
  };
  // Two days of 8 h at 13.00 and two at 14.00, less 320.00.
  expect(ada(week)?.totals.makeUp).toBe(20_800 + 22_400 - 32_000);
  const company = { ...aWeek().rules, minimumWage: '15' };
  expect(ada({ ...week, rules: company })?.totals.makeUp).toBe(48_000 - 32_000);
});

test('Nevada’s daily rule ends at 1.5 times the place’s own minimum wage (NRS 608.018)', () => {
  const minimumWages = [{ startsOn: '2024-07-01', amount: '12.00' }];
  const places = [aPlace({ ruleSet: overtimeRuleSet('us_nv'), minimumWages })];
  const premium = (hourly: string) =>
    ada({ places, entries: aWorkedWeek([600]), rates: [aRate('hourly', hourly)] })?.totals.overtimePremium;
  expect([premium('17.99'), premium('18.00')]).toEqual([1799, 0]);
});

test('29 CFR 785.48(b), DOL Fact Sheet #53: quarter hours, 7 minutes go down and 8 go up; touching entries keep touching', () => {
  const entries = [
    anEntry('2026-05-05T12:07:00.000Z', '2026-05-05T14:08:00.000Z'),
    anEntry('2026-05-05T14:08:00.000Z', '2026-05-05T15:22:00.000Z', { id: 'second' }),
  ];
  expect(roundPunches(entries, 15, 'America/New_York').map(({ startedAt, endedAt }) => [startedAt, endedAt])).toEqual([
    ['2026-05-05T12:00:00.000Z', '2026-05-05T14:15:00.000Z'],
    ['2026-05-05T14:15:00.000Z', '2026-05-05T15:15:00.000Z'],
  ]);
  const rules = { ...aWeek().rules, punchRoundingMinutes: 15 as const };
  expect(ada({ rules, entries, rates: [aRate('hourly', '20')] })?.hoursWorked).toBe('13/4');
});

test('premiums go up to the next cent where the company chose so', () => {
  const week = { entries: aWorkedWeek([521, 507, 0, 533, 498, 476]) };
  const premium = (premiumRounding: 'half_up' | 'up', hourly: string) =>
    ada({ ...week, rates: [aRate('hourly', hourly)], rules: { ...aWeek().rules, premiumRounding } })?.totals;
  // 42.25 h at 19.53 is 825.14; half of the quotient for 2.25 h is 21.9712 (arithmetic).
  expect([premium('half_up', '19.53')?.overtimePremium, premium('up', '19.53')?.overtimePremium]).toEqual([2197, 2198]);
});
