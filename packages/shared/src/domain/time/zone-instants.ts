import { DateTime } from 'luxon';

/** The one place where days and clock times of the company's zone become instants: the gaps and repeats are luxon's work. */

/** Instant to the zone's date and clock time with its offset from UTC: "2026-05-14T07:30:00-04:00". */
export function withOffset(instant: string, zone: string): string {
  return DateTime.fromISO(instant, { zone }).toISO({ suppressMilliseconds: true }) ?? '';
}

/**
 * The instant of a clock time on a day. A time that a spring change skips moves on by the gap;
 * one that an autumn change repeats is the first of the two.
 */
export function instantOf(day: string, clock: string, zone: string): string {
  const [first, second] = DateTime.fromISO(`${day}T${clock}`, { zone }).getPossibleOffsets();
  if (!first) throw new RangeError(`${day} ${clock} is no time`);
  return utc(second && second < first ? second : first);
}

/** First instant of the day and first instant of the next: 23, 24 or 25 hours apart. */
export function dayBounds(day: string, zone: string): { startsAt: string; endsAt: string } {
  const start = DateTime.fromISO(day, { zone }).startOf('day');
  return { startsAt: utc(start), endsAt: utc(start.plus({ days: 1 }).startOf('day')) };
}

function utc(time: DateTime): string {
  return time.toUTC().toISO() ?? '';
}
