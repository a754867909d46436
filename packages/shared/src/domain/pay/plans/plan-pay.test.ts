import { describe, expect, it } from 'vitest';
import { computePayWeek } from '../compute-pay-week.ts';
import { overtimeRuleSet } from '../overtime-rule-sets.ts';
import type { PayWeekInput, PersonWeek } from '../pay-week.types.ts';
import { aPlan, otherTime } from '../testing/pay-plan.factory.ts';
import { aCrew, aDoneLine, aWeek, aWorkedWeek } from '../testing/pay-week.factory.ts';
import { payPlan } from './pay-plan.ts';

function ada(input: Partial<PayWeekInput>): PersonWeek {
  const [person] = computePayWeek(aWeek(input)).people;
  if (!person) throw new Error('The week names nobody.');
  return person;
}

/** Entries of Ada's: so many hours on jobs a day, then so many of another kind. */
const hoursOnJobs = (...days: number[]) => aWorkedWeek(days.map((hours) => hours * 60));
const waiting = (hours: number) => aWorkedWeek([0, 0, 0, 0, 0, 0, hours * 60], { kind: 'waiting', id: 'waiting' });
/** Flat amounts of Ada's that come to so many dollars. */
const flat = (dollars: string) => ({ flats: [{ serviceId: 'wash', sizeClass: null, amount: dollars }] });
const lineOf = (person: PersonWeek, kind: string) => person.lines.find((line) => line.kind === kind);

describe('the four plain plans', () => {
  it('hourly pays all worked time and nothing for jobs', () => {
    const plans = [aPlan({ kind: 'hourly', hourly: '12.00' })];
    // 29 CFR 778.110(a): 46 hours at 12.00 is 588.00.
    const person = ada({ plans, entries: hoursOnJobs(8, 8, 8, 8, 8, 6), doneLines: [aDoneLine(1, 10_000)] });
    expect(person.totals).toMatchObject({ hourly: 55_200, commission: 0, overtimePremium: 3600, gross: 58_800 });
  });

  it('hourly plus percent adds the commission to the regular rate (29 CFR 778.118, figures ours)', () => {
    const plans = [aPlan({ kind: 'hourly_plus_percent', hourly: '19.50', percent: '6' })];
    const doneLines = [24_000, 42_000, 56_000, 26_500].map((cents, index) => aDoneLine(index, cents));
    const entries = aWorkedWeek([521, 507, 0, 533, 498, 476]);
    expect(ada({ plans, entries, doneLines }).totals).toMatchObject({
      hourly: 82_388,
      commission: 8910,
      overtimePremium: 2431,
    });
  });

  it('29 CFR 778.111(a): piece earnings of 491.00 for 46 hours and 4 waiting hours at 8.00 are 575.30', () => {
    const base = { kind: 'flat_with_floor', floor: '7.25', other: otherTime('8.00') } as const;
    const entries = [...hoursOnJobs(8, 8, 8, 8, 8, 6), ...waiting(4)];
    const person = ada({ plans: [aPlan(base, flat('491.00'))], entries, doneLines: [aDoneLine(1, 0)] });
    expect(person.regularRate).toBe('523/50');
    expect(person.totals).toMatchObject({
      flat: 49_100,
      hourly: 3200,
      makeUp: 0,
      overtimePremium: 5230,
      gross: 57_530,
    });
  });

  it('29 CFR 778.111(b): the hourly guarantee of 11.00 bites, is the regular rate, and the week is 539.00', () => {
    const base = { kind: 'flat_with_floor', floor: '11.00', other: otherTime('8.00') } as const;
    const plans = [aPlan(base, flat('491.00'))];
    const person = ada({ plans, entries: hoursOnJobs(8, 8, 8, 8, 8, 6), doneLines: [aDoneLine(1, 0)] });
    expect(person.regularRate).toBe('11');
    expect(lineOf(person, 'plan_floor')?.amountCents).toBe(1500);
    expect(person.totals.gross).toBe(53_900);
    // 29 CFR 778.111(b) with 778.115, figures ours: waiting time keeps its own rate.
    const longer = ada({
      plans,
      entries: [...hoursOnJobs(8, 8, 8, 8, 8, 6), ...waiting(4)],
      doneLines: [aDoneLine(1, 0)],
    });
    expect([longer.regularRate, longer.totals.gross]).toEqual(['269/25', 59_180]);
  });

  it('an agreement made before the week covers the other time, one made later or a place that forbids it does not', () => {
    const entries = [...hoursOnJobs(8, 8, 8, 8, 6), ...waiting(2)];
    const hourly = (signedOn: string | null, ruleSet = overtimeRuleSet('us_federal')) => {
      const base = {
        kind: 'percent_with_floor',
        percent: '40',
        floor: '10',
        other: otherTime('10', signedOn),
      } as const;
      const place = { personId: 'ada', placeId: 'p', name: 'There', ruleSet, minimumWages: [] };
      return ada({ plans: [aPlan(base)], entries, doneLines: [aDoneLine(1, 150_000)], places: [place] }).totals.hourly;
    };
    expect([hourly(null), hourly('2026-05-04'), hourly('2026-05-05')]).toEqual([2000, 0, 2000]);
    expect(hourly('2026-05-04', overtimeRuleSet('us_ca'))).toBe(2000);
  });

  it('prices a flat amount by size class before the one for all sizes', () => {
    const base = { kind: 'flat_with_floor', floor: '7.25', other: otherTime('8') } as const;
    const flats = [
      { serviceId: 'wash', sizeClass: null, amount: '40' },
      { serviceId: 'wash', sizeClass: 'van' as const, amount: '65' },
    ];
    const doneLines = [aDoneLine(1, 0), aDoneLine(2, 0, { sizeClass: 'van' }), aDoneLine(3, 0, { serviceId: 'other' })];
    expect(ada({ plans: [aPlan(base, { flats })], doneLines }).totals.flat).toBe(10_500);
  });
});

