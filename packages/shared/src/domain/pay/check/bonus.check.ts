import { z } from 'zod';
import { exact, least, sum, ZERO, type Exact } from '../../money/exact.ts';
import { splitHours } from '../daily-overtime.ts';
import { flatSumBonusOvertime } from '../flat-sum-bonus.ts';
import { overtimeRuleSet } from '../overtime-rule-sets.ts';
import { percentageBonus as percentageBonusOf } from '../percentage-bonus.ts';
import { hoursOver, regularRate } from '../regular-rate.ts';
import { premiumStillDue } from '../not-counted-premiums.ts';
import { amountField, dayHoursField, percentField, positiveField, weekHoursField } from './fields.ts';
import { hoursText, kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const percentShape = z.object({
  hourly_rate: amountField,
  hours_worked: weekHoursField.optional(),
  straight_hours: weekHoursField.optional(),
  overtime_hours: weekHoursField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
  bonus_percent: percentField.optional(),
  bonus_percent_straight: percentField.optional(),
  bonus_percent_overtime: percentField.optional(),
});

/** A bonus that is a percentage of earnings: whether it carries its own overtime, and what is owed if not. */
export const percentageBonus = kindRule(percentShape, (inputs): CheckResult => {
  const { straightHours, overtimeHours } = splitGiven(inputs);
  const percent = inputs.bonus_percent;
  const straightPercent = inputs.bonus_percent_straight ?? percent;
  if (straightPercent === undefined) throw new ScenarioError('bonus_percent is missing.');
  // One percentage of total earnings is 1.5 x itself on an overtime hour; two percentages are each of the straight rate.
  const overtimePercent = inputs.bonus_percent_overtime ?? (percent === undefined ? ZERO : percent.mul('3/2'));
  const week = percentageBonusOf({
    rate: inputs.hourly_rate,
    straightHours,
    overtimeHours,
    straightPercent,
    overtimePercent,
  });
  return {
    straight_pay: money(week.straightPay),
    overtime_pay: money(week.overtimePay),
    bonus: money(week.bonus),
    additional_overtime_on_bonus: money(week.additionalOvertime),
    gross_total: money(sum([week.straightPay, week.overtimePay, week.bonus, week.additionalOvertime])),
  };
});

function splitGiven(inputs: z.output<typeof percentShape>): { straightHours: Exact; overtimeHours: Exact } {
  const {
    hours_worked: hours,
    straight_hours: straight,
    overtime_hours: overtime,
    overtime_threshold_hours: threshold,
  } = inputs;
  if (hours === undefined && straight === undefined) throw new ScenarioError('hours_worked is missing.');
  const total = hours ?? (straight ?? ZERO).add(overtime ?? ZERO);
  const overtimeHours = overtime ?? (straight === undefined ? hoursOver(total, threshold) : total.sub(straight));
  const straightHours = straight ?? total.sub(overtimeHours);
  if (overtimeHours.lt(0) || straightHours.lt(0) || !straightHours.add(overtimeHours).equals(total)) {
    throw new ScenarioError('straight_hours and overtime_hours do not add up to hours_worked.');
  }
  return { straightHours, overtimeHours };
}

const flatSumShape = z.object({
  hourly_rate: amountField,
  hours_by_day: z.array(dayHoursField).max(7, 'has more than 7 days').optional(),
  hours_worked: weekHoursField.optional(),
  non_overtime_hours: weekHoursField.optional(),
  overtime_hours: weekHoursField.optional(),
  double_time_hours: weekHoursField.optional(),
  flat_sum_bonus: amountField,
});

/** California's flat-sum bonus in a week with overtime. */
export const flatSumBonus = kindRule(flatSumShape, (inputs): CheckResult => {
  const split = inputs.hours_by_day
    ? splitHours(inputs.hours_by_day, overtimeRuleSet('us_ca'))
    : givenSplit(
        inputs.hours_worked,
        inputs.non_overtime_hours,
        inputs.overtime_hours,
        inputs.double_time_hours ?? ZERO,
      );
  if (split.straight.lte(0))
    throw new ScenarioError('non_overtime_hours is 0: the bonus has no hours to be divided by.');
  const { perHour, due } = flatSumBonusOvertime(inputs.flat_sum_bonus, split.straight, split.overtime, split.double);
  const straight = inputs.hourly_rate.mul(split.straight);
  const overtime = inputs.hourly_rate.mul('3/2').mul(split.overtime);
  const double = inputs.hourly_rate.mul(2).mul(split.double);
  const parts = [straight, overtime, double, inputs.flat_sum_bonus, due].map((part) => exact(money(part)));
  return {
    hourly_straight: money(straight),
    hourly_overtime: money(overtime),
    hourly_double_time: money(double),
    bonus: money(inputs.flat_sum_bonus),
    bonus_per_non_overtime_hour: rate(perHour),
    overtime_on_bonus: money(due),
    gross_total: money(sum(parts)),
    exact: { bonus_per_non_overtime_hour: rate(perHour), overtime_on_bonus: rate(due) },
  };
});

function givenSplit(
  hours: Exact | undefined,
  straight: Exact | undefined,
  overtime: Exact | undefined,
  double: Exact,
): ReturnType<typeof splitHours> {
  if (straight !== undefined)
    return { straight, overtime: overtime ?? hours?.sub(straight).sub(double) ?? ZERO, double };
  if (hours === undefined) throw new ScenarioError('non_overtime_hours is missing.');
  const kept = overtime === undefined ? least(hours, exact(40)) : hours.sub(overtime).sub(double);
  if (kept.lt(0)) throw new ScenarioError('There are more overtime hours than hours worked.');
  return { straight: kept, overtime: hours.sub(kept).sub(double), double };
}

const notCreditableShape = z.object({
  flat_amount: amountField,
  label: z.string().optional(),
  hourly_rate: amountField.optional(),
  hours_worked: weekHoursField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
});

/** A flat sum for a special job or day: all of it in the regular rate, none of it overtime already paid. */
export const notCreditable = kindRule(notCreditableShape, (inputs): CheckResult => {
  const result = {
    included_in_regular_rate: money(inputs.flat_amount),
    creditable_to_overtime: money(premiumStillDue(ZERO, ZERO).credit),
  };
  const { hourly_rate: hourly, hours_worked: hours } = inputs;
  if (hourly === undefined || hours === undefined) return result;
  const total = hourly.mul(hours).add(inputs.flat_amount);
  const week = regularRate(total, hours) ?? ZERO;
  const overtime = hoursOver(hours, inputs.overtime_threshold_hours);
  const premium = exact(money(week.div(2).mul(overtime)));
  return {
    ...result,
    straight_time_total: money(total),
    overtime_hours: hoursText(overtime),
    regular_rate: rate(week),
    overtime_premium: money(premium),
    gross_total: money(exact(money(total)).add(premium)),
  };
});
