import { addDays, clockOf, dayOf } from '../time/zone.ts';
import { dayBounds, instantOf } from '../time/zone-instants.ts';
import { isForgotten } from '../time/forgotten.ts';
import type { ClockKind, PayEntry, PayWeekInput } from './pay-week.types.ts';

/** Worked time of one entry on one company-zone day and one workday; whole seconds since the epoch. */
export interface WorkSpan {
  entryId: string;
  kind: ClockKind;
  visitId: string | null;
  /** Company-zone date. */
  date: string;
  /** 0 to 6: the 24 hours from the workweek's own start time (California Labor Code 500). */
  workday: number;
  from: number;
  to: number;
}

/** The week's cuts, worked out once for everyone: midnights of the zone and starts of workdays. */
export interface WeekGrid {
  from: number;
  to: number;
  asOf: number;
  cells: { date: string; workday: number; from: number; to: number }[];
}

/** An entry's time that counts as worked, before it is cut into days. */
export interface CountedSpan {
  entryId: string;
  kind: ClockKind;
  visitId: string | null;
  from: number;
  to: number;
}

export function secondsOf(instant: string): number {
  return Math.floor(Date.parse(instant) / 1000);
}

/** Elapsed time counts: a day in which the clocks change has a cell of 23 or 25 hours. */
export function weekGrid({
  startsAt,
  endsAt,
  zone,
  asOf,
}: Pick<PayWeekInput, 'startsAt' | 'endsAt' | 'zone' | 'asOf'>): WeekGrid {
  const from = secondsOf(startsAt);
  const to = secondsOf(endsAt);
  const firstDay = dayOf(startsAt, zone);
  const startClock = clockOf(startsAt, zone);
  const cuts = new Set([from, to]);
  for (let n = 0; n <= 8; n += 1) cuts.add(secondsOf(dayBounds(addDays(firstDay, n), zone).startsAt));
  const workdays = Array.from({ length: 7 }, (_, n) =>
    n === 0 ? from : secondsOf(instantOf(addDays(firstDay, n), startClock, zone)),
  );
  for (const start of workdays) cuts.add(start);
  const edges = [...cuts].filter((cut) => cut >= from && cut <= to).sort((a, b) => a - b);
  const cells = edges.slice(0, -1).map((edge, index) => ({
    date: dayOf(new Date(edge * 1000).toISOString(), zone),
    workday: workdays.findLastIndex((start) => start <= edge),
    from: edge,
    to: edges[index + 1] ?? to,
  }));
  return { from, to, asOf: secondsOf(asOf), cells };
}

/** Start and end of an entry; an open one is measured to `asOf`, a forgotten one is no time until it is settled. */
export function entrySpan(entry: PayEntry, grid: WeekGrid): { from: number; to: number } {
  const from = secondsOf(entry.startedAt);
  if (entry.endedAt !== null) return { from, to: Math.max(from, secondsOf(entry.endedAt)) };
  const isOver = isForgotten(entry.startedAt, null, new Date(grid.asOf * 1000).toISOString());
  return { from, to: isOver ? from : Math.max(from, grid.asOf) };
}

/**
 * Cuts counted time at the week's edges, at midnights and at workdays. No second is counted twice: where entries
 * overlap, the one that began first has it (the overlap itself is an error to settle).
 */
export function cutIntoDays(counted: readonly CountedSpan[], grid: WeekGrid): WorkSpan[] {
  const spans: WorkSpan[] = [];
  let counter = grid.from;
  for (const span of [...counted].sort(byStart)) {
    const from = Math.max(span.from, counter);
    const to = Math.min(span.to, grid.to);
    if (from >= to) continue;
    counter = to;
    for (const cell of grid.cells) {
      const start = Math.max(from, cell.from);
      const end = Math.min(to, cell.to);
      if (start >= end) continue;
      spans.push({
        entryId: span.entryId,
        kind: span.kind,
        visitId: span.visitId,
        date: cell.date,
        workday: cell.workday,
        from: start,
        to: end,
      });
    }
  }
  return spans;
}

function byStart(a: CountedSpan, b: CountedSpan): number {
  return a.from - b.from || a.to - b.to || (a.entryId < b.entryId ? -1 : 1);
}
