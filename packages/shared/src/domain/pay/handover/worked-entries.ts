import { hoursOf, ZERO, type Exact } from '../../money/exact.ts';
import { countEntries } from '../meal-breaks.ts';
import type { ClockKind, PayWeekInput } from '../pay-week.types.ts';
import { roundPunches } from '../punch-rounding.ts';
import { weekGroups } from '../week-groups.ts';
import { cutIntoDays, entrySpan, weekGrid, type WorkSpan } from '../work-spans.ts';

/** A clock entry's part of one day as the week was paid; after rounding, where punches were rounded. */
export interface WorkedEntry {
  entryId: string;
  kind: ClockKind;
  visitId: string | null;
  /** Company-zone date. */
  date: string;
  /** Instants, ISO UTC. */
  startedAt: string;
  endedAt: string;
  /** Exact hours that counted: none for a meal break free of duty. */
  hours: Exact;
  isWorked: boolean;
}

/**
 * The entries that a person's week was paid from, cut at midnights and at the week's edges just as the engine cuts
 * them, in the order of the clock. The hours that counted add up to the week's hours worked.
 */
export function workedEntries(input: PayWeekInput, personId: string): WorkedEntry[] {
  const grid = weekGrid(input);
  const { mealBreakMinutes, punchRoundingMinutes } = input.rules;
  const own = weekGroups(input, grid)(personId).entries;
  const punches = punchRoundingMinutes === null ? own : roundPunches(own, punchRoundingMinutes, input.zone);
  const { counted } = countEntries(punches, grid, mealBreakMinutes);
  const worked = new Set(counted.map((span) => span.entryId));
  const unpaid = punches
    .filter((entry) => !worked.has(entry.id))
    .map((entry) => ({ entryId: entry.id, kind: entry.kind, visitId: entry.visitId, ...entrySpan(entry, grid) }));
  return [
    ...cutIntoDays(counted, grid).map((span) => toEntry(span, true)),
    ...cutIntoDays(unpaid, grid).map((span) => toEntry(span, false)),
  ].sort((a, b) => a.startedAt.localeCompare(b.startedAt) || a.entryId.localeCompare(b.entryId));
}

function toEntry({ entryId, kind, visitId, date, from, to }: WorkSpan, isWorked: boolean): WorkedEntry {
  return {
    ...{ entryId, kind, visitId, date, isWorked },
    startedAt: new Date(from * 1000).toISOString(),
    endedAt: new Date(to * 1000).toISOString(),
    hours: isWorked ? hoursOf(to - from) : ZERO,
  };
}
