import { expect, test } from 'vitest';
import { addedUp, fridayAfter, paydayFor, tickedAtFirst, weekNames, weekTotal } from './payday-model.ts';

const week = (number: number, startsOn: string, endsOn: string) => ({
  number,
  startsOn,
  endsOn,
  people: 1,
  grossCents: 1,
});
const weeks = [week(18, '2026-04-27', '2026-05-03'), week(19, '2026-05-04', '2026-05-10')];

test('the payday is the Friday after the newest ticked week, a week later for one that ends on a Friday', () => {
  const monday = '2026-05-11';
  expect(paydayFor(weeks, ['2026-04-27', '2026-05-04'], monday)).toBe('2026-05-15');
  expect(paydayFor(weeks, [], monday)).toBe('');
  expect(paydayFor(weeks, ['2026-04-27'], '2026-05-08')).toBe('2026-05-08');
  expect(paydayFor(weeks, ['2026-04-27'], '2026-05-09')).toBe('2026-05-15');
  expect(fridayAfter('2026-05-15')).toBe('2026-05-22');
  expect(fridayAfter('2026-05-14')).toBe('2026-05-15');
});

test('a few weeks that wait are ticked, many are left to the owner', () => {
  expect(tickedAtFirst(weeks)).toEqual(['2026-04-27', '2026-05-04']);
  expect(tickedAtFirst([...weeks, ...weeks])).toEqual([]);
});

test('weeks by name, and sums by person and week', () => {
  expect([weekNames(weeks.slice(0, 1)), weekNames(weeks), weekNames([...weeks, week(20, '', '')])]).toEqual([
    'Week 18',
    'Weeks 18 and 19',
    'Weeks 18, 19 and 20',
  ]);
  const sums = (startsOn: string, grossCents: number) => ({ startsOn, grossCents, tipCents: 5, reimbursementCents: 1 });
  const ada = { personId: 'ada', name: 'Ada', weeks: [sums('2026-04-27', 100), sums('2026-05-04', 20)] };
  const bo = { personId: 'bo', name: 'Bo', weeks: [sums('2026-05-04', 3)] };
  expect(addedUp(ada.weeks)).toEqual({ grossCents: 120, tipCents: 10, reimbursementCents: 2 });
  expect(weekTotal([ada, bo], '2026-05-04')).toEqual({ grossCents: 23, tipCents: 10, reimbursementCents: 2 });
});
