import { addDays, clockOf, dayOf } from '../time/zone.ts';
import { instantOf } from '../time/zone-instants.ts';

/** Clock times of the company's zone; the same twice means no quiet hours. */
export interface QuietHours {
  from: string;
  to: string;
}

/**
 * When something may go out: at the given instant, or at the end of the quiet hours it falls in. The clock decides, so a
 * night with a change of the clock is an hour shorter or longer.
 */
export function afterQuiet(instant: string, { from, to }: QuietHours, zone: string): string {
  const clock = clockOf(instant, zone);
  const isOverMidnight = from > to;
  const isQuiet = isOverMidnight ? clock >= from || clock < to : clock >= from && clock < to;
  if (!isQuiet) return instant;
  const day = dayOf(instant, zone);
  const end = instantOf(isOverMidnight && clock >= from ? addDays(day, 1) : day, to, zone);
  // In the hour that an autumn night has twice, the first of the two ends may be past already.
  return Date.parse(end) > Date.parse(instant) ? end : instant;
}
