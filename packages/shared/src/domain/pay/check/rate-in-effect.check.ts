import { z } from 'zod';
import { exact, least, sum, ZERO, type Exact } from '../../money/exact.ts';
import { hoursOver } from '../regular-rate.ts';
import { rateInEffect as rateInEffectOf, weightedAverage, type AgreedWeek } from '../rate-in-effect.ts';
import { flagField, positiveField, weekHoursField } from './fields.ts';
import { jurisdictionField } from './jurisdiction.ts';
import { hoursText, kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';
import { lineAmount, lineField, lineIsIncluded, type Line } from './pay-lines.ts';

const shape = z.object({
  jurisdiction: jurisdictionField,
  method: z.string().optional(),
  agreement_before_work: flagField.default(false),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
  hours_worked: weekHoursField.optional(),
  lines: z.array(lineField, { error: 'needs a list of pay lines' }).min(1, 'is empty'),
});

type Inputs = z.output<typeof shape>;

const RATED = ['hourly', 'piece', 'hourly_overtime', 'piece_overtime'];
const isOvertime = (line: Line): boolean => line.type.endsWith('_overtime');

/** Overtime at the rate of the work done in the overtime hours; without an agreement before the work, the weighted average. */
export const rateInEffect = kindRule(shape, (inputs): CheckResult => {
  const others = inputs.lines.filter((line) => !RATED.includes(line.type));
  const week = agreedWeek(inputs, sum(others.filter(lineIsIncluded).map(lineAmount)));
  const outside = sum(others.filter((line) => !lineIsIncluded(line)).map(lineAmount));
  const average = weightedAverage(week);
  const alternative = {
    regular_rate: rate(average.rate),
    overtime_premium: money(average.premium),
    gross_total: money(average.gross.add(outside)),
  };
  const overtime_hours = hoursText(week.overtimeHours);
  if (!inputs.agreement_before_work) {
    const overtimeRate = average.rate.mul('3/2');
    return {
      agreement_applies: false,
      overtime_hours,
      overtime_rate: rate(overtimeRate),
      overtime_pay: money(overtimeRate.mul(week.overtimeHours)),
      gross_total: alternative.gross_total,
      weighted_average_alternative: alternative,
    };
  }
  const choice = rateInEffectOf(week);
  return {
    agreement_applies: true,
    overtime_hours,
    overtime_rate: rate(overtimeRateOf(inputs.lines) ?? perHour(choice.overtimePay, week.overtimeHours)),
    overtime_pay: money(choice.overtimePay),
    half_time_on_other_pay: money(choice.halfTimeOnOther),
    gross_total: money(choice.gross.add(outside)),
    weighted_average_alternative: alternative,
  };
});

function perHour(pay: Exact, hours: Exact): Exact {
  return hours.lte(0) ? ZERO : pay.div(hours);
}

/** The one overtime rate that is stated, a piece's or an hour's. */
function overtimeRateOf(lines: readonly Line[]): Exact | undefined {
  const stated = lines.filter(isOvertime);
  return stated.length === 1 ? stated[0]?.rate : undefined;
}

function agreedWeek(inputs: Inputs, other: Exact): AgreedWeek {
  const rated = inputs.lines.filter((line) => RATED.includes(line.type));
  const counted = sum(rated.map((line) => line.hours ?? ZERO));
  const hours = inputs.hours_worked ?? counted;
  if (rated.length === 0 || hours.lte(0))
    throw new ScenarioError('The lines hold no hourly or piece work, or no hours.');
  if (rated.every((line) => line.hours !== undefined) && !counted.equals(hours)) {
    throw new ScenarioError('The hours of the lines do not add up to hours_worked.');
  }
  const threshold = inputs.overtime_threshold_hours;
  const overtimeHours = hoursOver(hours, threshold);
  if (!rated.some(isOvertime)) return { ...lastHoursAreOvertime(rated, threshold), other, hours, overtimeHours };
  return {
    straightPay: sum(rated.filter((line) => !isOvertime(line)).map(lineAmount)),
    overtimeWorth: sum(rated.filter(isOvertime).map(lineAmount)).div('3/2'),
    other,
    hours,
    overtimeHours,
  };
}

/** Without overtime lines the work is taken in the order given: what lies beyond the threshold is overtime. */
function lastHoursAreOvertime(lines: readonly Line[], threshold: Exact): { straightPay: Exact; overtimeWorth: Exact } {
  let before = ZERO;
  const worth = lines.map((line) => {
    const hours = line.hours ?? ZERO;
    const overtime = least(hours, hoursOver(before.add(hours), threshold));
    before = before.add(hours);
    return hours.lte(0) ? ZERO : lineAmount(line).mul(overtime).div(hours);
  });
  const overtimeWorth = sum(worth);
  return { straightPay: sum(lines.map(lineAmount)).sub(overtimeWorth), overtimeWorth };
}
