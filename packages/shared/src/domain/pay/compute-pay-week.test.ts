import { describe, expect, it } from 'vitest';
import { computePayWeek } from './compute-pay-week.ts';
import type { PayWeekInput, PersonWeek } from './pay-week.types.ts';
import {
  aCrew,
  aDoneLine,
  anAdjustment,
  anEntry,
  aRate,
  aTip,
  aWeek,
  aWorkedWeek,
} from './testing/pay-week.factory.ts';

function ada(input: PayWeekInput): PersonWeek {
  const [person] = computePayWeek(input).people;
  if (!person) throw new Error('The week names nobody.');
  return person;
}

function line(person: PersonWeek, kind: string) {
  return person.lines.find((item) => item.kind === kind);
}

const codes = (person: PersonWeek): string[] => person.warnings.map((warning) => warning.code);

// 42 h 15 min at 19.50 and 6 % commission: the company's own worked example, computed by hand.
const commissionWeek = (): PayWeekInput =>
  aWeek({
    entries: aWorkedWeek([521, 507, 0, 533, 498, 476], { visitId: 'visit-4127' }),
    rates: [aRate('hourly', '19.50', { startsOn: '2026-03-01' }), aRate('commission_percent', '6')],
    doneLines: [aDoneLine(4127, 24000), aDoneLine(4133, 42000), aDoneLine(4151, 56000), aDoneLine(4170, 26500)].map(
      (item) => ({ ...item, visitId: 'visit-4127' }),
    ),
    tips: [
      aTip('t1', 2000),
      aTip('t2', 3500),
      aTip('t3', 1200),
      aTip('t4', 500, { method: 'cash', alreadyReceived: true }),
    ],
    adjustments: [anAdjustment('correction', 795, { correctsLineId: 'old-line' })],
  });

describe('a week by the hour with commission', () => {
  it('puts commission into the regular rate and leaves tips and corrections out (29 CFR 778.117, 778.118, 531.60)', () => {
    const person = ada(commissionWeek());
    expect(person.hoursWorked).toBe('169/4');
    expect(person.overtimeHours).toBe('9/4');
    expect(person.totals).toEqual({
      hourly: 82388,
      flat: 0,
      commission: 8910,
      overtimePremium: 2431,
      makeUp: 0,
      tips: 6700,
      tipsAlreadyReceived: 500,
      adjustments: 795,
      gross: 101224,
    });
    expect(person.warnings).toEqual([]);
  });

  it('shows how the overtime was worked, step by step', () => {
    const steps = line(ada(commissionWeek()), 'overtime_premium')?.working.map(({ label, arithmetic, result }) => [
      label,
      arithmetic,
      result,
    ]);
    expect(steps).toEqual([
      ['What Ada Brook worked', '42 h 15 min', '42.25 h'],
      ['By the hour', '42.25 h times 19.50', '823.88'],
      ['Commission of this week counts', '14.40 + 25.20 + 33.60 + 15.90', '89.10'],
      ['Does not count', '72.00 tips, 7.95 corrections', ''],
      ['Together', '823.88 + 89.10', '912.98'],
      ['The regular rate', '912.98 divided by 42.25 h', '21.6090'],
      ['Half of it, for the hours over 40', 'half of 21.6090 times 2.25 h', '24.31'],
    ]);
  });
});

