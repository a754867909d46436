import { describe, expect, test } from 'vitest';
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

const ada = (parts: Partial<PayWeekInput>): PersonWeek => {
  const [person] = computePayWeek(aWeek(parts)).people;
  if (!person) throw new Error('the week has a person');
  return person;
};
const amounts = (person: PersonWeek) => person.lines.map((line) => [line.label, line.amountCents]);
const rules = aWeek().rules;

describe('hourly pay by service', () => {
  const wash = aDoneLine(1, 0, { visitId: 'v1' });
  const coating = aDoneLine(2, 0, { visitId: 'v1', serviceId: 'coating', serviceName: 'Coating' });
  const rates = [aRate('hourly', '20'), aRate('hourly', '26', { serviceId: 'coating' })];
  const entries = [
    anEntry('2026-05-04T12:00:00.000Z', '2026-05-04T14:00:00.000Z', { visitId: 'v1' }),
    anEntry('2026-05-04T14:00:00.000Z', '2026-05-04T15:00:00.000Z', { kind: 'travel', visitId: 'v1' }),
  ];

  test('is paid for the visit’s time on the job alone', () => {
    expect(amounts(ada({ rates, entries, doneLines: [wash, coating] }))).toEqual([
      ['Coating, by the clock', 5200],
      ['Hours by the clock', 2000],
    ]);
  });

  test('needs a finished line of the service', () => {
    expect(amounts(ada({ rates, entries, doneLines: [wash] }))).toEqual([['Hours by the clock', 6000]]);
  });
});

describe('product cost', () => {
  test('comes off what commission is a percentage of, from its date on', () => {
    const rates = [
      aRate('commission_percent', '10'),
      aRate('product_cost', '12.50', { serviceId: 'wash', startsOn: '2026-05-06' }),
    ];
    const doneLines = [aDoneLine(1, 20_000), aDoneLine(2, 20_000, { doneAt: '2026-05-06T18:00:00.000Z' })];
    // 10 % of 200.00, and of 200.00 less 12.50 (arithmetic).
    expect(amounts(ada({ rates, doneLines })).map(([, cents]) => cents)).toEqual([2000, 1875]);
  });

  test('never turns a line below zero', () => {
    const rates = [aRate('commission_percent', '10'), aRate('product_cost', '300', { serviceId: 'wash' })];
    expect(amounts(ada({ rates, doneLines: [aDoneLine(1, 20_000)] }))).toEqual([]);
  });
});

describe('a customer’s refund', () => {
  const rates = [aRate('hourly', '20'), aRate('commission_percent', '10')];
  const week = { entries: aWorkedWeek([540, 540, 540, 540, 540]), rates, doneLines: [aDoneLine(1, 90_000)] };

  test('lowers this week’s commission and the rate that it makes', () => {
    const person = ada({ ...week, adjustments: [anAdjustment('refund', -4500)] });
    // 45 h: 900.00 + 90.00 - 45.00 is 945.00, 21.00 an hour; 5 h of half of it 52.50 (29 CFR 778.121, computed by hand).
    expect(person.regularRate).toBe('21');
    expect(person.totals).toMatchObject({ commission: 4500, overtimePremium: 5250 });
  });

  test('takes nothing but commission, and says so', () => {
    const person = ada({ ...week, adjustments: [anAdjustment('refund', -20_000)] });
    expect(person.totals).toMatchObject({ hourly: 90_000, commission: 0, overtimePremium: 5000 });
    expect(person.warnings.map((warning) => warning.message).slice(-1)).toEqual([
      'The refund "As agreed" would take 200.00 from Ada Brook; this week’s commission allows 90.00. Hourly pay, floors and overtime stay whole (29 CFR 778.121).',
    ]);
  });
});

