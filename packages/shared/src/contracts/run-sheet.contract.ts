import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { clockStateDto } from './clock.contract.ts';
import { day, id, instant, shortText } from './fields.ts';
import { tipsGoTo } from './jobs.contract.ts';
import { visitDto } from './visit.dto.ts';
import { everyone } from '../authz/actor.ts';
import { progressActions } from '../domain/board/progress.ts';
import { troubleKinds } from '../domain/board/trouble.ts';

/** A visit as its crew sees it. Phone and access notes are null outside their hours. */
export const runVisitDto = visitDto.omit({ accepted: true, phone: true }).extend({
  phone: z.string().nullable(),
  gateCode: z.string().nullable(),
  accessNotes: z.string().nullable(),
  vanName: z.string(),
  /** The last pressed action that may still be taken back, and until when. */
  undoable: z.object({ action: z.enum(progressActions), until: instant }).nullable(),
  times: z.object({
    setOffAt: instant.nullable(),
    arrivedAt: instant.nullable(),
    startedAt: instant.nullable(),
    endedAt: instant.nullable(),
  }),
});
export type RunVisitDto = z.infer<typeof runVisitDto>;

export const runSheetDto = z.object({
  day,
  now: instant,
  zone: z.string(),
  vanName: z.string().nullable(),
  crewNames: z.array(z.string()),
  visits: z.array(runVisitDto),
  clock: clockStateDto.nullable(),
  /** Whether a tip may be meant for one of the crew. */
  tipsGoTo: z.enum(tipsGoTo).default('crew'),
});
export type RunSheetDto = z.infer<typeof runSheetDto>;

export const getRunSheet = endpoint({
  method: 'get',
  path: '/api/run-sheet/:day',
  roles: everyone,
  summary: 'One’s own crew’s day in order, for days near today.',
  params: z.object({ day }),
  response: runSheetDto,
});

export const visitActionBody = z.strictObject({
  /** Made by the phone, one per press: the same key is taken once. */
  key: z.uuid(),
  kind: z.enum([...progressActions, 'undo', 'trouble']),
  deviceAt: instant,
  /** Device time minus server time at the last contact, milliseconds. */
  offsetMs: z.int().default(0),
  reason: shortText.default(''),
  trouble: z.enum(troubleKinds).optional(),
  /** For part done: the lines that are finished. */
  finishedLineIds: z.array(id).max(100).optional(),
  /** For part done: how long the rest will take. */
  remainingMinutes: z
    .int()
    .min(5)
    .max(7 * 24 * 60)
    .optional(),
});
export type VisitAction = z.infer<typeof visitActionBody>;
export const postVisitAction = endpoint({
  method: 'post',
  path: '/api/visits/:id/actions',
  roles: everyone,
  summary: 'Mark progress, take the last mark back, or report trouble.',
  params: z.object({ id }),
  body: visitActionBody,
  response: z.object({ visit: runVisitDto, isRepeat: z.boolean() }),
});
