import { describe, expect, test } from 'vitest';
import type { PayWeekDto, PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import type { PayWarning } from '@driprail/shared/domain/pay/pay-week.types';
import { hoursSum, openWeeks, shareOfSales, troubles, weekAtHand, weekSums } from './week-model.ts';
import { aPersonWeek } from './testing/pay-line.factory.ts';

const ZONE = 'America/New_York';
const aWeek = (startsOn: string, state: PayWeekHead['state'], days = 7): PayWeekHead => ({
  id: startsOn,
  startsOn,
  endsOn: startsOn,
  startsAt: `${startsOn}T04:00:00.000Z`,
  endsAt: new Date(Date.parse(`${startsOn}T04:00:00Z`) + days * 86_400_000).toISOString(),
  number: 1,
  state,
  checkedAt: null,
  checkedBy: null,
  lockedAt: null,
  lockedBy: null,
  version: 0,
});
const weeks = [
  aWeek('2026-05-11', 'draft'),
  aWeek('2026-05-04', 'draft'),
  aWeek('2026-04-27', 'locked'),
  aWeek('2025-01-06', 'draft'),
];

describe('which week', () => {
  test('the last one that is over comes first, until it is locked', () => {
    expect(weekAtHand(weeks, '2026-05-14T15:00:00Z')?.startsOn).toBe('2026-05-04');
    const locked = weeks.map((week) => (week.startsOn === '2026-05-04' ? { ...week, state: 'locked' as const } : week));
    expect(weekAtHand(locked, '2026-05-14T15:00:00Z')?.startsOn).toBe('2026-05-11');
    expect(weekAtHand([], '2026-05-14T15:00:00Z')).toBeNull();
  });

  test('corrections are paid in the first week after the last locked one', () => {
    expect(openWeeks(weeks).map((week) => week.startsOn)).toEqual(['2026-05-04', '2026-05-11']);
  });
});

test('the share of sales leaves tips out', () => {
  expect(shareOfSales(667_938, 33_400, 1_739_400)).toBe('36.5');
  expect(shareOfSales(100, 0, 0)).toBeNull();
});

test('sums are exact', () => {
  const people = [
    aPersonWeek({ hoursWorked: '1/3', totals: { ...aPersonWeek({}).totals, gross: 101 } }),
    aPersonWeek({ hoursWorked: '2/3', totals: { ...aPersonWeek({}).totals, gross: 202 } }),
  ];
  expect(hoursSum(people, 'hoursWorked')).toBe('1');
  expect(weekSums(people).gross).toBe(303);
});

describe('what asks for somebody', () => {
  const open: PayWarning = {
    code: 'open_entry',
    personId: 'sefa',
    isBlocking: true,
    message: '',
    entryId: 'e1',
    jobId: null,
  };
  const short: PayWarning = { ...open, code: 'short_meal_break', isBlocking: false, entryId: 'e2' };
  const dto = (since: string, state: PayWeekHead['state'] = 'draft'): PayWeekDto => ({
    week: aWeek('2026-05-11', state),
    people: [aPersonWeek({ warnings: [short, open] })],
    adjustments: [],
    salesCents: 0,
    lineIds: {},
    engineVersion: '1',
    lateDifferences: [],
    unended: [],
    correctedLines: {},
    customers: {},
    yearsToDate: {},
    timeOff: {},
    warningTimes: { e1: since },
  });

  test('somebody at work just now is no trouble, yesterday’s open entry is, and blocks first', () => {
    const now = '2026-05-14T15:00:00Z';
    expect(troubles(dto('2026-05-14T12:00:00Z'), now, ZONE)).toEqual([short]);
    expect(troubles(dto('2026-05-13T12:00:00Z'), now, ZONE)).toEqual([open, short]);
  });

  test('once the week is over an open entry is trouble', () => {
    expect(troubles(dto('2026-05-17T20:00:00Z'), '2026-05-18T12:00:00Z', ZONE)).toContain(open);
  });

  test('a locked week asks for nothing', () => {
    expect(troubles(dto('2026-05-13T12:00:00Z', 'locked'), '2026-05-20T12:00:00Z', ZONE)).toEqual([]);
  });
});
