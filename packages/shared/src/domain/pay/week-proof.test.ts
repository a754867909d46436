import fc from 'fast-check';
import { expect, test } from 'vitest';
import { computePayWeek, ENGINE_VERSION } from './compute-pay-week.ts';
import type { PayWeekInput } from './pay-week.types.ts';
import { plannedWeek } from './testing/random-plans.ts';
import { randomWeek } from './testing/random-weeks.ts';
import { aRate, aWeek, aWorkedWeek } from './testing/pay-week.factory.ts';
import { weekDifferences, type LockedWeek } from './week-proof.ts';

/** As a database keeps it: through JSON, with the keys of objects in another order. */
function locked(input: PayWeekInput): LockedWeek {
  const people = computePayWeek(input).people.map(({ lines, ...summary }) => ({
    personId: summary.personId,
    grossCents: summary.totals.gross,
    summary,
    lines: lines.map((line, position) => {
      const { key, amountCents, isPayable } = line;
      return { position, key, amountCents, isPayable, line };
    }),
  }));
  return turned({ engineVersion: ENGINE_VERSION, snapshot: input, people }) as LockedWeek;
}

function turned(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(turned);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value)
      .toReversed()
      .map(([key, part]) => [key, turned(part)]),
  );
}

const week = () => locked(aWeek({ entries: aWorkedWeek([540, 540, 540, 540, 540]), rates: [aRate('hourly', '20')] }));

test('a week worked out again from its snapshot is the same to the byte', () => {
  fc.assert(
    fc.property(fc.oneof(randomWeek, plannedWeek), (input) => {
      expect(weekDifferences(locked(input))).toEqual([]);
    }),
    { numRuns: 100 },
  );
}, 60_000);

test('a changed cent is found with its person and line', () => {
  const [person] = week().people;
  const first = person?.lines[0];
  if (!person || !first) throw new Error('Ada worked.');
  const changed = {
    ...week(),
    people: [{ ...person, lines: [{ ...first, amountCents: 1 }, ...person.lines.slice(1)] }],
  };
  expect(weekDifferences(changed).map(({ personId, key }) => [personId, key])).toEqual([
    ['ada', 'hourly:hourly-20:all'],
  ]);
});

test('a changed snapshot, a missing person and an unknown engine are differences', () => {
  const raised = { ...week().snapshot, rates: [aRate('hourly', '21')] };
  expect(weekDifferences({ ...week(), snapshot: raised }).map(({ key }) => key)).toContain('summary');
  expect(weekDifferences({ ...week(), people: [] }).length).toBeGreaterThan(0);
  expect(weekDifferences({ ...week(), engineVersion: '0' }).map(({ key }) => key)).toEqual(['engine']);
});
