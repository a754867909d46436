import { z } from 'zod';
import { clockField, flagField } from './fields.ts';
import { ScenarioError, type CheckResult } from './kind-rule.ts';
import { clockText } from './hours-shift.check.ts';

export const journeyShape = z.object({
  required_to_return_to_premises: flagField.optional(),
  last_job_end: clockField.optional(),
  back_at_premises: clockField.optional(),
  required_to_report_to_meeting_place: flagField.optional(),
  meeting_place_at: clockField.optional(),
  first_job_start: clockField.optional(),
});

/**
 * Where the workday begins and ends: at a meeting place or the premises when the person must go there, else at the
 * first and the last job; the way to and from home is not worked (29 CFR 785.38).
 */
export function workdayEnds(inputs: z.output<typeof journeyShape>): CheckResult {
  const mustReturn = inputs.required_to_return_to_premises ?? false;
  const mustMeet = inputs.required_to_report_to_meeting_place ?? false;
  if (mustReturn && inputs.back_at_premises === undefined) throw new ScenarioError('back_at_premises is missing.');
  const ends = mustReturn ? inputs.back_at_premises : inputs.last_job_end;
  const starts = mustMeet ? inputs.meeting_place_at : inputs.first_job_start;
  if (ends === undefined && starts === undefined) throw new ScenarioError('last_job_end is missing.');
  return {
    ...(starts === undefined ? {} : { work_starts: clockText(starts) }),
    ...(ends === undefined ? {} : { work_ends: clockText(ends) }),
  };
}
