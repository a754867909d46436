import { describe, expect, test } from 'vitest';
import ICAL from 'ical.js';
import { calendarFile } from './calendar.ts';
import type { CalendarEntry } from './calendar.ts';

const entry: CalendarEntry = {
  visitId: '01900000-0000-7000-8000-000000000001',
  sequence: 3,
  from: '2026-05-14T14:00:00.000Z',
  to: '2026-05-14T15:00:00.000Z',
  madeAt: '2026-05-12T08:00:00.000Z',
  summary: 'Tern & Tide',
  description: 'Inside and out',
  url: 'https://ternandtide.example/c/abc',
  isCalledOff: false,
};
const lines = (changes: Partial<CalendarEntry> = {}) => unfolded(calendarFile({ ...entry, ...changes })).split('\r\n');
const unfolded = (text: string) => text.replace(/\r\n[ \t]/g, '');
const valueOf = (name: string, changes: Partial<CalendarEntry>) =>
  lines(changes)
    .find((line) => line.startsWith(`${name}:`))
    ?.slice(name.length + 1);

describe('the calendar file', () => {
  test('holds what a calendar and an event must', () => {
    // RFC 5545 3.4, 3.6, 3.6.1: PRODID and VERSION:2.0; UID and DTSTAMP; DTEND or DURATION, not both.
    const all = lines();
    expect(all).toEqual(
      expect.arrayContaining([
        'BEGIN:VCALENDAR',
        'PRODID:-//Driprail//Messages//EN',
        'VERSION:2.0',
        'METHOD:PUBLISH',
        `UID:visit-${entry.visitId}@driprail`,
        'SEQUENCE:3',
        'STATUS:CONFIRMED',
        'END:VCALENDAR',
      ]),
    );
    expect(all.some((line) => line.startsWith('DURATION'))).toBe(false);
  });

  test('gives times in UTC', () => {
    // RFC 5545 3.3.5: DATE WITH UTC TIME is written like 19980119T070000Z.
    expect(valueOf('DTSTART', { from: '1998-01-19T07:00:00.000Z' })).toBe('19980119T070000Z');
    expect(valueOf('DTSTAMP', {})).toBe('20260512T080000Z');
  });

  test('is struck by STATUS:CANCELLED under the same UID', () => {
    // RFC 5545 3.8.1.11, 3.8.7.4.
    expect(lines({ isCalledOff: true, sequence: 4 })).toEqual(
      expect.arrayContaining(['STATUS:CANCELLED', 'SEQUENCE:4', `UID:visit-${entry.visitId}@driprail`]),
    );
  });

  test.each([
    // RFC 5545 3.3.11: the RFC's own example, then vectors computed from its rule.
    [
      'Project XYZ Final Review\nConference Room - 3B\nCome Prepared.',
      'Project XYZ Final Review\\nConference Room - 3B\\nCome Prepared.',
    ],
    ['Wash; dry, polish\\seal: 2h', 'Wash\\; dry\\, polish\\\\seal: 2h'],
    ['say "hi"', 'say "hi"'],
    ['C:\\new', 'C:\\\\new'],
    ['', ''],
    ['a\r\nb', 'a\\nb'],
  ])('escapes %j', (description, escaped) => {
    expect(valueOf('DESCRIPTION', { description })).toBe(escaped);
  });

  test('folds at 75 octets, without splitting a letter, and ends each line with CRLF', () => {
    // RFC 5545 3.1.
    const text = calendarFile({
      ...entry,
      summary: `${'x'.repeat(66)}é${'y'.repeat(10)}`,
      description: 'é'.repeat(60),
    });
    const raw = text.split('\r\n');
    expect(raw.at(-1)).toBe('');
    expect(raw.join('')).not.toMatch(/[\r\n]/);
    for (const line of raw) expect(new TextEncoder().encode(line).length).toBeLessThanOrEqual(75);
    expect(text).toContain(`SUMMARY:${'x'.repeat(66)}\r\n é${'y'.repeat(10)}`);
    expect(text).not.toContain('\uFFFD');
  });

  test('is read back by the reference library as it was meant', () => {
    const event = new ICAL.Event(
      new ICAL.Component(
        ICAL.parse(calendarFile({ ...entry, summary: 'O’Neil, עברית; 🚗' })) as unknown[],
      ).getFirstSubcomponent('vevent') ?? undefined,
    );
    expect(event.summary).toBe('O’Neil, עברית; 🚗');
    expect(event.startDate.toJSDate().toISOString()).toBe(entry.from);
    expect(event.endDate.toJSDate().toISOString()).toBe(entry.to);
  });
});