describe('published weeks through the clock', () => {
  const sixDays = [480, 480, 480, 480, 480, 360]; // 46 hours

  it('29 CFR 778.110(a): 46 hours at 12.00 is 588.00', () => {
    expect(ada(aWeek({ entries: aWorkedWeek(sixDays), rates: [aRate('hourly', '12.00')] })).totals.gross).toBe(58800);
  });

  it('29 CFR 778.110(b): with a production bonus of 46.00 the rate is 13.00 and the week 637.00', () => {
    const person = ada(
      aWeek({
        entries: aWorkedWeek(sixDays),
        rates: [aRate('hourly', '12.00')],
        adjustments: [anAdjustment('bonus', 4600)],
      }),
    );
    expect(person.regularRate).toBe('13');
    expect(person.totals.gross).toBe(63700);
  });

  it('DOL Fact Sheet #56C, Example C: a discretionary bonus is paid and stays out of the rate', () => {
    const adjustments = [anAdjustment('bonus', 5000), anAdjustment('discretionary_bonus', 2500)];
    const person = ada(
      aWeek({ entries: aWorkedWeek([540, 540, 540, 540, 420]), rates: [aRate('hourly', '10.00')], adjustments }),
    );
    expect(person.totals.overtimePremium).toBe(1674);
    expect(person.totals.gross).toBe(52174);
  });

  it('29 CFR 778.112, figures ours: flat amounts per job over all hours, then half of it', () => {
    const doneLines = [1, 2, 3, 4, 5, 6, 7, 8]
      .map((n) => aDoneLine(n, 0))
      .concat([9, 10].map((n) => aDoneLine(n, 0, { serviceId: 'detail' })));
    const rates = [
      aRate('flat_service', '45.00', { serviceId: 'wash' }),
      aRate('flat_service', '180.00', { serviceId: 'detail' }),
    ];
    const person = ada(aWeek({ entries: aWorkedWeek([480, 480, 480, 480, 480, 480]), doneLines, rates }));
    expect(person.regularRate).toBe('15');
    expect(person.totals.gross).toBe(78000);
    expect(codes(person)).toContain('no_hourly_rate');
  });

  it('29 CFR 778.107, figures ours: five jobs at 60.00 in 44 hours are made up to 7.25', () => {
    const doneLines = [1, 2, 3, 4, 5].map((n) => aDoneLine(n, 0));
    const person = ada(
      aWeek({ entries: aWorkedWeek([528, 528, 528, 528, 528]), doneLines, rates: [aRate('flat_service', '60.00')] }),
    );
    expect(person.totals).toMatchObject({ flat: 30000, makeUp: 1900, overtimePremium: 1450, gross: 33350 });
    expect(codes(person)).toContain('under_minimum_wage');
  });

  it('29 USC 207(h), figures ours: five 10-hour days in Alaska pay the daily premium once', () => {
    const rules = { ...aWeek().rules, overtimeRuleSet: 'us_ak' };
    expect(
      ada(aWeek({ rules, entries: aWorkedWeek([600, 600, 600, 600, 600]), rates: [aRate('hourly', '20.00')] })).totals
        .gross,
    ).toBe(110000);
  });

  it('Alvarado v. Dart Container (Cal. 2018), figures ours: a flat-sum bonus brings overtime of its own', () => {
    const rules = { ...aWeek().rules, overtimeRuleSet: 'us_ca', minimumWage: '9.00' };
    const entries = aWorkedWeek([480, 480, 480, 480, 480, 360]);
    const bonus = [anAdjustment('bonus', 1500)];
    const person = ada(aWeek({ rules, entries, rates: [aRate('hourly', '10.00')], adjustments: bonus }));
    expect(person.totals.gross).toBe(50838);
    expect(line(person, 'overtime_premium')?.working.at(-1)?.arithmetic).toBe(
      'half of 10.0000 times 6 h + 3.3750 on the bonus',
    );
  });

  it('Alaska Statutes 23.10.060, figures ours: a 10-hour day in a short week still has 2 hours of overtime', () => {
    const rules = { ...aWeek().rules, overtimeRuleSet: 'us_ak' };
    const person = ada(aWeek({ rules, entries: aWorkedWeek([600]), rates: [aRate('hourly', '20.00')] }));
    expect([person.overtimeHours, person.totals.overtimePremium]).toEqual(['2', 2000]);
  });
});

