import { z } from 'zod';
import { exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import { hoursOver } from '../regular-rate.ts';
import { isOffDuty } from '../breaks.ts';
import { clockField, flagField, someOf } from './fields.ts';
import { hoursText, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const segmentField = z
  .object({
    type: z.string(),
    start: clockField,
    end: clockField,
    relieved_of_duty: flagField.optional(),
    required: flagField.optional(),
    counts: flagField.optional(),
  })
  .transform((segment, ctx) => {
    if (segment.start.equals(segment.end))
      ctx.addIssue({ code: 'custom', message: 'starts and ends at the same time' });
    const end = segment.end.lt(segment.start) ? segment.end.add(24 * 60) : segment.end;
    return { ...segment, end };
  });

export const segmentsShape = z.object({ segments: someOf(segmentField) });

type Segment = z.output<typeof segmentField>;

/** The way between home and work, and time free of duty, are not worked (29 CFR 785.16, 785.35). */
const NOT_WORKED = /^(commut.*|home_to_.*|(travel_)?(.*_)?(to_)?home|travel_home_to_.*|off_duty|personal.*)$/;

/** Parts of a day: travel between jobs, waiting, shop, training and short rests count as worked (29 CFR 785.38, 785.15). */
export function segmentHours({ segments }: z.output<typeof segmentsShape>): CheckResult {
  refuseOverlaps(segments);
  const counted = segments.map((segment) => ({
    type: segment.type,
    minutes: counts(segment) ? segment.end.sub(segment.start) : ZERO,
  }));
  const total = sum(counted.map((item) => item.minutes)).div(60);
  const travel = sum(
    counted.filter((item) => /travel|commute|drive|home/.test(item.type)).map((item) => item.minutes),
  ).div(60);
  return {
    travel_hours_counted: hoursText(travel),
    hours_worked: hoursText(total),
    overtime_hours: hoursText(hoursOver(total)),
    exact: { hours_worked: rate(total) },
  };
}

function counts(segment: Segment): boolean {
  if (segment.counts !== undefined) return segment.counts;
  if (segment.required === true) return true;
  if (NOT_WORKED.test(segment.type)) return false;
  const isFree = segment.relieved_of_duty ?? /meal|lunch/.test(segment.type);
  return !isOffDuty(Number(segment.end.sub(segment.start).mul(60).toString()), isFree);
}

function refuseOverlaps(segments: readonly Segment[]): void {
  let reach: Exact = exact(-1);
  for (const { start, end, type } of [...segments].sort((a, b) => a.start.compare(b.start))) {
    if (start.lt(reach)) throw new ScenarioError(`The segment "${type}" overlaps another.`);
    reach = end;
  }
}
