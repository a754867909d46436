import { z } from 'zod';
import { clockKinds } from '../domain/time/clock-kinds.ts';
import { endpoint } from './endpoint.ts';
import { day, done, id, instant, shortText } from './fields.ts';
import { desk, everyone } from '../authz/actor.ts';

/** A stretch of time as it is asked for. */
export const entrySpan = z.strictObject({
  kind: z.enum(clockKinds),
  startedAt: instant,
  endedAt: instant.nullable(),
  isInterrupted: z.boolean(),
});
export type EntrySpan = z.infer<typeof entrySpan>;

export const clockRequestDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  entryId: id.nullable(),
  direction: z.enum(['asked', 'proposed']),
  by: z.string(),
  at: instant,
  before: entrySpan.nullable(),
  after: entrySpan,
  reason: z.string(),
  state: z.enum(['open', 'agreed', 'refused']),
  decidedBy: z.string().nullable(),
  answer: z.string(),
  /** Whether the one who asks may decide it. */
  isMine: z.boolean(),
});
export type ClockRequestDto = z.infer<typeof clockRequestDto>;

export const listClockRequests = endpoint({
  method: 'get',
  path: '/api/clock/requests',
  roles: everyone,
  summary: 'Changes of hours that are asked for or proposed: one’s own, or everybody’s for the desk. Open ones first.',
  response: z.object({ requests: z.array(clockRequestDto) }),
});
export const askClockChange = endpoint({
  method: 'post',
  path: '/api/clock/requests',
  roles: everyone,
  summary:
    'Ask for a change of one’s own hours, or as dispatch propose one to a person; nothing changes before the other side agrees.',
  body: z.strictObject({
    personId: id,
    entryId: id.nullable(),
    after: entrySpan,
    reason: shortText.min(1, 'Say what was wrong.'),
  }),
  response: z.object({ request: clockRequestDto }),
});
export const decideClockChange = endpoint({
  method: 'post',
  path: '/api/clock/requests/:id/decision',
  roles: everyone,
  summary: 'Agree to a change of hours or refuse it; both versions stay on record.',
  params: z.object({ id }),
  body: z.strictObject({ isAgreed: z.boolean(), answer: shortText.default('') }),
  response: z.object({ request: clockRequestDto }),
});

export const hoursWordDto = z.object({
  personId: id,
  personName: z.string(),
  /** Null is silence: shown, never blocking. */
  isRight: z.boolean().nullable(),
  note: z.string(),
  by: z.string().nullable(),
  at: instant.nullable(),
});
export const listHoursWords = endpoint({
  method: 'get',
  path: '/api/clock/weeks/:startsOn',
  roles: everyone,
  summary: 'What people say of their hours in a workweek: one’s own, or everybody’s for the desk.',
  params: z.object({ startsOn: day }),
  response: z.object({ startsOn: day, endsOn: day, words: z.array(hoursWordDto) }),
});
export const sayHours = endpoint({
  method: 'post',
  path: '/api/clock/weeks/:startsOn',
  roles: everyone,
  summary: 'Say that one’s hours of a workweek are right, or what is not.',
  params: z.object({ startsOn: day }),
  body: z
    .strictObject({ isRight: z.boolean(), note: shortText.default('') })
    .refine((said) => said.isRight || said.note !== '', { path: ['note'], message: 'Say what is not right.' }),
  response: done,
});
export const confirmHours = endpoint({
  method: 'post',
  path: '/api/clock/weeks/:startsOn/people/:personId',
  roles: desk,
  summary: 'Confirm a person’s hours of a workweek at the desk, without seeing any rate.',
  params: z.object({ startsOn: day, personId: id }),
  body: z.strictObject({ note: shortText.default('') }),
  response: done,
});
