import { exact, greatest, least, sum, ZERO, type Exact } from '../money/exact.ts';
import type { OvertimeRuleSet } from './overtime-rule-sets.ts';

/** Every hour of a week in exactly one place: an hour is overtime once, never twice. */
export interface SplitHours {
  straight: Exact;
  /** Owed time and a half. */
  overtime: Exact;
  /** Owed double time. */
  double: Exact;
}

export interface SplitOptions {
  /** False where a rule's gate or an agreed schedule takes daily overtime away; the week's limit stays. */
  daily?: boolean;
}

/**
 * Splits a workweek's hours by a rule set. Hours already owed a daily premium do not count again toward the week's
 * limit (no pyramiding; Alaska Statutes 23.10.060, California Labor Code 510).
 * @param hoursByWorkday up to seven exact numbers of hours, in the order of the workweek
 */
export function splitHours(
  hoursByWorkday: readonly Exact[],
  rules: OvertimeRuleSet,
  { daily = true }: SplitOptions = {},
): SplitHours {
  const total = sum(hoursByWorkday);
  const overWeekly = total.gt(rules.weeklyHours);
  const days = hoursByWorkday.map((hours, index) => {
    const isSeventh = index === 6 && hoursByWorkday.every((day) => day.gt(0));
    if (isSeventh && rules.seventhDay && (overWeekly || !rules.seventhDay.onlyOverWeekly)) {
      return seventhDay(hours, rules.seventhDay.doubleOver);
    }
    return daily ? workday(hours, rules) : { straight: hours, overtime: ZERO, double: ZERO };
  });
  const straight = sum(days.map((day) => day.straight));
  const kept = least(straight, exact(rules.weeklyHours));
  return {
    straight: kept,
    overtime: sum(days.map((day) => day.overtime)).add(straight.sub(kept)),
    double: sum(days.map((day) => day.double)),
  };
}

function workday(hours: Exact, rules: OvertimeRuleSet): SplitHours {
  const doubleFrom = rules.dailyDoubleHours === null ? hours : least(hours, exact(rules.dailyDoubleHours));
  const straight = rules.dailyHours === null ? hours : least(hours, exact(rules.dailyHours));
  return {
    straight,
    overtime: greatest(ZERO, doubleFrom.sub(straight)),
    double: hours.sub(greatest(doubleFrom, straight)),
  };
}

function seventhDay(hours: Exact, doubleOver: string | null): SplitHours {
  const overtime = doubleOver === null ? hours : least(hours, exact(doubleOver));
  return { straight: ZERO, overtime, double: hours.sub(overtime) };
}

/** The pay from which a place's daily overtime ends: a multiple of its minimum wage (NRS 608.018); null without a gate. */
export function dailyGate(rules: OvertimeRuleSet, minimumWage: Exact): Exact | null {
  return rules.dailyGateMultiple === null ? null : exact(rules.dailyGateMultiple).mul(minimumWage);
}

/** Whether daily overtime applies at an hourly pay; at the gate itself it no longer does. */
export function hasDailyOvertime(rules: OvertimeRuleSet, hourlyPay: Exact, minimumWage: Exact): boolean {
  if (rules.dailyHours === null) return false;
  const gate = dailyGate(rules, minimumWage);
  return gate === null || hourlyPay.lt(gate);
}

/** Premium on top of straight pay for every hour: half the rate for time and a half, the whole rate for double time. */
export function splitPremium(rate: Exact, split: SplitHours): Exact {
  return rate.mul(split.overtime.div(2).add(split.double));
}