describe('rates', () => {
  it('takes the most exact rate, then the latest that had started by the company-zone date', () => {
    const rates = [
      aRate('commission_percent', '5', { startsOn: '2026-05-05' }),
      aRate('commission_percent', '6', { serviceId: 'wash' }),
      aRate('commission_percent', '7', { personId: 'ada', startsOn: '2026-05-06' }),
      aRate('commission_percent', '8', { personId: 'ada', serviceId: 'wash', startsOn: '2026-05-07' }),
    ];
    const on = (doneAt: string) =>
      ada(aWeek({ rates, doneLines: [aDoneLine(1, 10000, { doneAt })] })).totals.commission;
    expect(on('2026-05-05T18:00:00.000Z')).toBe(600);
    expect(on('2026-05-07T03:30:00.000Z')).toBe(700); // Still 6 May in New York.
    expect(on('2026-05-07T04:00:00.000Z')).toBe(800);
  });

  it('pays a flat amount and a commission for the same line when both have started; 0 % means none', () => {
    const rates = [
      aRate('flat_service', '40'),
      aRate('commission_percent', '10'),
      aRate('commission_percent', '0', { personId: 'bo' }),
    ];
    const input = aWeek({
      rates,
      people: [
        { id: 'ada', name: 'Ada' },
        { id: 'bo', name: 'Bo' },
      ],
      doneLines: [aDoneLine(1, 10001, { crew: aCrew('ada', 'bo') })],
    });
    expect(computePayWeek(input).people.map(({ totals }) => [totals.flat, totals.commission])).toEqual([
      [2000, 500],
      [2000, 0],
    ]);
  });

  it('splits an entry across midnight where a new rate starts', () => {
    const rates = [aRate('hourly', '10'), aRate('hourly', '20', { startsOn: '2026-05-06' })];
    const person = ada(aWeek({ rates, entries: [anEntry('2026-05-06T02:00:00.000Z', '2026-05-06T06:00:00.000Z')] }));
    expect(person.hoursByDay).toEqual({ '2026-05-05': '2', '2026-05-06': '2' });
    expect(person.lines.map((item) => [item.rate, item.amountCents])).toEqual([
      ['10', 2000],
      ['20', 4000],
    ]);
  });

  it('pays a kind of work at its own rate', () => {
    const rates = [aRate('hourly', '20'), aRate('hourly', '15', { clockKind: 'travel' })];
    const entries = [
      anEntry('2026-05-05T12:00:00.000Z', '2026-05-05T14:00:00.000Z'),
      anEntry('2026-05-05T14:00:00.000Z', '2026-05-05T14:40:00.000Z', { kind: 'travel' }),
    ];
    expect(ada(aWeek({ rates, entries })).lines.map((item) => [item.label, item.amountCents])).toEqual([
      ['Hours by the clock', 4000],
      ['Travel, by the clock', 1000],
    ]);
  });
});

describe('a crew', () => {
  const people = [
    { id: 'ada', name: 'Ada' },
    { id: 'bo', name: 'Bo' },
    { id: 'cy', name: 'Cy' },
  ];
  const commissions = (parts: Partial<PayWeekInput>) =>
    computePayWeek(aWeek({ people, rates: [aRate('commission_percent', '10')], ...parts })).people.map(
      ({ totals }) => totals.commission,
    );

  it('shares whole cents, left-over cents by crew order', () => {
    expect(commissions({ doneLines: [aDoneLine(1, 10010, { crew: aCrew('cy', 'bo', 'ada') })] })).toEqual([
      333, 334, 334,
    ]);
  });

  it('shares by minutes, a trainee without a share', () => {
    const crew = aCrew('ada', 'bo', 'cy').map((member, index) => ({
      ...member,
      minutes: [30, 90, 60][index] ?? 0,
      isTrainee: member.personId === 'cy',
    }));
    const rules = { ...aWeek().rules, crewSplit: 'minutes' as const };
    expect(commissions({ rules, doneLines: [aDoneLine(1, 10000, { crew })] })).toEqual([250, 750, 0]);
  });

  it('shares by weights', () => {
    const crew = aCrew('ada', 'bo').map((member, index) => ({ ...member, weight: index === 0 ? 1.5 : 1 }));
    const rules = { ...aWeek().rules, crewSplit: 'weights' as const };
    expect(commissions({ rules, doneLines: [aDoneLine(1, 10000, { crew })] })).toEqual([600, 400, 0]);
  });
});

