import { expect, test } from 'vitest';
import { weekDifference, type PersonFigures } from './week-difference.ts';

const none = { hourly: 0, flat: 0, commission: 0, overtimePremium: 0, makeUp: 0, tips: 0, tipsAlreadyReceived: 0 };
const figures = (personId: string, hoursWorked: string, hourly: number, tips = 0): PersonFigures => ({
  personId,
  name: personId,
  hoursWorked,
  totals: { ...none, adjustments: 0, hourly, tips, gross: hourly + tips },
});

test('names what differs, the largest first, and leaves out who is the same', () => {
  const before = [figures('ada', '40', 80_000), figures('bo', '38', 70_000, 500), figures('cy', '10', 20_000)];
  const after = [figures('ada', '40', 80_000), figures('bo', '38', 70_000, 700), figures('dee', '41', 90_000)];
  expect(weekDifference(before, after).map(({ personId, parts }) => [personId, parts])).toEqual([
    ['dee', [{ part: 'hourly', beforeCents: 0, afterCents: 90_000 }]],
    ['cy', [{ part: 'hourly', beforeCents: 20_000, afterCents: 0 }]],
    ['bo', [{ part: 'tips', beforeCents: 500, afterCents: 700 }]],
  ]);
});

test('hours alone are a difference', () => {
  const [only] = weekDifference([figures('ada', '40', 0)], [figures('ada', '39', 0)]);
  expect(only).toMatchObject({ before: { hours: '40' }, after: { hours: '39' }, parts: [] });
  expect(weekDifference([], [])).toEqual([]);
});
