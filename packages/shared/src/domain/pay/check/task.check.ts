import { z } from 'zod';
import { exact, ZERO } from '../../money/exact.ts';
import { premiumStillDue, taskPay } from '../not-counted-premiums.ts';
import { hoursOver } from '../regular-rate.ts';
import { amountField, dayHoursField, positiveField, someOf, weekHoursField } from './fields.ts';
import { kindRule, money, rate, type CheckResult } from './kind-rule.ts';

const shape = z.object({
  hours_worked: weekHoursField,
  overtime_threshold_hours: positiveField.default(() => exact(40)),
  hours_on_task_by_day: someOf(dayHoursField),
  additional_hours_by_day: someOf(dayHoursField),
  day_pay: someOf(amountField),
  additional_pay: someOf(amountField),
});

/** A day's pay for a task however long it takes, with extra pay on top (29 CFR 778.313). */
export const taskDays = kindRule(shape, (inputs): CheckResult => {
  const days = inputs.hours_on_task_by_day.map((taskHours, index) => ({
    taskHours,
    dayPay: inputs.day_pay[index] ?? ZERO,
    extraPay: inputs.additional_pay[index] ?? ZERO,
  }));
  const overtime = hoursOver(inputs.hours_worked, inputs.overtime_threshold_hours);
  const week = taskPay(days, inputs.hours_worked, overtime);
  const { due } = premiumStillDue(week.premium, week.creditable);
  return {
    contract_total: money(week.contract),
    creditable_overtime_premium: money(week.creditable),
    included_total: money(week.included),
    regular_rate: rate(week.rate),
    overtime_premium: money(week.premium),
    additional_due: money(due),
    gross_total: money(week.contract.add(due)),
  };
});
