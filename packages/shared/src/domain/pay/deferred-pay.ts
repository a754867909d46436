import { exact, sum, ZERO, type Exact } from '../money/exact.ts';
import { halfTimeOnAmount, hoursOver } from './regular-rate.ts';

/** Hours of one past workweek over which a late commission or bonus is spread. */
export interface PastWeek {
  hours: Exact;
  overtimeHours: Exact;
}

export type DeferredPeriod = { kind: 'month' | 'semimonth' | 'quarter' | 'year' } | { kind: 'weeks'; count: Exact };

const PER_YEAR = { year: 1, quarter: 4, month: 12, semimonth: 24 } as const;

/** Equal part of each week of the period: a month x 12/52, half a month x 24/52, N weeks / N (29 CFR 778.120(a)). */
export function equalWeeklyPart(amount: Exact, period: DeferredPeriod): Exact {
  return period.kind === 'weeks' ? amount.div(period.count) : amount.mul(PER_YEAR[period.kind]).div(52);
}

/** Extra half time per week when each week's part of a late payment is known (29 CFR 778.119, 778.120, 778.209). */
export function extraByWeek(parts: readonly Exact[], weeks: readonly PastWeek[]): Exact[] {
  return weeks.map((week, index) => halfTimeOnAmount(parts[index] ?? ZERO, week.hours, week.overtimeHours));
}

/**
 * Equal part of every hour of the period, half of it for its overtime hours (29 CFR 778.120(b), from memory).
 * @returns exact dollars: rise of the hourly rate, and the extra half time
 */
export function extraPerHour(amount: Exact, hours: Exact, overtimeHours: Exact): { rateIncrease: Exact; extra: Exact } {
  return { rateIncrease: amount.div(hours), extra: halfTimeOnAmount(amount, hours, overtimeHours) };
}

export function pastWeek(hours: Exact, overtimeHours: Exact | null, threshold: Exact = exact(40)): PastWeek {
  return { hours, overtimeHours: overtimeHours ?? hoursOver(hours, threshold) };
}

export function periodHours(weeks: readonly PastWeek[]): { hours: Exact; overtimeHours: Exact } {
  return { hours: sum(weeks.map((week) => week.hours)), overtimeHours: sum(weeks.map((week) => week.overtimeHours)) };
}
