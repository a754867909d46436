import { z } from 'zod';
import { exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import { dailyGate, hasDailyOvertime, splitHours, splitPremium } from '../daily-overtime.ts';
import { halfTimePremium, hoursOver } from '../regular-rate.ts';
import { premiumStillDue } from '../not-counted-premiums.ts';
import { amountField, dayHoursField, flagField, positiveField, someOf, weekHoursField } from './fields.ts';
import { jurisdictionField } from './jurisdiction.ts';
import { hoursText, kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const daysField = someOf(dayHoursField).max(7, 'has more than 7 days');

const weekField = z
  .preprocess(
    (week) => (typeof week === 'object' ? week : { hours_worked: week }),
    z.object({ hours_worked: weekHoursField.optional(), hours_by_day: daysField.optional() }),
  )
  .transform(({ hours_worked, hours_by_day }, ctx): Exact => {
    const hours = hours_worked ?? (hours_by_day && sum(hours_by_day));
    if (hours) return hours;
    ctx.addIssue({ code: 'custom', message: 'needs hours_worked or hours_by_day' });
    return z.NEVER;
  });

const weeksShape = z.object({
  weeks: someOf(weekField),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
});

/** Overtime hours of each workweek alone; weeks are never averaged (29 CFR 778.104). */
export const workweekHours = kindRule(weeksShape, ({ weeks, overtime_threshold_hours }): CheckResult => {
  const overtime = weeks.map((hours) => hoursOver(hours, overtime_threshold_hours));
  const straight = weeks.map((hours, index) => hours.sub(overtime[index] ?? ZERO));
  return {
    overtime_hours_by_week: overtime.map(hoursText),
    straight_hours_by_week: straight.map(hoursText),
    straight_hours_total: hoursText(sum(straight)),
    overtime_hours_total: hoursText(sum(overtime)),
    hours_worked: hoursText(sum(weeks)),
  };
});

const dailyShape = z.object({
  jurisdiction: jurisdictionField,
  hours_by_day: daysField,
  hourly_rate: amountField.optional(),
  state_minimum_wage: amountField.optional(),
  minimum_wage: amountField.optional(),
  agreed_four_tens: flagField.optional(),
  agreed_4x10: flagField.optional(),
});

type Daily = z.output<typeof dailyShape>;

/** A week's hours split by a place's daily and weekly rules; with a rate, also the pay, federal overtime credited. */
export const dailyOvertime = kindRule(dailyShape, (inputs): CheckResult => {
  const split = splitHours(inputs.hours_by_day, inputs.jurisdiction, { daily: isDaily(inputs) });
  const hours = {
    straight_hours: hoursText(split.straight),
    overtime_hours: hoursText(split.overtime),
    double_time_hours: hoursText(split.double),
    hours_worked: hoursText(sum(inputs.hours_by_day)),
  };
  const hourly = inputs.hourly_rate;
  if (hourly === undefined) return hours;
  const paid = splitPremium(hourly, split);
  const federal = halfTimePremium(hourly, hoursOver(sum(inputs.hours_by_day)));
  const { credit, due } = premiumStillDue(federal, paid);
  return {
    ...hours,
    straight_pay: money(hourly.mul(split.straight)),
    overtime_pay: money(hourly.mul('3/2').mul(split.overtime)),
    double_time_pay: money(hourly.mul(2).mul(split.double)),
    state_premium_paid: money(paid),
    flsa_premium_due: money(federal),
    credit: money(credit),
    additional_flsa_due: money(due),
    gross_total: money(hourly.mul(sum(inputs.hours_by_day)).add(paid).add(due)),
  };
});

function isDaily(inputs: Daily): boolean {
  if (inputs.agreed_four_tens || inputs.agreed_4x10) return false;
  const wage = inputs.state_minimum_wage ?? inputs.minimum_wage;
  return (
    inputs.hourly_rate === undefined ||
    wage === undefined ||
    hasDailyOvertime(inputs.jurisdiction, inputs.hourly_rate, wage)
  );
}

const gateShape = z.object({
  jurisdiction: jurisdictionField,
  state_minimum_wage: amountField.optional(),
  minimum_wage: amountField.optional(),
  hourly_rates: someOf(amountField).optional(),
  hourly_rate: amountField.optional(),
});

/** The pay from which a place's daily overtime ends, and on which side of it each rate lies. */
export const dailyOvertimeGate = kindRule(gateShape, (inputs): CheckResult => {
  const wage = inputs.state_minimum_wage ?? inputs.minimum_wage;
  if (wage === undefined) throw new ScenarioError('state_minimum_wage is missing.');
  const rules = inputs.jurisdiction;
  const gate = dailyGate(rules, wage);
  const applies = (hourly: Exact): boolean => hasDailyOvertime(rules, hourly, wage);
  const answer =
    inputs.hourly_rates?.map(applies) ?? (inputs.hourly_rate === undefined ? undefined : applies(inputs.hourly_rate));
  if (answer === undefined) throw new ScenarioError('hourly_rates is missing.');
  return { ...(gate === null ? {} : { threshold: rate(gate) }), daily_overtime_applies: answer };
});