describe('salary for a fixed workweek', () => {
  const salary = (amount: string, coversHours: string) => [
    aPlan({ kind: 'salary', amount, period: 'weekly', coversHours }),
  ];

  it('29 CFR 778.322: 200.00 for 35 hours, 41 worked, is 237.14 (printed 237.12 from rounded rates)', () => {
    const person = ada({ plans: salary('200.00', '35'), entries: hoursOnJobs(8, 8, 8, 8, 8, 1), rules: low });
    expect(person.lines.map((line) => line.amountCents)).toEqual([20_000, 2857, 571, 286]);
    expect(person.totals.gross).toBe(23_714);
  });

  it('DOL Fact Sheet #23: 405.00 meant for 45 hours, 45 worked, is 427.50', () => {
    const person = ada({ plans: salary('405.00', '45'), entries: hoursOnJobs(9, 9, 9, 9, 9) });
    expect(person.totals).toMatchObject({ hourly: 40_500, overtimePremium: 2250, gross: 42_750 });
  });

  it('29 CFR 778.113, figures ours: in a shorter week the rate stays the salary over the hours it covers', () => {
    const person = ada({ plans: salary('900.00', '45'), entries: hoursOnJobs(8, 8, 8, 8, 8, 2) });
    // 900 / 45 = 20.00; 2 hours over 40 carry 10.00 each.
    expect([person.regularRate, person.totals.overtimePremium, person.totals.gross]).toEqual(['20', 2000, 92_000]);
    const steps = lineOf(person, 'overtime_premium')?.working.map((step) => step.result) ?? [];
    expect(steps.slice(-4)).toEqual(['900.00', '840.0000', '20.0000', '20.00']);
  });

  it('California Labor Code 515(d): a salary is divided by no more than 40 hours', () => {
    const place = { personId: 'ada', placeId: 'p', name: 'There', ruleSet: overtimeRuleSet('us_ca'), minimumWages: [] };
    const person = ada({ plans: salary('800.00', '45'), entries: hoursOnJobs(8, 8, 8, 8, 8, 5), places: [place] });
    // 20.00 an hour: 5 h beyond at 20.00 and half of it on top.
    expect(person.totals).toMatchObject({ hourly: 90_000, overtimePremium: 5000 });
  });

  it('29 CFR 778.113(b), 1981 figures: 1,040.00 a month is 240.00 a week', () => {
    const plans = [aPlan({ kind: 'salary', amount: '1040.00', period: 'monthly', coversHours: '40' })];
    expect(ada({ plans, entries: hoursOnJobs(8, 8, 8), rules: low }).totals.gross).toBe(24_000);
  });
});

/** Older published figures lie under today's minimum wage. */
const low = { ...aWeek().rules, minimumWage: '1' };

