import { addDays, dayOf, isBefore, weekStartOf } from './zone.ts';
import { dayBounds, instantOf } from './zone-instants.ts';

export interface WorkweekRule {
  /** ISO weekday, 1 Monday to 7 Sunday. */
  startsOn: number;
  /** Clock time, "HH:mm". */
  startsAt: string;
  zone: string;
}

export interface Workweek {
  startsOn: string;
  /** Last day inside the week. */
  endsOn: string;
  startsAt: string;
  endsAt: string;
}

/** The fixed, recurring week of seven company days named by any day in it (29 CFR 778.105); 167 to 169 h on change weeks. */
export function workweekOf(day: string, rule: WorkweekRule): Workweek {
  const startsOn = weekStartOf(day, rule.startsOn);
  return {
    startsOn,
    endsOn: addDays(startsOn, 6),
    startsAt: instantOf(startsOn, rule.startsAt, rule.zone),
    endsAt: instantOf(addDays(startsOn, 7), rule.startsAt, rule.zone),
  };
}

/** The workweek that holds an instant; before the start time of its first day it is still the week before. */
export function workweekAt(instant: string, rule: WorkweekRule): Workweek {
  const week = workweekOf(dayOf(instant, rule.zone), rule);
  return isBefore(instant, week.startsAt) ? workweekOf(addDays(week.startsOn, -1), rule) : week;
}

/** Days from the first to the last, both included. */
export function daysOf(week: Pick<Workweek, 'startsOn' | 'endsOn'>): string[] {
  const days = [week.startsOn];
  while ((days.at(-1) ?? week.endsOn) < week.endsOn) days.push(addDays(days.at(-1) ?? week.endsOn, 1));
  return days;
}

/** Whole company days as instants. */
export function spanOfDays(from: string, to: string, zone: string): { startsAt: string; endsAt: string } {
  return { startsAt: dayBounds(from, zone).startsAt, endsAt: dayBounds(to, zone).endsAt };
}
