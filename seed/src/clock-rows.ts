import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import { instant } from './calendar.ts';
import type { DrivenDay } from './drive-day.ts';
import type { Book } from './job-rows.ts';
import { MEAL_MINUTES } from './meal.ts';
import type { DemoPerson } from './people.ts';
import { at } from './random.ts';

/** A stretch of one kind of time, minutes from midnight; without an end it runs on. */
export interface Segment {
  kind: ClockKindName;
  visitId: string | null;
  from: number;
  to: number;
}

/** A crew's day as its clocks saw it: shop, drive, work, drive ... meal ... shop, each ending where the next begins. */
export function segmentsOf({ inAt, visits, mealAfter, back }: DrivenDay, visitIds: readonly string[]): Segment[] {
  const segments: Segment[] = [];
  let cursor = inAt;
  const until = (kind: ClockKindName, to: number, visitId: string | null = null) => {
    if (to > cursor) segments.push({ kind, visitId, from: cursor, to });
    cursor = Math.max(cursor, to);
  };
  for (const [index, { setOff, arrive, end }] of visits.entries()) {
    const visitId = at(visitIds, index);
    until(index === 0 ? 'shop' : 'waiting', setOff);
    until('travel', arrive, visitId);
    until('job', end, visitId);
    if (mealAfter === index) until('meal_break', end + MEAL_MINUTES);
  }
  until(back ? 'travel' : 'waiting', back?.at ?? Infinity);
  if (back) until('shop', back.out);
  return segments;
}

/** Writes a person's entries as far as the day has gone; the one that runs then stays open. */
export function writeClock(
  { rows, ids, calendar }: Book,
  day: string,
  { id: personId }: DemoPerson,
  segments: readonly Segment[],
): void {
  for (const { kind, visitId, from, to } of segments) {
    const startedAt = instant(day, from);
    if (startedAt > calendar.asOf) return;
    const end = Number.isFinite(to) ? instant(day, to) : null;
    const endedAt = end && end <= calendar.asOf ? end : null;
    rows.clockEntries.push({ id: ids(), personId, kind, visitId, startedAt, endedAt });
  }
}

/** People come and go a few minutes apart. */
export function ownTimes(segments: readonly Segment[], earlier: number, later: number): Segment[] {
  return segments.map((segment, index) => ({
    ...segment,
    from: index === 0 ? segment.from - earlier : segment.from,
    to: index === segments.length - 1 ? segment.to + later : segment.to,
  }));
}
