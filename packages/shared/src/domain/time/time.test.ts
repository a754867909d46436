import { describe, expect, test } from 'vitest';
import { afterKnown, stamp } from './device.ts';
import { formatClock, formatMinutes, formatSpan } from './format.ts';
import { workweekAt, workweekOf } from './workweek.ts';
import { clockOf, dayOf, minutesBetween, weekStartOf } from './zone.ts';
import { dayBounds, instantOf } from './zone-instants.ts';

const NY = 'America/New_York';

describe('the company’s zone', () => {
  test('a day has 23 hours in spring and 25 in autumn', () => {
    const hours = (day: string) => {
      const { startsAt, endsAt } = dayBounds(day, NY);
      return minutesBetween(startsAt, endsAt) / 60;
    };
    expect(hours('2026-03-08')).toBe(23);
    expect(hours('2026-05-14')).toBe(24);
    expect(hours('2026-11-01')).toBe(25);
  });
  test('a clock time in the spring gap moves on by it; one that comes twice is the first', () => {
    expect(clockOf(instantOf('2026-03-08', '02:30', NY), NY)).toBe('03:30');
    expect(instantOf('2026-11-01', '01:30', NY)).toBe('2026-11-01T05:30:00.000Z');
  });
  test('late evening is still the same day', () => {
    expect(dayOf('2026-05-15T03:59:59.000Z', NY)).toBe('2026-05-14');
    expect(dayOf('2026-05-15T04:00:00.000Z', NY)).toBe('2026-05-15');
  });
  test('a week starts on the weekday of the rule', () => {
    expect(weekStartOf('2026-05-14', 1)).toBe('2026-05-11');
    expect(weekStartOf('2026-05-14', 7)).toBe('2026-05-10');
    expect(weekStartOf('2026-05-14', 4)).toBe('2026-05-14');
  });
});

describe('the workweek', () => {
  const rule = { startsOn: 1, startsAt: '05:00', zone: NY };
  test('is seven company days: 168 hours, 167 or 169 when the clocks change (29 CFR 778.105)', () => {
    const hours = (day: string) => {
      const week = workweekOf(day, rule);
      return minutesBetween(week.startsAt, week.endsAt) / 60;
    };
    expect([hours('2026-05-14'), hours('2026-03-05'), hours('2026-10-29')]).toEqual([168, 167, 169]);
  });
  test('an instant before its start time belongs to the week before', () => {
    expect(workweekAt('2026-05-11T08:59:00.000Z', rule).startsOn).toBe('2026-05-04');
    expect(workweekAt('2026-05-11T09:00:00.000Z', rule).startsOn).toBe('2026-05-11');
  });
});

describe('words', () => {
  test('follow the 12 or 24 hour clock', () => {
    expect(formatClock('2026-05-14T18:05:00.000Z', NY, '12')).toBe('2:05 pm');
    expect(formatClock('2026-05-14T18:05:00.000Z', NY, '24')).toBe('14:05');
    expect(formatSpan('2026-05-14T14:00:00.000Z', '2026-05-14T15:30:00.000Z', NY, '12')).toBe('10:00 to 11:30 am');
    expect(formatSpan('2026-05-14T15:00:00.000Z', '2026-05-14T17:00:00.000Z', NY, '12')).toBe('11:00 am to 1:00 pm');
  });
  test('lengths', () => {
    expect([0, 45, 60, 135, -5].map(formatMinutes)).toEqual(['0 min', '45 min', '1 h', '2 h 15', '−5 min']);
  });
});

describe('a phone’s clock', () => {
  const received = new Date('2026-05-14T15:00:00.900Z');
  test('is corrected by its offset, flagged over two minutes, and never runs ahead of the server', () => {
    expect(stamp('2026-05-14T14:58:00.000Z', 0, received)).toMatchObject({
      occurredAt: '2026-05-14T14:58:00.000Z',
      isCorrected: false,
    });
    expect(stamp('2026-05-16T14:58:00.000Z', 172_800_000, received)).toMatchObject({
      occurredAt: '2026-05-14T14:58:00.000Z',
      isCorrected: true,
    });
    expect(stamp('2026-05-14T16:00:00.000Z', 0, received)).toMatchObject({
      occurredAt: '2026-05-14T15:00:00.000Z',
      isCorrected: true,
    });
  });
});

test('of two phones with signal the order of arrival counts; a press from a dead zone keeps its time', () => {
  const known = '2026-05-14T15:00:02.000Z';
  const prompt = stamp('2026-05-14T15:00:01.000Z', 0, new Date('2026-05-14T15:00:03.000Z'));
  expect(afterKnown(prompt, known).occurredAt).toBe(known);
  expect(afterKnown(prompt, '2026-05-14T15:00:00.000Z').occurredAt).toBe('2026-05-14T15:00:01.000Z');
  expect(afterKnown(prompt, null)).toEqual(prompt);
  const kept = stamp('2026-05-14T15:00:01.000Z', 0, new Date('2026-05-14T16:00:00.000Z'));
  expect(afterKnown(kept, known)).toEqual(kept);
});
