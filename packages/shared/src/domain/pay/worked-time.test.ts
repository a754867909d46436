import { describe, expect, it } from 'vitest';
import { computePayWeek } from './compute-pay-week.ts';
import type { PayWeekInput } from './pay-week.types.ts';
import { anEntry, aRate, aWeek } from './testing/pay-week.factory.ts';

const rates = [aRate('hourly', '10')];

function hoursOf(parts: Partial<PayWeekInput>) {
  const [person] = computePayWeek(aWeek({ rates, ...parts })).people;
  return { byDay: person?.hoursByDay, worked: person?.hoursWorked, overtime: person?.overtimeHours };
}

describe('days on which the clocks change (elapsed time; DOL Hours Worked Advisor)', () => {
  const spring = {
    startsAt: '2026-03-02T05:00:00.000Z',
    endsAt: '2026-03-09T04:00:00.000Z',
    asOf: '2026-03-10T00:00:00.000Z',
  };
  const autumn = {
    startsAt: '2026-10-26T04:00:00.000Z',
    endsAt: '2026-11-02T05:00:00.000Z',
    asOf: '2026-11-03T00:00:00.000Z',
  };

  it('counts 7 hours from 23:00 to 07:00 in spring', () => {
    const entries = [anEntry('2026-03-08T04:00:00.000Z', '2026-03-08T11:00:00.000Z')];
    expect(hoursOf({ ...spring, entries })).toMatchObject({
      byDay: { '2026-03-07': '1', '2026-03-08': '6' },
      worked: '7',
    });
  });

  it('counts 9 hours from 23:00 to 07:00 in autumn', () => {
    const entries = [anEntry('2026-11-01T03:00:00.000Z', '2026-11-01T12:00:00.000Z')];
    expect(hoursOf({ ...autumn, entries })).toMatchObject({
      byDay: { '2026-10-31': '1', '2026-11-01': '8' },
      worked: '9',
    });
  });

  it('has weeks of 167 and 169 hours', () => {
    expect(hoursOf({ ...spring, entries: [anEntry(spring.startsAt, spring.endsAt)] }).worked).toBe('167');
    expect(hoursOf({ ...autumn, entries: [anEntry(autumn.startsAt, autumn.endsAt)] }).worked).toBe('169');
  });
});

describe('the edges of days and weeks', () => {
  it('cuts an entry at midnight of the company zone', () => {
    const entries = [anEntry('2026-05-06T03:30:00.000Z', '2026-05-06T04:45:00.000Z')];
    expect(hoursOf({ entries }).byDay).toEqual({ '2026-05-05': '1/2', '2026-05-06': '3/4' });
  });

  it('cuts an entry at the edge of the workweek, each week its own part', () => {
    const entries = [anEntry('2026-05-11T02:00:00.000Z', '2026-05-11T07:00:00.000Z')];
    expect(hoursOf({ entries })).toMatchObject({ byDay: { '2026-05-10': '2' }, worked: '2' });
    const next = { startsAt: '2026-05-11T04:00:00.000Z', endsAt: '2026-05-18T04:00:00.000Z' };
    expect(hoursOf({ ...next, entries })).toMatchObject({ byDay: { '2026-05-11': '3' }, worked: '3' });
  });

  it('follows a workweek that starts in the morning, with days by the calendar', () => {
    const week = { startsAt: '2026-05-04T10:00:00.000Z', endsAt: '2026-05-11T10:00:00.000Z' };
    const entries = [anEntry('2026-05-11T03:00:00.000Z', '2026-05-11T11:00:00.000Z')];
    expect(hoursOf({ ...week, entries }).byDay).toEqual({ '2026-05-10': '1', '2026-05-11': '6' });
  });

  it('takes workdays from the start of the workweek (California Labor Code 500)', () => {
    const rules = { ...aWeek().rules, overtimeRuleSet: 'us_ca' };
    const week = { rules, startsAt: '2026-05-04T10:00:00.000Z', endsAt: '2026-05-11T10:00:00.000Z' };
    // 18:00 to 06:00 is one workday of 12 hours for a week that starts at 06:00, though two dates.
    const night = [anEntry('2026-05-05T22:00:00.000Z', '2026-05-06T10:00:00.000Z')];
    expect(hoursOf({ ...week, entries: night }).overtime).toBe('4');
    expect(hoursOf({ rules, entries: night }).overtime).toBe('0');
  });

  it('cuts instants to whole seconds', () => {
    expect(hoursOf({ entries: [anEntry('2026-05-06T12:00:00.900Z', '2026-05-06T12:00:01.100Z')] }).worked).toBe(
      '1/3600',
    );
  });

  it('measures an open entry to the moment asked for, never past the week', () => {
    const entries = [anEntry('2026-05-11T02:00:00.000Z', null)];
    expect(hoursOf({ entries, asOf: '2026-05-11T03:00:00.000Z' }).worked).toBe('1');
    expect(hoursOf({ entries, asOf: '2026-05-11T12:00:00.000Z' }).worked).toBe('2');
    expect(hoursOf({ entries, asOf: '2026-05-10T00:00:00.000Z' }).worked).toBe('0');
  });

  it('takes no time from a clock-out that was forgotten, until somebody settles it', () => {
    const entries = [anEntry('2026-05-11T02:00:00.000Z', null)];
    expect(hoursOf({ entries, asOf: '2026-05-20T00:00:00.000Z' }).worked).toBe('0');
  });

  it('takes meal breaks that touch for one break', () => {
    const meal = (from: string, to: string) => anEntry(from, to, { kind: 'meal_break' });
    const entries = [
      meal('2026-05-06T16:00:00.000Z', '2026-05-06T16:15:00.000Z'),
      meal('2026-05-06T16:15:00.000Z', '2026-05-06T16:30:00.000Z'),
    ];
    expect(hoursOf({ entries }).worked).toBe('0');
  });
});
