import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { id, instant, shortText } from './fields.ts';
import { desk } from '../authz/actor.ts';
import { stages } from '../domain/job-work/stages.ts';
import { pours, stepCases, towelUses } from '../domain/job-work/step.ts';

export const checkStepDto = z.object({
  id,
  stage: z.enum(stages, 'Choose a stage.'),
  words: z.string(),
  product: z.string(),
  ratio: z.string(),
  pour: z.enum(pours).nullable(),
  dose: z.string(),
  kitCase: z.enum(stepCases).nullable(),
  towel: z.object({ use: z.enum(towelUses), color: z.string() }).nullable(),
  caution: z.string(),
  isAlone: z.boolean(),
});
export type CheckStepDto = z.infer<typeof checkStepDto>;

export const checklistDto = z.object({
  serviceId: id,
  /** 0 before the first; each save makes the next. */
  version: z.int(),
  /** Whether Done asks the crew for a note. */
  asksNote: z.boolean(),
  steps: z.array(checkStepDto),
  /** Of the version that is shown; null before the first. */
  savedAt: instant.nullable(),
  savedBy: z.string(),
});
export type ChecklistDto = z.infer<typeof checklistDto>;

const stepBody = z.strictObject({
  id,
  stage: z.enum(stages, 'Choose a stage.'),
  words: z.string().trim().min(1, 'Say what is done.').max(160, 'At most 160 letters.'),
  product: z.string().trim().max(80, 'At most 80 letters.'),
  ratio: z.string().trim().max(40, 'At most 40 letters.'),
  pour: z.enum(pours).nullable(),
  dose: z.string().trim().max(80, 'At most 80 letters.'),
  kitCase: z.enum(stepCases).nullable(),
  towel: z
    .strictObject({
      use: z.enum(towelUses),
      color: z.string().trim().min(1, 'Give the towel’s color.').max(30, 'At most 30 letters.'),
    })
    .nullable(),
  caution: shortText,
  isAlone: z.boolean(),
});

export const getChecklist = endpoint({
  method: 'get',
  path: '/api/services/:id/checklist',
  roles: desk,
  summary: 'The steps of a service in order of work, as new visits get them.',
  params: z.object({ id }),
  response: z.object({ checklist: checklistDto }),
});
export const putChecklist = endpoint({
  method: 'put',
  path: '/api/services/:id/checklist',
  roles: ['owner'],
  summary: 'The next version of a service’s steps; visits under way keep theirs.',
  params: z.object({ id }),
  body: z.strictObject({
    /** The version it stands on. */
    version: z.int().min(0),
    asksNote: z.boolean(),
    steps: z.array(stepBody).max(80, 'At most 80 steps.'),
  }),
  response: z.object({ checklist: checklistDto }),
});
