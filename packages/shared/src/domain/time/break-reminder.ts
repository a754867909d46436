import type { ClockKindName } from './clock-kinds.ts';

/** After how many minutes of work without a break the phone reminds; null: not at all. */
export interface BreakRules {
  mealAfterMinutes: number | null;
  restAfterMinutes: number | null;
}

export interface BreakPunch {
  kind: ClockKindName;
  /** Instants in UTC. */
  startedAt: string;
  endedAt: string | null;
  isInterrupted: boolean;
}

export interface BreakDue {
  kind: 'meal_break' | 'rest_break';
  /** Whole minutes of work since the last such break. */
  minutes: number;
}

/** Time off the clock, or a break, of less than this is a gap between two presses (common practice, no source). */
const LEAST_BREAK_MINUTES = 5;

/**
 * The break that the house's own rule asks for by now, the meal break first. Places differ in what the law asks; the
 * owner sets the minutes. A meal break, or time off the clock, also counts as a rest; a break one had to work in counts
 * as none. Nothing is due while a break runs or nobody is on the clock.
 * @param punches one person's entries in order of time, the open one last
 * @param now an instant in UTC
 */
export function breakDue(punches: readonly BreakPunch[], rules: BreakRules, now: string): BreakDue | null {
  const running = punches.at(-1);
  if (!running || running.endedAt !== null || isBreak(running)) return null;
  const meal = minutesSince(punches, (punch) => isBreak(punch) && punch.kind === 'meal_break', now);
  if (rules.mealAfterMinutes !== null && meal >= rules.mealAfterMinutes) return { kind: 'meal_break', minutes: meal };
  const rest = minutesSince(punches, isBreak, now);
  if (rules.restAfterMinutes !== null && rest >= rules.restAfterMinutes) return { kind: 'rest_break', minutes: rest };
  return null;
}

function isBreak({ kind, isInterrupted }: BreakPunch): boolean {
  return !isInterrupted && (kind === 'meal_break' || kind === 'rest_break');
}

/** Worked minutes back to the last punch that counts as a break, or to the last time off the clock. */
function minutesSince(punches: readonly BreakPunch[], counts: (punch: BreakPunch) => boolean, now: string): number {
  let worked = 0;
  let next = now;
  for (const punch of [...punches].reverse()) {
    const end = punch.endedAt ?? now;
    const length = minutesOf(punch.startedAt, end);
    const isRelief = counts(punch) && length >= LEAST_BREAK_MINUTES;
    if (isRelief || minutesOf(end, next) >= LEAST_BREAK_MINUTES) break;
    worked += length;
    next = punch.startedAt;
  }
  return Math.floor(worked);
}

function minutesOf(from: string, to: string): number {
  return Math.max(0, Date.parse(to) - Date.parse(from)) / 60_000;
}
