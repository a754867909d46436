import { hoursAndMinutes } from './working-words.ts';
import type { Exact } from '../money/exact.ts';
import { centsText } from '../money/rounding.ts';
import { dayOf } from '../time/zone.ts';
import { formatClock, formatDay } from '../time/format.ts';
import type { DoneLine, PayEntry, PayLine, PayPerson, PayWarning, PayWeekInput } from './pay-week.types.ts';
import { entrySpan, type WeekGrid } from './work-spans.ts';

type Said = Pick<PayWarning, 'code' | 'message'> & Partial<PayWarning>;

function warn(person: PayPerson, said: Said): PayWarning {
  return { personId: person.id, isBlocking: false, entryId: null, jobId: null, ...said };
}

/** Entries still open, and entries that cover the same time: both to be settled before the week is checked. */
export function entryWarnings(
  person: PayPerson,
  entries: readonly PayEntry[],
  shortMeals: readonly PayEntry[],
  grid: WeekGrid,
  { zone, clock }: Pick<PayWeekInput, 'zone' | 'clock'>,
): PayWarning[] {
  const at = (instant: string): string => `${formatDay(dayOf(instant, zone))} ${formatClock(instant, zone, clock)}`;
  const sorted = entries
    .map((entry) => ({ entry, ...entrySpan(entry, grid) }))
    .sort((a, b) => a.from - b.from || a.to - b.to || (a.entry.id < b.entry.id ? -1 : 1));
  const warnings: PayWarning[] = [];
  let previous: (typeof sorted)[number] | null = null;
  for (const item of sorted) {
    const { entry } = item;
    if (entry.endedAt === null) {
      warnings.push(
        warn(person, {
          code: 'open_entry',
          isBlocking: true,
          entryId: entry.id,
          message: `${person.name} is still on the clock since ${at(entry.startedAt)}. Set the end before the week is checked.`,
        }),
      );
    }
    if (previous !== null && item.from < previous.to && item.to > item.from) {
      warnings.push(
        warn(person, {
          code: 'overlapping_entries',
          isBlocking: true,
          entryId: entry.id,
          message: `Two clock entries of ${person.name} cover the same time from ${at(entry.startedAt)}. Change one of them; the time is counted once.`,
        }),
      );
    }
    if (previous === null || item.to > previous.to) previous = item;
  }
  for (const entry of shortMeals) {
    warnings.push(
      warn(person, {
        code: 'short_meal_break',
        entryId: entry.id,
        message: `The meal break of ${person.name} on ${at(entry.startedAt)} is shorter than the rule asks, so it counts as worked.`,
      }),
    );
  }
  return warnings;
}

/** Jobs done by a crew of which this person has no clock time on the visit; said once per visit. */
export function clocklessJobWarnings(
  person: PayPerson,
  lines: readonly DoneLine[],
  entries: readonly PayEntry[],
): PayWarning[] {
  const clocked = new Set(entries.map((entry) => entry.visitId));
  const missing = new Map(lines.filter((line) => !clocked.has(line.visitId)).map((line) => [line.visitId, line]));
  return [...missing.values()].map((line) =>
    warn(person, {
      code: 'done_without_clock',
      jobId: line.jobId,
      message: `Job ${line.jobNumber} was done by ${person.name} without clock time. Add the time worked, or take ${person.name} off the crew.`,
    }),
  );
}

export function unpaidHoursWarning(person: PayPerson, unpaidHours: Exact): PayWarning[] {
  if (unpaidHours.lte(0)) return [];
  return [
    warn(person, {
      code: 'no_hourly_rate',
      message: `${person.name} worked ${hoursAndMinutes(unpaidHours)} for which no hourly rate had started. Set a dated rate, or check that flat or commission pay is agreed to cover these hours.`,
    }),
  ];
}

export function minimumWageWarning(person: PayPerson, makeUp: PayLine | null): PayWarning[] {
  if (makeUp === null) return [];
  return [
    warn(person, {
      code: 'under_minimum_wage',
      message: `The pay of ${person.name} was under the minimum wage this week; ${centsText(makeUp.amountCents)} was added to meet it.`,
    }),
  ];
}
