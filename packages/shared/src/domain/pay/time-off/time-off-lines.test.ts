import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { computePayWeek } from '../compute-pay-week.ts';
import type { PayAdjustment, PayWeekInput, PersonWeek } from '../pay-week.types.ts';
import { aCrew, anAdjustment, anEntry, aRate, aWeek, aWorkedWeek } from '../testing/pay-week.factory.ts';
import { randomWeek } from '../testing/random-weeks.ts';
import { NO_EXTRAS, type DatedPlan, type PlanBase } from '../plans/pay-plan.ts';
import { hourlyRateInForce } from './hourly-rate-in-force.ts';
import type { NoShowTrip } from './no-show-trip.ts';
import type { DatedShowUpRule, ShowUpRule } from './show-up-rule.ts';
import { showUpRuleOn } from './show-up-rule.ts';
import { timeOffCents, type TimeOffTaken } from './time-off-pay.ts';

const hoursOff = (hours: string, rate: string, on = '2026-05-06'): PayAdjustment => {
  const timeOff: TimeOffTaken = {
    ...{ kind: 'vacation', hours, on, rate, ruleId: 'rule-1' },
    ...{ ruleWords: '1 h for every 40 h worked', rateWords: 'The hourly rate since May 1, 2026' },
  };
  return anAdjustment('paid_time_off', timeOffCents({ hours, rate }), { id: `off-${on}`, timeOff });
};
const aShowUpRule = (rule: ShowUpRule, parts: Partial<DatedShowUpRule> = {}): DatedShowUpRule => ({
  ...{ id: rule.pays, placeId: null, startsOn: '2026-01-05', rule },
  ...parts,
});
const upTo = (hours: string) => [aShowUpRule({ pays: 'show_up', hours })];
const ada = (parts: Partial<PayWeekInput>): PersonWeek => {
  const [person] = computePayWeek(aWeek(parts)).people;
  if (!person) throw new Error('Ada is paid');
  return person;
};
const linesOf = (person: PersonWeek, kind: string) => person.lines.filter((line) => line.kind === kind);
const aPlan = (base: PlanBase): DatedPlan => ({
  ...{ id: 'plan', personId: 'ada', startsOn: '2026-05-04', plan: { base, extras: NO_EXTRAS } },
});

describe('hours off', () => {
  // 29 CFR 778.219(a)(1), read in an older print: 5.00 an hour, 50 hours worked in a vacation week paid with 240.00.
  test('vacation pay beside 50 worked hours leaves the regular rate and the overtime as they are', () => {
    const week = { entries: aWorkedWeek([600, 600, 600, 600, 600]), rates: [aRate('hourly', '5')] };
    const rules = { ...aWeek().rules, minimumWage: '5' };
    const person = ada({ ...week, rules, adjustments: [hoursOff('48', '5')] });
    expect(person.totals).toMatchObject({ hourly: 25_000, overtimePremium: 2500, gross: 25_000 + 24_000 + 2500 });
    expect(person.regularRate).toBe('5');
  });

  test('show hours, day, rate, rule and where they come from', () => {
    const [line] = linesOf(ada({ adjustments: [hoursOff('15/2', '19.20')] }), 'paid_time_off');
    expect(line).toMatchObject({ hours: '15/2', rate: '19.20', workedOn: '2026-05-06', amountCents: 14_400 });
    expect(line?.rule).toBe('29 CFR 778.218, 778.219');
    expect(line?.working.map((step) => step.arithmetic)).toEqual(['7.5 h', '7.5 h times 19.20']);
    expect(line?.working[0]?.sources).toEqual([{ kind: 'rule', id: 'rule-1', label: '1 h for every 40 h worked' }]);
  });

  test('round once, half up', () => {
    expect(timeOffCents({ hours: '1/3', rate: '22.51' })).toBe(750);
    expect(timeOffCents({ hours: '1/2', rate: '0.01' })).toBe(1);
  });

  test('an adjustment without hours pays as it did, to the byte', () => {
    const bare = anAdjustment('paid_time_off', 14_400);
    expect(JSON.stringify(ada({ adjustments: [{ ...bare, timeOff: null }] }))).toBe(
      JSON.stringify(ada({ adjustments: [bare] })),
    );
  });

  test('never change hours, regular rate, overtime or make-up of any week', () => {
    fc.assert(
      fc.property(
        randomWeek,
        fc.integer({ min: 1, max: 90 }),
        fc.integer({ min: 1, max: 9000 }),
        (input, hours, cents) => {
          const off = hoursOff(`${hours}/4`, (cents / 100).toFixed(2));
          const more = computePayWeek({ ...input, adjustments: [...input.adjustments, off] }).people;
          computePayWeek(input).people.forEach((person, index) => {
            const { hoursWorked, overtimeHours, regularRate, totals } = more[index] ?? person;
            expect([hoursWorked, overtimeHours, regularRate, totals.overtimePremium, totals.makeUp]).toEqual([
              ...[person.hoursWorked, person.overtimeHours, person.regularRate],
              ...[person.totals.overtimePremium, person.totals.makeUp],
            ]);
          });
        },
      ),
      { numRuns: 100 },
    );
  });
});

