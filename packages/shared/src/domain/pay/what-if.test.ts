import fc from 'fast-check';
import { expect, test } from 'vitest';
import { computePayWeek } from './compute-pay-week.ts';
import { overtimeRuleSet } from './overtime-rule-sets.ts';
import { aPlan } from './testing/pay-plan.factory.ts';
import { aDoneLine, aRate, aWeek, aWorkedWeek } from './testing/pay-week.factory.ts';
import { randomWeek } from './testing/random-weeks.ts';
import { trialInput, type Trial } from './what-if.ts';

const NOTHING: Trial = { hourly: null, percent: null, plan: null, place: null, minimumWage: null, crewSplit: null };
const week = aWeek({
  entries: aWorkedWeek([600, 600, 600, 600, 600]),
  rates: [
    aRate('hourly', '20'),
    aRate('hourly', '15', { clockKind: 'travel' }),
    aRate('commission_percent', '6', { serviceId: 'wash' }),
  ],
  doneLines: [aDoneLine(1, 100_000), aDoneLine(2, 50_000, { serviceId: 'other' })],
});
const totals = (trial: Partial<Trial>) =>
  computePayWeek(trialInput(week, 'ada', { ...NOTHING, ...trial })).people[0]?.totals;

test('a trial of nothing is the week as it was, for everybody', () => {
  fc.assert(
    fc.property(randomWeek, (input) => {
      for (const person of computePayWeek(input).people)
        expect(computePayWeek(trialInput(input, person.personId, NOTHING)).people).toEqual([person]);
    }),
    { numRuns: 60 },
  );
}, 60_000);

test('tries an hour and a percentage where they applied, and leaves other services alone', () => {
  expect(totals({})).toMatchObject({ hourly: 100_000, commission: 6000 });
  expect(totals({ hourly: '22', percent: '3' })).toMatchObject({ hourly: 110_000, commission: 3000 });
});

test('tries a plan, a place and a minimum wage', () => {
  const { plan } = aPlan({ kind: 'salary', amount: '1100', period: 'weekly', coversHours: '50' });
  expect(totals({ plan })).toMatchObject({ hourly: 110_000, overtimePremium: 11_000 });
  expect(totals({ plan, hourly: '99' })).toMatchObject({ hourly: 110_000 });
  const place = { placeId: 'p', name: 'There', ruleSet: overtimeRuleSet('us_ca'), minimumWages: [] };
  expect(totals({ place })?.overtimePremium).toBe(10_600);
  expect(totals({ minimumWage: '30' })?.makeUp).toBe(150_000 - 106_000);
});
