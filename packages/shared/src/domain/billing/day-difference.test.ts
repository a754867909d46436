import { expect, test } from 'vitest';
import fc from 'fast-check';
import { dayDifference } from './day-difference.ts';

test('lines name every cent between invoiced and received, whatever was paid when', () => {
  const cents = fc.integer({ min: -1_000_000, max: 10_000_000 });
  const flows = fc.record({
    ...{ invoiced: cents, creditedOnThem: cents, receivedBeforeOnThem: cents },
    ...{ receivedOnThem: cents, receivedForEarlier: cents, receivedForUnbilled: cents },
  });
  fc.assert(
    fc.property(flows, (flow) => {
      const received = flow.receivedOnThem + flow.receivedForEarlier + flow.receivedForUnbilled;
      const lines = dayDifference(flow);
      expect(lines.reduce((total, line) => total + line.cents, 0)).toBe(flow.invoiced - received);
      expect(lines.some((line) => Object.is(line.cents, -0))).toBe(false);
    }),
  );
});

test('an invoice of 255.00 with a deposit of 50.00, 100.00 paid, 20.00 for an older one', () => {
  const lines = dayDifference({
    ...{ invoiced: 25_500, creditedOnThem: 0, receivedBeforeOnThem: 5000 },
    ...{ receivedOnThem: 10_000, receivedForEarlier: 2000, receivedForUnbilled: 0 },
  });
  expect(Object.fromEntries(lines.map(({ kind, cents }) => [kind, cents]))).toEqual({
    ...{ owed: 10_500, credited: 0, paid_before: 5000, for_earlier: -2000, for_unbilled: 0 },
  });
});
