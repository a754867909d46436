import { z } from 'zod';
import { exact } from '../../money/exact.ts';
import { decimalText } from '../../money/rounding.ts';
import { roundToStep } from '../punch-rounding.ts';
import { clockField, hoursField, minutesField, positiveField, someOf } from './fields.ts';
import { clockText } from './hours-shift.check.ts';
import { kindRule, ScenarioError, type CheckResult } from './kind-rule.ts';

const shape = z.object({
  rounding_minutes: positiveField.default(() => exact(15)),
  minutes: someOf(minutesField).optional(),
  hours: someOf(hoursField).optional(),
  times: someOf(clockField).optional(),
});

/** Minutes or clock times to a step, hours to two places; halves up. */
export const roundingTime = kindRule(shape, ({ rounding_minutes: step, minutes, hours, times }): CheckResult => {
  if (!minutes && !hours && !times) throw new ScenarioError('Neither minutes, hours nor times are given.');
  if (step.gt(15)) throw new ScenarioError('rounding_minutes may be at most 15 (29 CFR 785.48(b)).');
  return {
    ...(minutes ? { rounded_minutes: minutes.map((value) => decimalText(roundToStep(value, step), 0)) } : {}),
    ...(hours ? { rounded_hours: hours.map((value) => decimalText(value, 2)) } : {}),
    ...(times ? { rounded_times: times.map((value) => clockText(roundToStep(value, step))) } : {}),
  };
});
