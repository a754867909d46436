import { addMinutes, dayOf, isBefore } from '../time/zone.ts';

/** Gate codes and phone numbers reach the crew this long before the arrival window (or the planned start). */
const OPEN_HOURS_BEFORE = 12;

/** Whether the assigned crew may see the access notes at `now`: from 12 hours before until that day's end. */
export function isAccessOpen(arrivesFrom: string, now: string, zone: string): boolean {
  const opens = addMinutes(arrivesFrom, -OPEN_HOURS_BEFORE * 60);
  return !isBefore(now, opens) && dayOf(now, zone) <= dayOf(arrivesFrom, zone);
}
