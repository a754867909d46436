import { z } from 'zod';
import { exact, type Exact } from '../../money/exact.ts';
import { coveredHours, salaryWeek, weeklySalary, type SalaryPeriod } from '../salary.ts';
import { amountField, positiveField, weekHoursField } from './fields.ts';
import { jurisdictionField } from './jurisdiction.ts';
import { kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const PERIODS = ['weekly', 'biweekly', 'semimonthly', 'monthly', 'annual'] as const satisfies readonly SalaryPeriod[];

const shape = z.object({
  jurisdiction: jurisdictionField,
  salary_weekly: amountField.optional(),
  salary_biweekly: amountField.optional(),
  salary_semimonthly: amountField.optional(),
  salary_monthly: amountField.optional(),
  salary_annual: amountField.optional(),
  salary_yearly: amountField.optional(),
  hours_salary_covers: positiveField.optional(),
  hours_worked: weekHoursField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
});

type Inputs = z.output<typeof shape>;

/** A salary's weekly part and regular rate; with hours worked, also what the week comes to. */
export const salaryRate = kindRule(shape, (inputs): CheckResult => {
  const weekly = weeklyPart(inputs);
  const stated = inputs.hours_salary_covers ?? inputs.hours_worked;
  if (stated === undefined || stated.lte(0))
    throw new ScenarioError('hours_salary_covers is missing: a salary needs the hours it is meant for.');
  if (stated.gt(168)) throw new ScenarioError('hours_salary_covers is more than the 168 hours of a week.');
  const covers = coveredHours(stated, inputs.jurisdiction.key === 'us_ca');
  const threshold = inputs.overtime_threshold_hours;
  const week = salaryWeek(weekly, covers, inputs.hours_worked ?? covers, threshold);
  const result = {
    weekly_equivalent: money(weekly),
    regular_rate: rate(week.regularRate),
    half_time_rate: rate(week.regularRate.div(2)),
    overtime_rate: rate(week.regularRate.mul('3/2')),
  };
  if (inputs.hours_worked === undefined) return result;
  return {
    ...result,
    [`straight_hours_${covers.toString()}_to_${threshold.toString()}`]: money(week.straightBeyond),
    overtime_pay: money(week.overtimePay),
    gross_total: money(
      exact(money(weekly))
        .add(exact(money(week.straightBeyond)))
        .add(exact(money(week.overtimePay))),
    ),
  };
});

function weeklyPart(inputs: Inputs): Exact {
  const given = PERIODS.flatMap((period) => {
    const amount = inputs[`salary_${period}`] ?? (period === 'annual' ? inputs.salary_yearly : undefined);
    return amount === undefined ? [] : [weeklySalary(amount, period)];
  });
  const [weekly, other] = given;
  if (weekly === undefined)
    throw new ScenarioError(
      'A salary is missing: give salary_weekly, salary_biweekly, salary_semimonthly, salary_monthly or salary_annual.',
    );
  if (other !== undefined && !other.equals(weekly))
    throw new ScenarioError('The inputs name two salaries that do not agree.');
  return weekly;
}
