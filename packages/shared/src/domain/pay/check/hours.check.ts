import { z } from 'zod';
import { breaksShape, countBreaks } from './hours-breaks.check.ts';
import { journeyShape, workdayEnds } from './hours-journey.check.ts';
import { dayCardsShape, dayCards } from './hours-day-cards.check.ts';
import { segmentsShape, segmentHours } from './hours-segments.check.ts';
import { shiftShape, shiftHours } from './hours-shift.check.ts';
import { kindRule, ScenarioError, type KindRule } from './kind-rule.ts';

/** The shapes in which worked time can be told, by the field that gives each away. */
const SHAPES: { fields: string[]; rule: KindRule }[] = [
  { fields: ['segments'], rule: kindRule(segmentsShape, segmentHours) },
  { fields: ['local_start', 'clock_in', 'start'], rule: kindRule(shiftShape, shiftHours) },
  {
    fields: [
      'required_to_return_to_premises',
      'last_job_end',
      'required_to_report_to_meeting_place',
      'first_job_start',
    ],
    rule: kindRule(journeyShape, workdayEnds),
  },
  { fields: ['breaks'], rule: kindRule(breaksShape, countBreaks) },
  { fields: ['days', 'punches'], rule: kindRule(dayCardsShape, dayCards) },
];

/** Hours worked, told as a shift, as time cards, as parts of a day, as breaks or as the way to and from work. */
export const hoursWorked: KindRule = (inputs) => {
  const given = z.record(z.string(), z.unknown(), { error: 'The inputs are not an object' }).parse(inputs);
  const shape = SHAPES.find(({ fields }) => fields.some((field) => given[field] !== undefined));
  if (!shape)
    throw new ScenarioError('The inputs hold no times: give clock_in and clock_out, punches, segments or breaks.');
  return shape.rule(inputs);
};