describe('deductions and warnings', () => {
  it('DOL Fact Sheet #16: at 7.75 for 30 hours at most 15.00 may be taken', () => {
    const person = ada(
      aWeek({
        entries: aWorkedWeek([360, 360, 360, 360, 360]),
        rates: [aRate('hourly', '7.75')],
        adjustments: [anAdjustment('deduction', -2000)],
      }),
    );
    expect(line(person, 'deduction')?.amountCents).toBe(-1500);
    expect(person.warnings.find((warning) => warning.code === 'deduction_refused')?.message).toContain('at most 15.00');
  });

  it('29 CFR 531.37: in an overtime week the cap counts 40 hours, and overtime stays whole', () => {
    const input = aWeek({
      entries: aWorkedWeek([600, 600, 600, 600, 600]),
      rates: [aRate('hourly', '8.25')],
      adjustments: [anAdjustment('deduction', -9999)],
    });
    expect(ada(input).totals).toMatchObject({ adjustments: -4000, overtimePremium: 4125, gross: 41250 + 4125 - 4000 });
  });

  it('leaves a deduction out where nothing may be taken', () => {
    const person = ada(
      aWeek({
        entries: aWorkedWeek([480]),
        rates: [aRate('hourly', '7.25')],
        adjustments: [anAdjustment('deduction', -100)],
      }),
    );
    expect(line(person, 'deduction')).toBeUndefined();
    expect(codes(person)).toEqual(['deduction_refused']);
  });

  it('stops an open entry and overlapping entries from being checked, and counts the time once', () => {
    const entries = [
      anEntry('2026-05-05T12:00:00.000Z', '2026-05-05T14:00:00.000Z'),
      anEntry('2026-05-05T13:00:00.000Z', null),
    ];
    const person = ada(aWeek({ entries, rates: [aRate('hourly', '10')], asOf: '2026-05-05T15:30:00.000Z' }));
    expect(person.hoursWorked).toBe('7/2');
    expect(person.warnings.map(({ code, isBlocking }) => [code, isBlocking])).toEqual([
      ['open_entry', true],
      ['overlapping_entries', true],
    ]);
  });

  it('writes clock times in warnings as the company does', () => {
    const entries = [anEntry('2026-05-05T18:30:00.000Z', null)];
    const asOf = '2026-05-05T19:30:00.000Z';
    const said = (clock: '12' | '24') => ada(aWeek({ entries, asOf, clock })).warnings[0]?.message;
    expect(said('24')).toContain('since Tue May 5 14:30.');
    expect(said('12')).toContain('since Tue May 5 2:30 pm.');
  });

  it('says once that a visit was done without clock time', () => {
    expect(codes(ada(aWeek({ doneLines: [aDoneLine(1, 100), { ...aDoneLine(1, 100), lineId: 'second' }] })))).toEqual([
      'done_without_clock',
    ]);
  });

  it('29 CFR 785.18 and 785.19: a relieved meal of 30 minutes is off, a shorter or interrupted one counts', () => {
    const meal = (from: string, to: string, interrupted = false) =>
      anEntry(from, to, { kind: 'meal_break', interrupted });
    const entries = [
      anEntry('2026-05-05T12:00:00.000Z', '2026-05-05T16:00:00.000Z'),
      meal('2026-05-05T16:00:00.000Z', '2026-05-05T16:30:00.000Z'),
      meal('2026-05-06T16:00:00.000Z', '2026-05-06T16:29:59.000Z'),
      meal('2026-05-07T16:00:00.000Z', '2026-05-07T16:30:00.000Z', true),
      anEntry('2026-05-08T16:00:00.000Z', '2026-05-08T16:20:00.000Z', { kind: 'rest_break' }),
    ];
    const person = ada(aWeek({ entries, rates: [aRate('hourly', '10')] }));
    expect(person.hoursByDay).toEqual({
      '2026-05-05': '4',
      '2026-05-06': '1799/3600',
      '2026-05-07': '1/2',
      '2026-05-08': '1/3',
    });
    expect(codes(person)).toEqual(['short_meal_break']);
  });
});
