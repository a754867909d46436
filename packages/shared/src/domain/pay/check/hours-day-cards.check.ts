import { z } from 'zod';
import { exact, sum, type Exact } from '../../money/exact.ts';
import { decimalText } from '../../money/rounding.ts';
import { roundToStep } from '../punch-rounding.ts';
import { hoursOver } from '../regular-rate.ts';
import { clockField, positiveField, someOf } from './fields.ts';
import { hoursText, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const punchesField = someOf(clockField).refine((punches) => punches.length % 2 === 0, {
  error: 'has a clock-in without a clock-out',
});
const dayField = z
  .preprocess((day) => (Array.isArray(day) ? { punches: day } : day), z.object({ punches: punchesField }))
  .transform((day) => day.punches);

export const dayCardsShape = z.object({
  days: someOf(dayField).optional(),
  punches: punchesField.optional(),
  rounding_minutes: positiveField.optional(),
  overtime_threshold_hours: positiveField.default(() => exact(40)),
});

const QUARTER = exact(15);

/**
 * Time cards of in and out punches. Hours worked are the exact minutes. `hours_by_day` is the time sheet's day column:
 * each day's total to the nearest quarter hour, as the sample of DOL Fact Sheet #21 shows it, or to rounding_minutes.
 */
export function dayCards(inputs: z.output<typeof dayCardsShape>): CheckResult {
  const days = inputs.days ?? (inputs.punches ? [inputs.punches] : []);
  const minutes = days.map(minutesWorked);
  const hours = sum(minutes).div(60);
  const step = inputs.rounding_minutes ?? QUARTER;
  return {
    hours_by_day: minutes.map((day) => hoursText(roundToStep(day, step).div(60))),
    minutes_by_day: minutes.map((day) => decimalText(day, 0)),
    hours_worked: hoursText(hours),
    overtime_hours: hoursText(hoursOver(hours, inputs.overtime_threshold_hours)),
    exact: { hours_by_day: minutes.map((day) => rate(day.div(60))), hours_worked: rate(hours) },
  };
}

/** In and out in turn; a punch earlier than the one before lies on the next day. */
function minutesWorked(punches: readonly Exact[]): Exact {
  const times: Exact[] = [];
  for (const punch of punches) {
    const previous = times.at(-1);
    const time = previous?.gt(punch) ? punch.add(24 * 60) : punch;
    if (previous?.gt(time)) throw new ScenarioError('The punches of a day reach over more than 24 hours.');
    times.push(time);
  }
  return sum(times.map((time, index) => (index % 2 === 0 ? time.neg() : time)));
}
