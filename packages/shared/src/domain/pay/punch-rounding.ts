import { exact, type Exact } from '../money/exact.ts';
import { roundHalfUp } from '../money/rounding.ts';
import { dayOf } from '../time/zone.ts';
import { dayBounds } from '../time/zone-instants.ts';
import type { PayEntry } from './pay-week.types.ts';
import { secondsOf } from './work-spans.ts';

/**
 * The nearest multiple of a step, halves up: for quarter hours 1 to 7 minutes go down and 8 to 14 up. Tolerated for
 * 5, 6 or 15 minutes only while it evens out over time (29 CFR 785.48(b)); off unless the owner turns it on.
 * @returns whole minutes
 */
export function roundToStep(minutes: Exact, step: Exact): Exact {
  return exact(roundHalfUp(minutes.div(step), 0)).mul(step);
}

/** Both ends of each entry at the nearest multiple of the step since midnight of the company's zone. */
export function roundPunches<E extends PayEntry>(entries: readonly E[], minutes: number, zone: string): E[] {
  const round = (instant: string): string => {
    const midnight = secondsOf(dayBounds(dayOf(instant, zone), zone).startsAt);
    const since = exact(secondsOf(instant) - midnight).div(60);
    const rounded = roundToStep(since, exact(minutes)).mul(60);
    return new Date((midnight + Number(rounded.toFraction())) * 1000).toISOString();
  };
  return entries.map((entry) => ({
    ...entry,
    startedAt: round(entry.startedAt),
    endedAt: entry.endedAt === null ? null : round(entry.endedAt),
  }));
}
