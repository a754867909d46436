import { z } from 'zod';
import { exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import { addDays } from '../../time/zone.ts';
import { instantOf } from '../../time/zone-instants.ts';
import { isOffDuty } from '../breaks.ts';
import { roundToStep } from '../punch-rounding.ts';
import { hoursOver } from '../regular-rate.ts';
import { breakField, countedMinutes } from './hours-breaks.check.ts';
import { clockField, minutesField, positiveField, signedField } from './fields.ts';
import { hoursText, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const DAY = exact(24 * 60);

export const shiftShape = z
  .object({
    local_start: clockField.optional(),
    local_end: clockField.optional(),
    clock_in: clockField.optional(),
    clock_out: clockField.optional(),
    start: clockField.optional(),
    end: clockField.optional(),
    unpaid_meal_minutes: minutesField.default(() => ZERO),
    breaks: z.array(breakField).default([]),
    utc_offset_change_minutes: signedField.optional(),
    date: z.iso.date().optional(),
    zone: z.string().optional(),
    days: positiveField.default(() => exact(1)),
    rounding_minutes: positiveField.optional(),
    overtime_threshold_hours: positiveField.default(() => exact(40)),
  })
  .transform((inputs, ctx) => {
    const from = inputs.local_start ?? inputs.clock_in ?? inputs.start;
    const to = inputs.local_end ?? inputs.clock_out ?? inputs.end;
    if (from === undefined || to === undefined) {
      ctx.addIssue({ code: 'custom', message: 'lack the end of the shift or its start' });
      return z.NEVER;
    }
    return { ...inputs, from, to };
  });

type Shift = z.output<typeof shiftShape>;

/**
 * A shift on one or several equal days, as time that really passed (a clock change moves it). Worked hours are exact;
 * with rounding_minutes, what a card rounded to that step shows stands beside them, overtime included.
 */
export function shiftHours(shift: Shift): CheckResult {
  const off = offMinutes(shift);
  const worked = hoursOf(minutesBetween(shift, shift.from, shift.to).sub(off), shift.days);
  const result = { hours_worked: hoursText(worked), exact: { hours_worked: rate(worked) } };
  const step = shift.rounding_minutes;
  if (step === undefined)
    return { ...result, overtime_hours: hoursText(hoursOver(worked, shift.overtime_threshold_hours)) };
  if (step.gt(15))
    throw new ScenarioError(
      'rounding_minutes may be at most 15: the nearest 5 minutes, tenth or quarter of an hour (29 CFR 785.48(b)).',
    );
  const from = roundToStep(shift.from, step);
  const to = roundToStep(shift.to, step);
  const rounded = hoursOf(minutesBetween(shift, from, to).sub(off), shift.days);
  return {
    ...result,
    rounded_in: clockText(from),
    rounded_out: clockText(to),
    rounded_hours_worked: hoursText(rounded),
    overtime_hours: hoursText(hoursOver(rounded, shift.overtime_threshold_hours)),
  };
}

/** Meal time that is off the clock; a meal shorter than half an hour counts as worked. */
function offMinutes({ unpaid_meal_minutes: meal, breaks }: Shift): Exact {
  const mealOff = isOffDuty(Number(meal.mul(60).toString()), true) ? meal : ZERO;
  return mealOff.add(sum(breaks.map((item) => item.minutes.sub(countedMinutes(item)))));
}

function minutesBetween(shift: Shift, from: Exact, to: Exact): Exact {
  if (to.equals(from)) throw new ScenarioError('The shift starts and ends at the same time.');
  const overMidnight = to.lt(from);
  const byClock = overMidnight ? to.add(DAY).sub(from) : to.sub(from);
  const passed = byClock.sub(shift.utc_offset_change_minutes ?? clockChange(shift, from, to, overMidnight));
  if (passed.lte(0)) throw new ScenarioError('utc_offset_change_minutes is longer than the shift.');
  return passed;
}

/** By how many minutes the clocks went forward during the shift, where its date and zone are given. */
function clockChange({ date, zone }: Shift, from: Exact, to: Exact, overMidnight: boolean): Exact {
  if (date === undefined || zone === undefined) return ZERO;
  const starts = Date.parse(instantOf(date, clockText(from), zone));
  const ends = Date.parse(instantOf(addDays(date, overMidnight ? 1 : 0), clockText(to), zone));
  if (Number.isNaN(starts) || Number.isNaN(ends)) throw new ScenarioError(`zone "${zone}" is not a time zone.`);
  const byClock = overMidnight ? to.add(DAY).sub(from) : to.sub(from);
  return byClock.sub(exact(ends - starts).div(60_000));
}

function hoursOf(minutes: Exact, days: Exact): Exact {
  if (minutes.lt(0)) throw new ScenarioError('The breaks are longer than the shift.');
  return minutes.mul(days).div(60);
}

/** "06:45"; seconds are dropped. */
export function clockText(minutes: Exact): string {
  const whole = Number(minutes.floor().toString()) % (24 * 60);
  return `${String(Math.floor(whole / 60)).padStart(2, '0')}:${String(whole % 60).padStart(2, '0')}`;
}
