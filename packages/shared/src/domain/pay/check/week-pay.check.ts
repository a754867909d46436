import { z } from 'zod';
import { dollars, exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import { toCents } from '../../money/rounding.ts';
import { splitHours, splitPremium, hasDailyOvertime } from '../daily-overtime.ts';
import { premiumStillDue } from '../not-counted-premiums.ts';
import { minimumWageShortfall, regularRate } from '../regular-rate.ts';
import { dayHoursField, amountField, positiveField, weekHoursField } from './fields.ts';
import { hoursText, kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';
import { jurisdictionField } from './jurisdiction.ts';
import { lineAmount, lineField, lineIsCreditable, lineIsIncluded, isHourly, type Line } from './pay-lines.ts';
import { salaryWeek } from '../salary.ts';

const METHODS = [
  'regular_rate',
  'weighted_average',
  'half_time',
  'fluctuating_workweek',
  'fixed_salary_fluctuating_hours',
  'half_time_fww',
] as const;

const shape = z.object({
  jurisdiction: jurisdictionField,
  method: z.enum(METHODS, { error: 'names no method known here; use "regular_rate"' }).default('regular_rate'),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
  hours_worked: weekHoursField.optional(),
  hours_by_day: z.array(dayHoursField).max(7, 'has more than 7 days').optional(),
  overtime_hours: weekHoursField.optional(),
  hours_salary_covers: positiveField.optional(),
  minimum_wage: amountField.optional(),
  lines: z.array(lineField, { error: 'needs a list of pay lines' }),
});

type Inputs = z.output<typeof shape>;

/** A whole week from its pay lines: the regular rate, the premium on top and the gross. */
export const weekPay = kindRule(shape, (inputs): CheckResult => {
  const hours = workedHours(inputs);
  const split = weekSplit(inputs, hours);
  const threshold = inputs.overtime_threshold_hours;
  const included = sumOf(inputs.lines.filter(lineIsIncluded)).add(straightBeyondSalary(inputs, hours, threshold));
  const excluded = sumOf(inputs.lines.filter((line) => !lineIsIncluded(line)));
  const makeUp = inputs.minimum_wage === undefined ? ZERO : minimumWageShortfall(included, hours, inputs.minimum_wage);
  const straight = included.add(makeUp);
  const quotient = regularRate(straight, hours, inputs.minimum_wage);
  if (quotient === null && !straight.equals(ZERO)) {
    throw new ScenarioError('hours_worked is 0 though the lines hold pay for work: a regular rate needs hours.');
  }
  const week = quotient ?? ZERO;
  const { credit, due } = premiumStillDue(splitPremium(week, split), sumOf(inputs.lines.filter(lineIsCreditable)));
  const premium = dollars(toCents(due));
  return {
    hours_worked: hoursText(hours),
    straight_time_total: money(straight),
    excluded_total: money(excluded),
    overtime_hours: hoursText(split.overtime.add(split.double)),
    regular_rate: rate(week),
    half_time_rate: rate(week.div(2)),
    overtime_rate: rate(week.mul(exact('1.5'))),
    overtime_premium: money(premium),
    gross_total: money(straight.add(excluded).add(premium)),
    ...(split.double.gt(0) ? { double_time_hours: hoursText(split.double) } : {}),
    ...(makeUp.gt(0) ? { top_up: money(makeUp) } : {}),
    ...(credit.gt(0) ? { credit: money(credit) } : {}),
  };
});

function sumOf(lines: readonly Line[]): Exact {
  return sum(lines.map(lineAmount));
}

function workedHours({ hours_worked, hours_by_day, lines }: Inputs): Exact {
  const clocked = sum(lines.filter(isHourly).map((line) => line.hours ?? ZERO));
  const hours = hours_worked ?? (hours_by_day ? sum(hours_by_day) : clocked);
  if (hours_worked === undefined && hours_by_day === undefined && clocked.equals(ZERO)) {
    throw new ScenarioError('hours_worked is missing and no line says how many hours it covers.');
  }
  if (hours_by_day && hours_worked && !sum(hours_by_day).equals(hours_worked)) {
    throw new ScenarioError('hours_by_day does not add up to hours_worked.');
  }
  if (sum(lines.filter((line) => line.type.startsWith('hourly')).map((line) => line.hours ?? ZERO)).gt(hours))
    throw new ScenarioError('The hourly lines hold more hours than were worked.');
  return hours;
}

function weekSplit(inputs: Inputs, hours: Exact): ReturnType<typeof splitHours> {
  const rules = { ...inputs.jurisdiction, weeklyHours: inputs.overtime_threshold_hours.toFraction() };
  const pay = hours.lte(0) ? ZERO : sumOf(inputs.lines.filter(lineIsIncluded)).div(hours);
  const daily = inputs.minimum_wage === undefined || hasDailyOvertime(rules, pay, inputs.minimum_wage);
  const split = splitHours(
    inputs.hours_by_day ?? [hours],
    inputs.hours_by_day ? rules : { ...rules, dailyHours: null, dailyDoubleHours: null },
    { daily },
  );
  const given = inputs.overtime_hours;
  if (given === undefined || given.equals(split.overtime.add(split.double))) return split;
  if (given.gt(hours)) throw new ScenarioError('overtime_hours is more than the hours worked.');
  return { straight: hours.sub(given), overtime: given, double: ZERO };
}

/** Hours beyond those a salary is meant for are owed at its rate; without a stated number it covers all of them. */
function straightBeyondSalary(inputs: Inputs, hours: Exact, threshold: Exact): Exact {
  const salaries = inputs.lines.filter((line) => line.type === 'salary');
  return sum(
    salaries.map((line) => {
      const covers = line.hours_salary_covers ?? inputs.hours_salary_covers;
      if (covers === undefined) return ZERO;
      const beyond = hours.sub(covers);
      return beyond.lte(0) ? ZERO : salaryWeek(lineAmount(line), covers, hours, threshold).regularRate.mul(beyond);
    }),
  );
}
