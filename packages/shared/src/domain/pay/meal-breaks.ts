import { isOffDuty } from './breaks.ts';
import type { PayEntry } from './pay-week.types.ts';
import { entrySpan, type CountedSpan, type WeekGrid } from './work-spans.ts';

/** What the clock entries of one person come to before they are cut into days. */
export interface CountedEntries {
  counted: CountedSpan[];
  /** Meal breaks that count as worked because they are shorter than the rule asks. */
  shortMeals: PayEntry[];
}

/**
 * Everything counts as worked but a meal break free of duty of at least the rule's length (29 CFR 785.18, 785.19).
 * Meal breaks that touch are one break, so that splitting an entry changes nothing.
 */
export function countEntries(entries: readonly PayEntry[], grid: WeekGrid, mealBreakMinutes: number): CountedEntries {
  const counted: CountedSpan[] = [];
  const shortMeals: PayEntry[] = [];
  const restful = entries.filter((entry) => entry.kind === 'meal_break' && !entry.interrupted);
  const lengths = joinedLengths(restful, grid);
  for (const entry of entries) {
    const span = entrySpan(entry, grid);
    const joined = lengths.get(entry);
    if (joined !== undefined && isOffDuty(joined, true, mealBreakMinutes)) continue;
    if (joined !== undefined && entry.endedAt !== null && span.to > grid.from && span.from < grid.to)
      shortMeals.push(entry);
    counted.push({ entryId: entry.id, kind: entry.kind, visitId: entry.visitId, ...span });
  }
  return { counted, shortMeals };
}

/** Each break's length in seconds, together with the breaks that touch it. */
function joinedLengths(breaks: readonly PayEntry[], grid: WeekGrid): Map<PayEntry, number> {
  const sorted = breaks
    .map((entry) => ({ entry, ...entrySpan(entry, grid) }))
    .sort((a, b) => a.from - b.from || a.to - b.to);
  const groups: (typeof sorted)[] = [];
  let reach = -Infinity;
  for (const item of sorted) {
    if (item.from > reach) groups.push([]);
    groups.at(-1)?.push(item);
    reach = Math.max(reach, item.to);
  }
  const lengths = new Map<PayEntry, number>();
  for (const group of groups) {
    const length = Math.max(...group.map((item) => item.to)) - (group[0]?.from ?? 0);
    for (const { entry } of group) lengths.set(entry, length);
  }
  return lengths;
}