describe('day and job rates', () => {
  it('DOL Fact Sheet #79G: 57.00 a day for seven 7-hour days is 435.64 (printed 435.63 from rounded rates)', () => {
    const plans = [aPlan({ kind: 'day_rate', daily: '57.00' })];
    const person = ada({ plans, entries: hoursOnJobs(7, 7, 7, 7, 7, 7, 7) });
    expect(person.totals).toMatchObject({ hourly: 39_900, overtimePremium: 3664, gross: 43_564 });
  });

  it('29 CFR 778.112, figures ours: 16 jobs at 45.00 in 48 hours', () => {
    const plans = [aPlan({ kind: 'job_rate', perJob: '45.00', other: otherTime('10') })];
    const doneLines = Array.from({ length: 16 }, (_, n) => aDoneLine(n, 0));
    const again = { ...aDoneLine(15, 0), lineId: 'second line of the same visit' };
    const person = ada({ plans, entries: hoursOnJobs(8, 8, 8, 8, 8, 8), doneLines: [...doneLines, again] });
    expect(person.totals).toMatchObject({ flat: 72_000, overtimePremium: 6000, gross: 78_000 });
  });
});

describe('guarantees and choices', () => {
  it('pays the guaranteed weekly amount where less was earned, and all of it is in the rate (29 CFR 778.109)', () => {
    const plans = [aPlan({ kind: 'weekly_guarantee', hourly: '10', percent: '5', weekly: '700.00' })];
    const person = ada({ plans, entries: hoursOnJobs(10, 10, 10, 10, 10), doneLines: [aDoneLine(1, 100_000)] });
    // 500 + 50 is made up to 700; 700 / 50 = 14.00; 10 h x 7.00.
    expect(person.totals).toMatchObject({ makeUp: 15_000, overtimePremium: 7000, gross: 77_000 });
  });

  it('pays the better of hourly and commission and says why', () => {
    const plans = [aPlan({ kind: 'better_of', hourly: '15', percent: '40', other: otherTime('10') })];
    const entries = [...hoursOnJobs(8, 8, 8, 8), ...waiting(2)];
    const week = (sold: number) => ada({ plans, entries, doneLines: [aDoneLine(1, sold)] });
    expect(week(100_000).totals).toMatchObject({ hourly: 51_000, commission: 0 });
    expect(week(150_000).totals).toMatchObject({ hourly: 2000, commission: 60_000 });
    expect(lineOf(week(150_000), 'commission')?.rule).toContain('510.00 by the hour, 620.00 by commission');
  });

  it('carries a draw as a credit inside the month, pays it back from commission above the draw, and forgives the rest', () => {
    const drawOf = (weekly: string) => aPlan({ kind: 'draw', percent: '40', weekly, other: otherTime('10') });
    const plans = [drawOf('400.00')];
    const week = (sold: number, drawDeficitCents: number, startsOn = '2026-05-04') => {
      const days = (Date.parse(startsOn) - Date.parse('2026-05-04')) / 86_400_000;
      const at = (instant: string) => new Date(Date.parse(instant) + days * 86_400_000).toISOString();
      const doneLines = sold === 0 ? [] : [aDoneLine(1, sold, { doneAt: at('2026-05-05T18:00:00.000Z') })];
      const entries = hoursOnJobs(8, 8, 8, 8, 8).map((entry) => ({
        ...entry,
        startedAt: at(entry.startedAt),
        endedAt: at(entry.endedAt ?? ''),
      }));
      const carried = [{ personId: 'ada', drawDeficitCents, weeks: [] }];
      const span = { startsAt: at('2026-05-04T04:00:00.000Z'), endsAt: at('2026-05-11T04:00:00.000Z') };
      return ada({ ...span, asOf: span.endsAt, plans, doneLines, entries, carried });
    };
    // Commission 320.00: 80.00 is drawn and carried.
    const short = week(80_000, 0);
    expect([short.totals.gross, short.carries?.drawDeficitCents]).toEqual([40_000, 8000]);
    // Commission 450.00: 50.00 of it pays back, never below the draw.
    const good = week(112_500, 8000);
    expect([good.totals.gross, good.carries?.drawDeficitCents]).toEqual([40_000, 3000]);
    // The week of May 25 is the last that ends in May.
    expect(week(80_000, 3000, '2026-05-25').carries?.drawDeficitCents).toBe(0);
    // Without any commission the draw is paid; where that is under the minimum wage, the make-up is never paid back.
    const bare = week(0, 0);
    expect(bare.totals).toMatchObject({ makeUp: 40_000, gross: 40_000 });
    const floor = ada({ plans: [drawOf('100.00')], entries: hoursOnJobs(8, 8, 8, 8, 8) });
    expect([floor.totals.gross, floor.carries?.drawDeficitCents]).toEqual([29_000, 10_000]);
  });
});