describe('the hourly rate of hours off', () => {
  const rates = [aRate('hourly', '18'), aRate('hourly', '20', { startsOn: '2026-05-06', personId: 'ada' })];
  const rateOn = (on: string, plans: DatedPlan[] = []) =>
    hourlyRateInForce({ personId: 'ada', weekStartsOn: '2026-05-04', on, rates, plans });

  test('is the dated rate of the day, or the plan’s', () => {
    expect(rateOn('2026-05-05')).toMatchObject({ value: '18', isPaidWhole: false });
    expect(rateOn('2026-05-06')?.value).toBe('20');
    expect(rateOn('2026-05-06', [aPlan({ kind: 'hourly', hourly: '25' })])).toMatchObject({ value: '25' });
    const other = { hourly: '12', agreement: null };
    expect(rateOn('2026-05-06', [aPlan({ kind: 'job_rate', perJob: '90', other })])?.value).toBe('12');
  });

  test('of a salary is the salary over its hours, and says that the day may be paid already', () => {
    const salary = aPlan({ kind: 'salary', amount: '1000', period: 'weekly', coversHours: '45' });
    expect(rateOn('2026-05-05', [salary])).toMatchObject({ value: '200/9', isPaidWhole: true });
  });
});

describe('show-up pay', () => {
  const rates = [aRate('hourly', '12')];

  // 29 CFR 778.220(b), figures from memory of the print of 2019: 12.00 an hour, 2 hours on Monday with 4 promised,
  // then 8 hours a day from Tuesday to Saturday: 504.00 straight, 24.00 show-up pay, 12.00 for 2 hours of overtime.
  test('is not pay for hours worked: rate and overtime stay', () => {
    const entries = aWorkedWeek([120, 480, 480, 480, 480, 480]);
    const person = ada({ entries, rates, showUpRules: upTo('4') });
    expect(linesOf(person, 'show_up_pay')).toMatchObject([
      { workedOn: '2026-05-04', hours: '2', rate: '12', amountCents: 2400, inRegularRate: false },
    ]);
    expect(person).toMatchObject({ hoursWorked: '42', regularRate: '12', totals: { overtimePremium: 1200 } });
    expect(person.totals.gross).toBe(50_400 + 2400 + 1200);
  });

  // California, as a law firm's page tells it: an 8 hour shift, sent home after 2, is paid 4 hours of which 2 count as
  // worked. The half of the scheduled hours is the owner's to enter.
  test('pays up to the hours of the rule, and only what lacks', () => {
    const person = ada({ entries: aWorkedWeek([120]), rates, showUpRules: upTo('4') });
    expect([person.hoursWorked, person.totals.gross]).toEqual(['2', 4800]);
    expect(linesOf(ada({ entries: aWorkedWeek([240]), rates, showUpRules: upTo('4') }), 'show_up_pay')).toEqual([]);
  });

  // Massachusetts, opinion letter MW-2007-002 (read): sent home after 2 of 4 hours, paid 2 hours and at least the minimum
  // wage for the third.
  test('is at least the minimum wage an hour where no hourly rate is set', () => {
    const rules = { ...aWeek().rules, minimumWage: '7.50' };
    const person = ada({ entries: aWorkedWeek([120]), rules, showUpRules: upTo('3') });
    expect(linesOf(person, 'show_up_pay')).toMatchObject([{ hours: '1', amountCents: 750 }]);
  });

  test('is paid to who came and was sent home at once, and to nobody on a day without a clock entry', () => {
    const at = '2026-05-05T12:00:00.000Z';
    const person = ada({ entries: [anEntry(at, at)], rates, showUpRules: upTo('2') });
    expect(linesOf(person, 'show_up_pay')).toMatchObject([{ workedOn: '2026-05-05', hours: '2', amountCents: 2400 }]);
    expect(ada({ rates, showUpRules: upTo('2') }).lines).toEqual([]);
  });

  test('waits for a day’s end, and for days with paid hours off or written down as away there is none', () => {
    const entries = aWorkedWeek([60, 60]);
    const running = ada({ entries, rates, showUpRules: upTo('2'), asOf: '2026-05-05T14:00:00.000Z' });
    expect(linesOf(running, 'show_up_pay').map((line) => line.workedOn)).toEqual(['2026-05-04']);
    const left = ada({ entries, rates, showUpRules: upTo('2'), adjustments: [hoursOff('7', '12', '2026-05-04')] });
    expect(linesOf(left, 'show_up_pay').map((line) => line.workedOn)).toEqual(['2026-05-05']);
    const daysAway = [{ personId: 'ada', startsOn: '2026-05-05', endsOn: '2026-05-08' }];
    const away = ada({ entries, rates, showUpRules: upTo('2'), daysAway });
    expect(linesOf(away, 'show_up_pay').map((line) => line.workedOn)).toEqual(['2026-05-04']);
  });

  test('looks at a shift past midnight and over the week’s edge as one', () => {
    const late = [anEntry('2026-05-06T02:00:00.000Z', '2026-05-06T07:00:00.000Z')]; // 22:00 to 03:00
    const edge = [
      anEntry('2026-05-04T02:00:00.000Z', '2026-05-04T06:00:00.000Z'), // began on Sunday, last week
      anEntry('2026-05-11T02:00:00.000Z', '2026-05-11T06:00:00.000Z'), // goes on into next week
    ];
    for (const entries of [late, edge])
      expect(linesOf(ada({ entries, rates, showUpRules: upTo('4') }), 'show_up_pay')).toEqual([]);
  });

  test('is none for a salary or a day rate, which pay their days whole', () => {
    const plans = [aPlan({ kind: 'day_rate', daily: '150' })];
    expect(linesOf(ada({ entries: aWorkedWeek([60]), rates, plans, showUpRules: upTo('4') }), 'show_up_pay')).toEqual(
      [],
    );
  });

  test('goes by the place before the company, and ends where a rule says so', () => {
    const rules = [
      ...upTo('2'),
      aShowUpRule({ pays: 'show_up', hours: '3' }, { id: 'harbor', placeId: 'harbor' }),
      aShowUpRule({ pays: 'nothing', of: 'show_up' }, { id: 'end', startsOn: '2026-06-01' }),
    ];
    const hoursOn = (placeId: string | null, on: string) => showUpRuleOn(rules, 'show_up', placeId, on)?.rule.hours;
    expect([hoursOn(null, '2026-05-04'), hoursOn('harbor', '2026-05-04')]).toEqual(['2', '3']);
    expect([hoursOn(null, '2026-06-01'), hoursOn('harbor', '2026-06-01')]).toEqual([undefined, '3']);
  });
});

