import { DateTime } from 'luxon';

/** The one place where instants become days and clock times of the company's zone, and back. */

/** Instant (ISO, any offset) to the zone's date, "YYYY-MM-DD". */
export function dayOf(instant: string, zone: string): string {
  return inZone(instant, zone).toISODate() ?? '';
}

/** Instant to the zone's clock time, "HH:mm", 24 h. */
export function clockOf(instant: string, zone: string): string {
  return inZone(instant, zone).toFormat('HH:mm');
}

/** Instant to the zone's date and clock time with its offset from UTC: "2026-05-14T07:30:00-04:00". */
export function withOffset(instant: string, zone: string): string {
  return inZone(instant, zone).toISO({ suppressMilliseconds: true }) ?? '';
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

export function addDays(day: string, count: number): string {
  return DateTime.fromISO(day, { zone: 'utc' }).plus({ days: count }).toISODate() ?? '';
}

/** ISO weekday, 1 Monday to 7 Sunday. */
export function weekdayOf(day: string): number {
  return DateTime.fromISO(day, { zone: 'utc' }).weekday;
}

/** The first day of the week that holds `day`, for weeks that start on the ISO weekday `startsOn`. */
export function weekStartOf(day: string, startsOn: number): string {
  return addDays(day, -((weekdayOf(day) - startsOn + 7) % 7));
}

export function weekNumberOf(day: string): number {
  return DateTime.fromISO(day, { zone: 'utc' }).weekNumber;
}

/** Whole minutes from one instant to another, rounded down. */
export function minutesBetween(from: string, to: string): number {
  return Math.floor((Date.parse(to) - Date.parse(from)) / 60_000);
}

export function addMinutes(instant: string, count: number): string {
  return new Date(Date.parse(instant) + count * 60_000).toISOString();
}

/** Cuts an instant to whole seconds, as everything is stored. */
export function wholeSeconds(instant: Date | string): string {
  const ms = typeof instant === 'string' ? Date.parse(instant) : instant.getTime();
  return new Date(Math.floor(ms / 1000) * 1000).toISOString();
}

export function isBefore(a: string, b: string): boolean {
  return Date.parse(a) < Date.parse(b);
}

/** Half-open spans: those that only touch do not overlap. */
export function overlaps(a: { from: string; to: string }, b: { from: string; to: string }): boolean {
  return isBefore(a.from, b.to) && isBefore(b.from, a.to);
}

function inZone(instant: string, zone: string): DateTime {
  return DateTime.fromISO(instant, { zone });
}

function utc(time: DateTime): string {
  return time.toUTC().toISO() ?? '';
}
