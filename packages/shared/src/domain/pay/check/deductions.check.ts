import { z } from 'zod';
import { exact, greatest, least, ZERO, type Exact } from '../../money/exact.ts';
import { deductionRoom } from '../deductions.ts';
import { halfTimePremium, hoursOver, minimumWageShortfall, regularRate } from '../regular-rate.ts';
import { amountField, positiveField, weekHoursField } from './fields.ts';
import { kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

/** 29 USC 206(a)(1)(C), since 24 July 2009. */
const FEDERAL_MINIMUM = exact('7.25');

const capShape = z.object({
  hourly_rate: amountField.optional(),
  amount: amountField.optional(),
  hours_worked: weekHoursField,
  hours_counted: weekHoursField.optional(),
  minimum_wage: amountField.default(() => FEDERAL_MINIMUM),
  state_minimum_wage: amountField.optional(),
  deduction: amountField.optional(),
});

/** The most that may be taken from a week's pay, and what of a wanted deduction that leaves. */
export const deductionCap = kindRule(capShape, (inputs): CheckResult => {
  const { hours_worked: hours, deduction } = inputs;
  const total = inputs.amount ?? inputs.hourly_rate?.mul(hours);
  if (total === undefined) throw new ScenarioError('hourly_rate is missing.');
  const week = inputs.hourly_rate ?? regularRate(total, hours);
  if (week === null) throw new ScenarioError('hours_worked is 0: a rate needs hours.');
  const wage = greatest(inputs.minimum_wage, inputs.state_minimum_wage ?? ZERO);
  const room = deductionRoom(week, wage, inputs.hours_counted ?? hours);
  const premium = halfTimePremium(week, hoursOver(hours));
  return {
    max_deduction: money(room),
    regular_rate: rate(week),
    overtime_premium: money(premium),
    gross_total: money(total.add(premium)),
    ...(deduction === undefined ? {} : taken(deduction, room)),
  };
});

function taken(wanted: Exact, room: Exact): CheckResult {
  return {
    deduction_allowed: money(least(wanted, room)),
    deduction_refused: money(greatest(ZERO, wanted.sub(room))),
    allowed: wanted.lte(room),
  };
}

const wageShape = z.object({
  amount: amountField,
  hours_worked: weekHoursField.refine((hours) => hours.gt(0), { error: 'is 0: a rate needs hours' }),
  minimum_wage: amountField.default(() => FEDERAL_MINIMUM),
  state_minimum_wage: amountField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
});

/** Whether a week meets the minimum wage, what tops it up, and the overtime on no less than the minimum. */
export const minimumWageTest = kindRule(wageShape, (inputs): CheckResult => {
  const { amount, hours_worked: hours } = inputs;
  const wage = greatest(inputs.minimum_wage, inputs.state_minimum_wage ?? ZERO);
  const topUp = minimumWageShortfall(amount, hours, wage);
  const week = regularRate(amount.add(topUp), hours, wage) ?? wage;
  const premium = halfTimePremium(week, hoursOver(hours, inputs.overtime_threshold_hours));
  const parts = [amount, topUp, premium].map((part) => exact(money(part)));
  return {
    effective_rate: rate(amount.div(hours)),
    minimum_wage_met: topUp.lte(0),
    top_up: money(topUp),
    regular_rate: rate(week),
    overtime_premium: money(premium),
    gross_total: money(parts.reduce((total, part) => total.add(part), ZERO)),
  };
});
