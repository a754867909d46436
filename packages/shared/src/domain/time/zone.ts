import { partsIn } from './zone-parts.ts';

/**
 * The one place where instants become days and clock times of the company's zone. It is the platform's own work, so
 * that a phone's first screen needs no library; the way back is in zone-instants.ts.
 */

const DAY_MS = 86_400_000;

/** Instant (ISO, any offset) to the zone's date, "YYYY-MM-DD"; nothing for what is no instant. */
export function dayOf(instant: string, zone: string): string {
  return partsIn(instant, zone)?.day ?? '';
}

/** Instant to the zone's clock time, "HH:mm", 24 h; nothing for what is no instant. */
export function clockOf(instant: string, zone: string): string {
  return partsIn(instant, zone)?.clock ?? '';
}

/** A date so many days later; nothing for what is no date. */
export function addDays(day: string, count: number): string {
  const time = Date.parse(`${day}T00:00:00Z`);
  return Number.isNaN(time) ? '' : new Date(time + count * DAY_MS).toISOString().slice(0, 10);
}

/** ISO weekday, 1 Monday to 7 Sunday. */
export function weekdayOf(day: string): number {
  return new Date(`${day}T00:00:00Z`).getUTCDay() || 7;
}

/** The first day of the week that holds `day`, for weeks that start on the ISO weekday `startsOn`. */
export function weekStartOf(day: string, startsOn: number): string {
  return addDays(day, -((weekdayOf(day) - startsOn + 7) % 7));
}

/** ISO 8601 week number: the week of a year's first Thursday is its first. */
export function weekNumberOf(day: string): number {
  const thursday = addDays(day, 4 - weekdayOf(day));
  const firstOfYear = `${thursday.slice(0, 4)}-01-01`;
  return Math.floor((Date.parse(thursday) - Date.parse(firstOfYear)) / (7 * DAY_MS)) + 1;
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
