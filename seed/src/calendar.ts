import { addDays, dayOf, weekStartOf, weekdayOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';

export const ZONE = 'America/New_York';
export const PAST_WEEKS = 12;
const SUNDAY = 7;

/** The days the demo stands on, all in the company's zone. */
export interface Calendar {
  /** 11:00 company time of `today`; whatever lies later has not happened. */
  asOf: Date;
  today: string;
  /** Monday of this week. */
  thisWeek: string;
  /** Monday of the first of the twelve past weeks. */
  firstWeek: string;
  /** Rates, rules and prices start here, half a year before the first of the past weeks. */
  rulesFrom: string;
  /** The Wednesday of the last past week on which somebody forgot to clock out. */
  forgottenOn: string;
}

export function calendarOf(now: Date): Calendar {
  const today = dayOf(now.toISOString(), ZONE);
  const thisWeek = weekStartOf(today, 1);
  const firstWeek = addDays(thisWeek, -7 * PAST_WEEKS);
  return {
    asOf: instant(today, 11 * 60),
    today,
    thisWeek,
    firstWeek,
    rulesFrom: addDays(firstWeek, -26 * 7),
    forgottenOn: addDays(thisWeek, -5),
  };
}

const noons = new Map<string, number>();

/**
 * The instant of a minute counted from midnight by the clock on the wall.
 * @param minute from 180 on: clocks change before three in the morning
 */
export function instant(day: string, minute: number): Date {
  const noon = noons.get(day) ?? Date.parse(instantOf(day, '12:00', ZONE));
  noons.set(day, noon); // Tens of thousands of instants fall on a hundred days.
  return new Date(noon + (minute - 12 * 60) * 60_000);
}

/** Minutes from midnight of "HH:mm". */
export function minuteOf(clock: string): number {
  const [hours = 0, minutes = 0] = clock.split(':').map(Number);
  return hours * 60 + minutes;
}

/** Monday to Saturday, from the first day up to, not including, the last. */
export function workDays(from: string, before: string): string[] {
  const days: string[] = [];
  for (let day = from; day < before; day = addDays(day, 1)) if (weekdayOf(day) !== SUNDAY) days.push(day);
  return days;
}

/** The next so many working days after a day. */
export function nextWorkDays(after: string, count: number): string[] {
  return workDays(addDays(after, 1), addDays(after, count * 2 + 1)).slice(0, count);
}