describe('a trip with nobody home', () => {
  const trip: NoShowTrip = {
    ...{ visitId: 'visit-7', jobId: 'job-7', jobNumber: 7, calledOffAt: '2026-05-05T18:00:00.000Z' },
    crew: aCrew('ada', 'bo'),
  };
  const fixed = (dollars: string, isShared: boolean) => [aShowUpRule({ pays: 'no_show_trip', dollars, isShared })];

  // By hand from 29 CFR 778.109: (42 h at 12.00 + 21.00) / 42 h is 12.50, and half of it for 2 hours is 12.50.
  test('pays a fixed amount that counts in the regular rate', () => {
    const entries = aWorkedWeek([480, 480, 480, 480, 480, 120]);
    const person = ada({
      entries,
      rates: [aRate('hourly', '12')],
      noShowTrips: [trip],
      showUpRules: fixed('21', false),
    });
    expect(linesOf(person, 'no_show_trip')).toMatchObject([{ amountCents: 2100, jobNumber: 7, inRegularRate: true }]);
    expect([person.regularRate, person.totals.overtimePremium, person.totals.flat]).toEqual(['25/2', 1250, 2100]);
  });

  test('may be shared in the crew to the cent, and counts toward the minimum wage', () => {
    const input = aWeek({
      people: [
        { id: 'ada', name: 'Ada Brook' },
        { id: 'bo', name: 'Bo Field' },
      ],
      entries: aWorkedWeek([60]),
      noShowTrips: [trip],
      showUpRules: fixed('15.01', true),
    });
    const people = computePayWeek(input).people;
    expect(people.map((person) => linesOf(person, 'no_show_trip')[0]?.amountCents)).toEqual([751, 750]);
    expect(people[0]?.totals.makeUp).toBe(0);
  });

  test('is none before a rule has started, and none for a trip of another week', () => {
    const showUpRules = fixed('15', false);
    const early = showUpRules.map((rule) => ({ ...rule, startsOn: '2026-05-11' }));
    expect(ada({ noShowTrips: [trip], showUpRules: early }).lines).toEqual([]);
    const later = { ...trip, calledOffAt: '2026-05-12T18:00:00.000Z' };
    expect(ada({ noShowTrips: [later], showUpRules }).lines).toEqual([]);
  });
});