describe('tiered percent', () => {
  const tiers = [
    { over: '0', percent: '30' },
    { over: '1000', percent: '40' },
    { over: '2000', percent: '50' },
  ];
  const week = (mode: 'marginal' | 'whole', sold: number) => {
    const plans = [aPlan({ kind: 'tiered_percent', tiers, mode, period: 'week', other: otherTime('10') })];
    return ada({ plans, entries: hoursOnJobs(8, 8, 8, 8, 8), doneLines: [aDoneLine(1, sold)] }).totals.commission;
  };

  it('marginal: each part at its own tier; whole: everything at the tier reached (figures ours)', () => {
    expect(week('marginal', 250_000)).toBe(30_000 + 40_000 + 25_000);
    expect(week('whole', 250_000)).toBe(125_000);
    expect(week('whole', 100_000)).toBe(30_000);
    expect(week('whole', 100_001)).toBe(40_000);
  });

  it('29 CFR 778.120(a)(1), four weeks: 480.00 at the month’s end brings 24.86 of overtime to the weeks of the month', () => {
    const at = (instant: string) => new Date(Date.parse(instant) + 21 * 86_400_000).toISOString();
    const entries = hoursOnJobs(8, 8, 8, 8, 8, 2).map((entry) => ({
      ...entry,
      startedAt: at(entry.startedAt),
      endedAt: at(entry.endedAt ?? ''),
    }));
    const earlier = (startsOn: string, hours: string, premiumHours: string) => ({
      ...{ startsOn, hours, premiumHours },
      ...{ tierBaseCents: 120_000, tierPaidCents: 12_000 },
    });
    const weeks = [
      earlier('2026-05-04', '50', '5'),
      earlier('2026-05-11', '48', '4'),
      earlier('2026-05-18', '40', '0'),
    ];
    const lastOfMay = (second: string) => {
      const month = [
        { over: '0', percent: '10' },
        { over: second, percent: '20' },
      ];
      const other = otherTime('10');
      return ada({
        ...{
          startsAt: '2026-05-25T04:00:00.000Z',
          endsAt: '2026-06-01T04:00:00.000Z',
          asOf: '2026-06-01T04:00:00.000Z',
        },
        plans: [aPlan({ kind: 'tiered_percent', tiers: month, mode: 'whole', period: 'month', other })],
        entries,
        doneLines: [aDoneLine(1, 120_000, { doneAt: at('2026-05-05T18:00:00.000Z') })],
        carried: [{ personId: 'ada', drawDeficitCents: 0, weeks }],
      });
    };
    // 4 x 1,200.00 is under 8,000: 10 % was paid all along and nothing is left to settle.
    const short = lastOfMay('8000');
    expect(lineOf(short, 'commission_settlement')).toBeUndefined();
    // Over 4,000 everything earns 20 %: 480.00 more, 120.00 to each of the four weeks.
    const reached = lastOfMay('4000');
    expect(lineOf(reached, 'commission_settlement')?.amountCents).toBe(48_000);
    expect(lineOf(reached, 'settlement_premium')?.amountCents).toBe(2486);
    expect(reached.regularRate).toBe(short.regularRate);
    expect(reached.totals.gross - short.totals.gross).toBe(48_000 + 2486);
  });
});

