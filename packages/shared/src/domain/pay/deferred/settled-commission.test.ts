import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { computePayWeek } from '../compute-pay-week.ts';
import type { DoneLine, PayWeekInput, PersonWeek } from '../pay-week.types.ts';
import { aDoneLine, anAdjustment, aRate, aWeek, aWorkedWeek } from '../testing/pay-week.factory.ts';
import { randomWeek } from '../testing/random-weeks.ts';

const NEXT = { startsAt: '2026-05-11T04:00:00.000Z', endsAt: '2026-05-18T04:00:00.000Z' };
const waiting = (line: DoneLine): DoneLine => ({ ...line, commissionWaits: true });
const ada = (input: PayWeekInput): PersonWeek => {
  const [person] = computePayWeek(input).people;
  if (!person) throw new Error('the week has a person');
  return person;
};
/** The next week, in which the customers of some lines of a week pay. */
const settledIn = (input: PayWeekInput, lineIds: string[], personId = 'ada') =>
  aWeek({
    ...NEXT,
    people: input.people.filter((person) => person.id === personId),
    settledCommissions: [{ personId, startsOn: '2026-05-04', number: 19, input, lineIds }],
  });
const amounts = (person: PersonWeek) => Object.fromEntries(person.lines.map((line) => [line.kind, line.amountCents]));

// 45 h at 20.00 and 10 % of 900.00. The rule is 29 CFR 778.119; figures computed by hand from the rule.
const worked = aWeek({
  entries: aWorkedWeek([540, 540, 540, 540, 540]),
  rates: [aRate('hourly', '20'), aRate('commission_percent', '10')],
  doneLines: [aDoneLine(1043, 90_000)],
});
const unpaid = { ...worked, doneLines: worked.doneLines.map(waiting) };

describe('commission earned when the customer has paid', () => {
  test('waits in its own week and says so', () => {
    const person = ada(unpaid);
    expect(amounts(person)).toEqual({ hourly: 90_000, overtime_premium: 5000 });
    expect(person.waiting).toEqual({ amountCents: 9000, jobs: [{ jobId: 'job-1043', jobNumber: 1043 }] });
    expect(ada(worked).waiting).toBeUndefined();
  });

  test('is settled into the week of the work with the overtime it causes', () => {
    const person = ada(settledIn(unpaid, ['line-1043']));
    // 5 h of half the rise of the rate: 90.00 / 45 h / 2 x 5 h = 5.00.
    expect(amounts(person)).toEqual({ commission_settlement: 9000, settlement_premium: 500 });
    expect(person.lines.map((line) => [line.label, line.inRegularRate])).toEqual([
      ['Commission now paid for, job 1043', false],
      ['Overtime on commission now paid for, job 1043', false],
    ]);
    expect(ada(worked).totals.gross).toBe(ada(unpaid).totals.gross + person.totals.gross);
  });

  test('a make-up that stood in for it is not paid twice', () => {
    const poor = {
      ...worked,
      entries: aWorkedWeek([600]),
      rates: [aRate('hourly', '5'), aRate('commission_percent', '10')],
    };
    const late = { ...poor, doneLines: poor.doneLines.map(waiting) };
    // 10 h at 5.00 made up to 72.50; with 90.00 the week comes to 140.00.
    expect(amounts(ada(late))).toEqual({ hourly: 5000, minimum_wage_make_up: 2250 });
    expect(amounts(ada(settledIn(late, ['line-1043'])))).toEqual({ commission_settlement: 6750 });
  });

  test('flat amounts do not wait', () => {
    const flat = { ...unpaid, rates: [aRate('flat_service', '30', { serviceId: 'wash' })], entries: [] };
    expect(amounts(ada(flat))).toEqual({ flat: 3000 });
  });

  test('a draw is settled by what was done', () => {
    const base = {
      ...{ kind: 'draw' as const, percent: '10', weekly: '500' },
      other: { hourly: '10', agreement: null },
    };
    const extras = {
      ...{ premiums: [], trainingHourly: null, helperHourly: null, hourlyByService: [], flats: [] },
      ...{ perAddOn: null, attendance: null, percentOfTotal: null },
    };
    const drawn = {
      ...unpaid,
      plans: [{ id: 'p', personId: 'ada', startsOn: '2026-01-05', plan: { base, extras } }],
    };
    expect(ada(drawn).waiting).toBeUndefined();
    expect(amounts(ada(drawn))['commission']).toBe(9000);
  });

  test('an unsettled week and its settlements come to what work paid when done would have, cent for cent', () => {
    fc.assert(
      fc.property(randomWeek, fc.integer({ min: 0, max: 4095 }), (input, coins) => {
        const toss = (at: number) => ((coins >> at) & 1) === 1;
        const flags = input.doneLines.map((line, at) => ({ line, waits: toss(2 * at), first: toss(2 * at + 1) }));
        const start = { ...input, doneLines: flags.map(({ line, waits }) => (waits ? waiting(line) : line)) };
        const firstIds = flags.filter(({ waits, first }) => waits && first).map(({ line }) => line.lineId);
        const lastIds = flags.filter(({ waits, first }) => waits && !first).map(({ line }) => line.lineId);
        const between = {
          ...start,
          doneLines: start.doneLines.map(({ commissionWaits, ...line }) =>
            commissionWaits && !firstIds.includes(line.lineId) ? waiting(line) : line,
          ),
        };
        for (const { id } of input.people) {
          const grossOf = (week: PayWeekInput) =>
            computePayWeek(week).people.find((person) => person.personId === id)?.totals.gross ?? 0;
          const whole = grossOf({ ...input, adjustments: [] });
          const parts = [
            grossOf({ ...start, adjustments: [] }),
            grossOf(settledIn({ ...start, adjustments: [] }, firstIds, id)),
            grossOf(settledIn({ ...between, adjustments: [] }, lastIds, id)),
          ];
          expect(parts.reduce((sum, part) => sum + part, 0)).toBe(whole);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('bonuses of the week keep their place in its rate', () => {
    const bonus = { ...unpaid, adjustments: [anAdjustment('bonus', 4500)] };
    expect(amounts(ada(settledIn(bonus, ['line-1043'])))).toEqual({
      commission_settlement: 9000,
      settlement_premium: 500,
    });
  });
});
