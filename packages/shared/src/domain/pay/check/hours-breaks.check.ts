import { z } from 'zod';
import { sum, ZERO, type Exact } from '../../money/exact.ts';
import { decimalText } from '../../money/rounding.ts';
import { isOffDuty } from '../breaks.ts';
import { flagField, minutesField, someOf } from './fields.ts';
import { hoursText, type CheckResult } from './kind-rule.ts';

export const breakField = z.object({
  minutes: minutesField,
  type: z.string().default('rest'),
  relieved_of_duty: flagField.optional(),
});

export const breaksShape = z.object({ breaks: someOf(breakField) });

/** A meal is taken as free of duty unless said otherwise; a rest only when said so. */
export function countedMinutes({ minutes, type, relieved_of_duty }: z.output<typeof breakField>): Exact {
  const isFree = relieved_of_duty ?? /meal|lunch|dinner/.test(type);
  return isOffDuty(Number(minutes.mul(60).toString()), isFree) ? ZERO : minutes;
}

/** Whole minutes of each break that count as worked. */
export function countBreaks({ breaks }: z.output<typeof breaksShape>): CheckResult {
  const counted = breaks.map(countedMinutes);
  return {
    counted_minutes: counted.map((minutes) => decimalText(minutes, 0)),
    counted_hours: hoursText(sum(counted).div(60)),
  };
}
