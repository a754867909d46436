import fc from 'fast-check';
import { expect, test } from 'vitest';
import { computePayWeek } from '../compute-pay-week.ts';
import { aLine } from '../pay-line.ts';
import type { PayLine } from '../pay-week.types.ts';
import { randomWeek } from '../testing/random-weeks.ts';
import { addKinds, kindsOfPay } from './kinds-of-pay.ts';

const line = (kind: PayLine['kind'], amountCents: number, key: string = kind): PayLine =>
  aLine({
    key,
    personId: 'ada',
    kind,
    label: '',
    amountCents,
    isPayable: kind !== 'tip_already_received',
    rule: '',
    working: [],
  });
const facts = {
  isFederalOnly: true,
  settledHours: () => [],
  tipMethod: (tip: PayLine) => (tip.key === 'tip:a' ? 'card' : 'cash'),
} as const;

test('each kind stands apart, tips by how they came', () => {
  const lines = [
    line('hourly', 1000),
    line('salary', 200, 's'),
    line('overtime_premium', 30),
    line('tip', 500, 'tip:a'),
    line('tip', 70, 'tip:b'),
    line('tip_already_received', 900, 'tip:c'),
    line('deduction', -40),
  ];
  const kinds = kindsOfPay({ hoursWorked: '41', regularRate: '20', lines }, facts);
  expect(Object.fromEntries(Object.entries(kinds).filter(([, cents]) => cents !== 0))).toEqual({
    straight_pay: 1200,
    flsa_premium: 30,
    tips_card: 500,
    tips_cash: 70,
    tips_already_received: 900,
    deductions: -40,
  });
  expect(addKinds([kinds, kinds]).straight_pay).toBe(2400);
});

test('all kinds but tips already received add up to the gross, whatever the week', () => {
  fc.assert(
    fc.property(randomWeek, fc.boolean(), (week, isFederalOnly) => {
      for (const person of computePayWeek(week).people) {
        const { tips_already_received: _shown, ...kinds } = kindsOfPay(person, { ...facts, isFederalOnly });
        expect(Object.values(kinds).reduce((total, cents) => total + cents, 0)).toBe(person.totals.gross);
      }
    }),
    { numRuns: 200 },
  );
});