describe('counted amounts', () => {
  test('miles are paid back outside the rate, reviews inside it, with the count in the working', () => {
    const counted = { rateId: 'r', startsOn: '2026-01-01' };
    const person = ada({
      entries: aWorkedWeek([600]),
      rates: [aRate('hourly', '20')],
      adjustments: [
        anAdjustment('bonus', 3000, { counted: { ...counted, unit: 'review', quantity: '3', value: '10' } }),
        anAdjustment('reimbursement', 3081, {
          counted: { ...counted, unit: 'mile', quantity: '42.5', value: '0.725' },
        }),
      ],
    });
    expect(person.regularRate).toBe('23');
    expect(person.lines.flatMap((line) => line.working.map((step) => step.arithmetic))).toEqual(
      expect.arrayContaining(['3 reviews times 10.00', '42.5 miles times 0.725']),
    );
  });
});

describe('tips', () => {
  const crew = aCrew('ada', 'bo');

  test('one meant for a person is that person’s where the rule says so', () => {
    const tips = [aTip('t', 1000, { crew, forPersonId: 'ada' })];
    const paid = (goTo: 'crew' | 'person') =>
      ada({ tips, rules: { ...rules, tips: { goTo, cardFeePercent: '0' } } }).totals.tips;
    expect([paid('crew'), paid('person'), ada({ tips }).totals.tips]).toEqual([500, 1000, 500]);
  });

  test('somebody who may not share tips can’t be the one it is meant for', () => {
    const tips = [aTip('t', 1000, { crew: aCrew('ada'), forPersonId: 'manager' })];
    expect(ada({ tips, rules: { ...rules, tips: { goTo: 'person', cardFeePercent: '0' } } }).totals.tips).toBe(1000);
  });

  test('the card fee comes off card tips alone, never rounded against the crew', () => {
    const tips = [aTip('card', 1010), aTip('cash', 1000, { method: 'cash' })];
    // 10.10 less 3 % is 9.797 (DOL Fact Sheet #15: the actual fee at most).
    const person = ada({ tips, rules: { ...rules, tips: { goTo: 'crew', cardFeePercent: '3' } } });
    expect(person.lines.map((line) => line.amountCents)).toEqual([980, 1000]);
  });
});

describe('the rate in effect', () => {
  const entries = [
    ...aWorkedWeek([600, 600, 600, 600]),
    anEntry('2026-05-08T12:00:00.000Z', '2026-05-08T17:00:00.000Z', { kind: 'shop' }),
  ];
  const rates = [aRate('hourly', '18'), aRate('hourly', '12', { clockKind: 'shop' })];
  const agreed = { ratesInEffect: [{ personId: 'ada', signedOn: '2026-05-01' }] };

  test('pays overtime at the rate of the overtime hours, by an agreement made before', () => {
    const person = ada({ entries, rates, ...agreed });
    // The last 5 h were shop work: half of 12.00 times 5 (29 CFR 778.419, computed by hand).
    expect(person.totals.overtimePremium).toBe(3000);
    // Without it the weighted average: (40 x 18 + 5 x 12) / 45 = 17.3333 (29 CFR 778.115).
    expect(ada({ entries, rates }).totals.overtimePremium).toBe(4333);
  });

  test('commission brings half time of its own', () => {
    const withSale = { doneLines: [aDoneLine(1, 90_000)], rates: [...rates, aRate('commission_percent', '10')] };
    // 30.00 and 90.00 / 45 / 2 x 5 = 5.00.
    expect(ada({ entries, ...withSale, ...agreed }).totals.overtimePremium).toBe(3500);
  });

  test('holds neither when signed later nor when a rate is under the minimum wage', () => {
    const late = { ratesInEffect: [{ personId: 'ada', signedOn: '2026-05-06' }] };
    expect(ada({ entries, rates, ...late }).totals.overtimePremium).toBe(4333);
    const poor = [aRate('hourly', '18'), aRate('hourly', '7', { clockKind: 'shop' })];
    // (720.00 + 35.00) / 45 / 2 x 5.
    expect(ada({ entries, rates: poor, ...agreed }).totals.overtimePremium).toBe(4194);
  });
});
