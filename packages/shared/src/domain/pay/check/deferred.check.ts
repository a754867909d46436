import { z } from 'zod';
import { exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import {
  equalWeeklyPart,
  extraByWeek,
  extraPerHour,
  pastWeek,
  periodHours,
  type DeferredPeriod,
  type PastWeek,
} from '../deferred-pay.ts';
import { amountField, positiveField, weekHoursField, signedField, hoursField } from './fields.ts';
import { kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const weekField = z.object({
  hours_worked: weekHoursField,
  overtime_hours: weekHoursField.optional(),
  amount: amountField.optional(),
  commission: amountField.optional(),
  commission_earned: amountField.optional(),
  commission_amount: amountField.optional(),
  allocated_amount: amountField.optional(),
  bonus: amountField.optional(),
});

const shape = z.object({
  amount: signedField.optional(),
  gross_commission: amountField.optional(),
  debits_from_earlier_periods: amountField.optional(),
  allocation: z.string().optional(),
  period: z.string().optional(),
  period_weeks: positiveField.optional(),
  period_hours_worked: hoursField.optional(),
  period_overtime_hours: hoursField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
  weeks: z.array(weekField).default([]),
});

type Inputs = z.output<typeof shape>;
type Week = Inputs['weeks'][number];

const PERIODS: Record<string, DeferredPeriod> = {
  month: { kind: 'month' },
  monthly: { kind: 'month' },
  semimonth: { kind: 'semimonth' },
  semimonthly: { kind: 'semimonth' },
  half_month: { kind: 'semimonth' },
  quarter: { kind: 'quarter' },
  quarterly: { kind: 'quarter' },
  year: { kind: 'year' },
  annual: { kind: 'year' },
  week: { kind: 'weeks', count: exact(1) },
  weekly: { kind: 'weeks', count: exact(1) },
  biweekly: { kind: 'weeks', count: exact(2) },
};

/** A commission or bonus that became known late, apportioned back with the half time it brings. */
export const deferredAllocation = kindRule(shape, (inputs): CheckResult => {
  const weeks = inputs.weeks.map(readWeek(inputs.overtime_threshold_hours));
  if (inputs.allocation === 'equal_per_hour') return perHour(inputs, weeks);
  const own = inputs.weeks.map(ownAmount);
  if (own.some((part) => part !== null))
    return byOwnAmounts(
      inputs,
      own.map((part) => part ?? ZERO),
      weeks,
    );
  if (inputs.allocation !== undefined && inputs.allocation !== 'equal_per_week') {
    // All of it belongs to the one week that is named.
    if (/identif|actual|week/.test(inputs.allocation) && weeks.length === 1)
      return byOwnAmounts(inputs, [amountOf(inputs)], weeks);
    throw new ScenarioError(
      `allocation "${inputs.allocation}" is not known here, or the weeks lack the amounts it needs.`,
    );
  }
  return perWeek(inputs, weeks);
});

function readWeek(threshold: Exact): (week: Week) => PastWeek {
  return (week) => {
    if (week.overtime_hours?.gt(week.hours_worked))
      throw new ScenarioError('A week has more overtime hours than hours worked.');
    return pastWeek(week.hours_worked, week.overtime_hours ?? null, threshold);
  };
}

function ownAmount(week: Week): Exact | null {
  return (
    week.amount ??
    week.commission ??
    week.commission_earned ??
    week.commission_amount ??
    week.allocated_amount ??
    week.bonus ??
    null
  );
}

/** What is paid for a period is its commission: debits of earlier periods lower it (29 CFR 778.121). */
function amountOf(inputs: Inputs): Exact {
  const amount = inputs.amount ?? inputs.gross_commission?.sub(inputs.debits_from_earlier_periods ?? ZERO);
  if (amount === undefined) throw new ScenarioError('amount is missing.');
  if (amount.lt(0)) throw new ScenarioError('amount may not be negative.');
  return amount;
}

function perWeek(inputs: Inputs, weeks: readonly PastWeek[]): CheckResult {
  if (weeks.length === 0) throw new ScenarioError('weeks is missing: the extra overtime needs the hours of each week.');
  const part = equalWeeklyPart(amountOf(inputs), periodOf(inputs, weeks.length));
  const extra = extraByWeek(
    weeks.map(() => part),
    weeks,
  );
  const [only] = weeks;
  const rise = weeks.length === 1 && only && only.hours.gt(0) ? part.div(only.hours) : null;
  return {
    weekly_amount: money(part),
    ...(rise === null ? {} : { rate_increase: rate(rise), half_time_increase: rate(rise.div(2)) }),
    ...extraResult(extra),
    exact: { weekly_amount: rate(part), additional_overtime: rate(sum(extra)) },
  };
}

function periodOf({ period, period_weeks }: Inputs, weekCount: number): DeferredPeriod {
  const named = period === undefined ? undefined : PERIODS[period];
  if (named) return named;
  if (period !== undefined && period !== 'weeks')
    throw new ScenarioError(`period "${period}" is not known here; use month, semimonth, quarter, year or weeks.`);
  return { kind: 'weeks', count: period_weeks ?? exact(weekCount) };
}

function perHour(inputs: Inputs, weeks: readonly PastWeek[]): CheckResult {
  const counted = periodHours(weeks);
  const hours = inputs.period_hours_worked ?? counted.hours;
  const overtime = inputs.period_overtime_hours ?? counted.overtimeHours;
  if (hours.lte(0)) throw new ScenarioError('period_hours_worked is missing or 0.');
  if (overtime.gt(hours)) throw new ScenarioError('period_overtime_hours is more than the hours worked.');
  const { rateIncrease, extra } = extraPerHour(amountOf(inputs), hours, overtime);
  const parts = weeks.map((week) => rateIncrease.mul(week.hours));
  return {
    rate_increase: rate(rateIncrease),
    half_time_increase: rate(rateIncrease.div(2)),
    ...(weeks.length > 0 ? { additional_overtime_by_week: extraByWeek(parts, weeks).map(money) } : {}),
    additional_overtime: money(extra),
    exact: { additional_overtime: rate(extra) },
  };
}

/** The weeks in which each part was earned are known (29 CFR 778.119, 778.120 first sentence). */
function byOwnAmounts(inputs: Inputs, parts: readonly Exact[], weeks: readonly PastWeek[]): CheckResult {
  const total = sum(parts);
  if (inputs.amount !== undefined && !inputs.amount.equals(total))
    throw new ScenarioError('The amounts of the weeks do not add up to amount.');
  const extra = extraByWeek(parts, weeks);
  const rises = weeks.map((week, index) => (week.hours.lte(0) ? ZERO : (parts[index] ?? ZERO).div(week.hours)));
  const rise = rises.length === 1 ? rises[0] : undefined;
  return {
    amount: money(total),
    ...(rise === undefined ? {} : { rate_increase: rate(rise), half_time_increase: rate(rise.div(2)) }),
    rate_increase_by_week: rises.map(rate),
    ...extraResult(extra),
    exact: { additional_overtime: rate(sum(extra)) },
  };
}

function extraResult(extra: readonly Exact[]): CheckResult {
  return { additional_overtime_by_week: extra.map(money), additional_overtime: money(sum(extra)) };
}
