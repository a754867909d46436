import { expect, test } from 'vitest';
import { fractionText, sum } from '../../money/exact.ts';
import { computePayWeek } from '../compute-pay-week.ts';
import { aWeek, anEntry } from '../testing/pay-week.factory.ts';
import { workedEntries } from './worked-entries.ts';

const entries = [
  // Began in the week before: only what lies inside counts.
  anEntry('2026-05-04T03:00:00Z', '2026-05-04T05:00:00Z', { id: 'edge' }),
  anEntry('2026-05-05T12:00:00Z', '2026-05-05T16:00:00Z', { id: 'morning' }),
  anEntry('2026-05-05T16:00:00Z', '2026-05-05T16:30:00Z', { id: 'meal', kind: 'meal_break' }),
  anEntry('2026-05-05T16:30:00Z', '2026-05-05T16:45:00Z', { id: 'rest', kind: 'rest_break' }),
  anEntry('2026-05-06T02:00:00Z', '2026-05-06T06:00:20Z', { id: 'night', kind: 'travel' }),
];

test('entries are cut at midnight and at the week’s edge, a meal break free of duty counts for nothing', () => {
  const found = workedEntries(aWeek({ entries }), 'ada').map(({ entryId, date, hours, isWorked }) => [
    entryId,
    date,
    fractionText(hours),
    isWorked,
  ]);
  expect(found).toEqual([
    ['edge', '2026-05-04', '1', true],
    ['morning', '2026-05-05', '4', true],
    ['meal', '2026-05-05', '0', false],
    ['rest', '2026-05-05', '1/4', true],
    ['night', '2026-05-05', '2', true],
    ['night', '2026-05-06', '361/180', true],
  ]);
});

test.each([null, 6, 15] as const)('the hours are those the engine paid, punches to the nearest %s minutes', (step) => {
  const week = aWeek({ entries });
  const input = { ...week, rules: { ...week.rules, punchRoundingMinutes: step } };
  const worked = workedEntries(input, 'ada');
  const total = fractionText(sum(worked.map((entry) => entry.hours)));
  expect(total).toBe(computePayWeek(input).people[0]?.hoursWorked);
});