describe('what a plan adds', () => {
  it('DOL Fact Sheet #54: 24 of 48 hours with a shift premium of 1.00 on 8.00 are 442.00', () => {
    // 08:00 to 16:00 in New York; the premium is for the four hours from noon.
    const premiums = [{ label: 'Late shift', perHour: '1.00', kinds: [], between: { from: '12:00', to: '23:59' } }];
    const plans = [aPlan({ kind: 'hourly', hourly: '8.00' }, { premiums })];
    const person = ada({ plans, entries: hoursOnJobs(8, 8, 8, 8, 8, 8) });
    expect(lineOf(person, 'premium_pay')).toMatchObject({ hours: '24', amountCents: 2400 });
    expect([person.regularRate, person.totals.gross]).toEqual(['17/2', 44_200]);
    expect(lineOf(person, 'premium_pay')?.working[0]?.note).toBe('Worked between 12:00 and 23:59');
    const american = ada({ plans, entries: hoursOnJobs(8), clock: '12' });
    expect(lineOf(american, 'premium_pay')?.working[0]?.note).toBe('Worked between 12:00 pm and 11:59 pm');
  });

  it('29 CFR 778.210: 10 % of straight and overtime pay needs no recomputation (figures of a published article)', () => {
    const plans = [aPlan({ kind: 'hourly', hourly: '100.00' }, { percentOfTotal: '10' })];
    const person = ada({ plans, entries: hoursOnJobs(10, 10, 10, 10, 10) });
    expect(lineOf(person, 'percentage_bonus')).toMatchObject({ amountCents: 55_000, inRegularRate: false });
    expect(person.totals.gross).toBe(605_000);
  });

  it('pays training and helping at their own rates, a service at the best of its visit, and promised bonuses', () => {
    const extras = {
      trainingHourly: '12',
      helperHourly: '14',
      hourlyByService: [
        { serviceId: 'wash', hourly: '25' },
        { serviceId: 'wax', hourly: '30' },
      ],
      perAddOn: '5',
      attendance: { amount: '50', days: 4 },
    };
    const entries = [
      ...aWorkedWeek([60], { visitId: 'visit-1', id: 'a' }),
      ...aWorkedWeek([0, 60], { visitId: 'visit-2', id: 'b' }),
      ...aWorkedWeek([0, 0, 60], { kind: 'training', id: 'c' }),
      ...aWorkedWeek([0, 0, 0, 60], { kind: 'shop', id: 'd' }),
    ];
    const trainee = aCrew('bo', 'ada').map((one) => ({ ...one, isTrainee: one.personId === 'ada' }));
    const doneLines = [
      aDoneLine(1, 0),
      aDoneLine(1, 0, { lineId: 'wax', serviceId: 'wax', isAddOn: true }),
      aDoneLine(2, 0, { crew: trainee }),
    ];
    const person = ada({ plans: [aPlan({ kind: 'hourly', hourly: '20' }, extras)], entries, doneLines });
    expect(person.lines.map((line) => [line.key, line.amountCents])).toEqual([
      ['hourly:plan:wax', 3000],
      ['hourly:plan:helper', 1400],
      ['hourly:plan:training', 1200],
      ['hourly:plan:all', 2000],
      ['bonus:add_on:wax', 500],
      ['bonus:attendance', 5000],
    ]);
  });

  it('California Labor Code 226.2: rest breaks of piece work are paid apart, 500.00 for 40 hours with 100 minutes', () => {
    const place = { personId: 'ada', placeId: 'p', name: 'There', ruleSet: overtimeRuleSet('us_ca'), minimumWages: [] };
    const base = { kind: 'flat_with_floor', floor: '1', other: otherTime('1') } as const;
    const rest = aWorkedWeek([0, 0, 0, 0, 0, 100], { kind: 'rest_break', id: 'rest' });
    const entries = [...aWorkedWeek([480, 480, 480, 480, 380]), ...rest];
    const plans = [aPlan(base, flat('500.00'))];
    const person = ada({ plans, entries, doneLines: [aDoneLine(1, 0)], places: [place] });
    // 500.00 over 38 h 20 min is 13.0435; 100 minutes of it are 21.74, of which 1.67 was paid by the hour.
    expect([person.totals.hourly, person.totals.flat]).toEqual([2174 + 1, 50_000]);
  });
});

describe('dates and shape', () => {
  it('takes the latest plan that had started, and dated rates after a plan that says so', () => {
    const plans = [
      aPlan({ kind: 'hourly', hourly: '10' }, {}, { id: 'a', startsOn: '2026-04-27' }),
      aPlan({ kind: 'hourly', hourly: '11' }, {}, { id: 'b', startsOn: '2026-05-04' }),
      aPlan({ kind: 'hourly', hourly: '12' }, {}, { id: 'c', startsOn: '2026-05-11' }),
    ];
    expect(ada({ plans, entries: hoursOnJobs(1) }).totals.hourly).toBe(1100);
    const back = [...plans.slice(0, 1), aPlan({ kind: 'rates' }, {}, { id: 'd', startsOn: '2026-05-04' })];
    expect(ada({ plans: back, entries: hoursOnJobs(1) }).warnings.map(({ code }) => code)).toContain('no_hourly_rate');
  });

  it('refuses tiers that fall or do not start at 0, and a flat plan without a flat amount', () => {
    const extras = aPlan({ kind: 'rates' }).plan.extras;
    const tiered = (tiers: { over: string; percent: string }[]) =>
      payPlan.safeParse({
        base: { kind: 'tiered_percent', tiers, mode: 'whole', period: 'week', other: otherTime('10') },
        extras,
      }).success;
    expect(
      tiered([
        { over: '0', percent: '5' },
        { over: '100', percent: '6' },
      ]),
    ).toBe(true);
    expect(tiered([{ over: '10', percent: '5' }])).toBe(false);
    expect(
      tiered([
        { over: '0', percent: '5' },
        { over: '100', percent: '4' },
      ]),
    ).toBe(false);
    const flatless = { base: { kind: 'flat_with_floor', floor: '10', other: otherTime('10') }, extras };
    expect(payPlan.safeParse(flatless).error?.issues[0]?.message).toBe('Give the flat amount of at least one service.');
  });
});
