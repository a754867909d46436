import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, id, instant, shortText } from './fields.ts';
import { desk, everyone } from '../authz/actor.ts';
import { clockKinds } from '../domain/time/clock-kinds.ts';

export const clockEntryDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  kind: z.enum(clockKinds),
  visitId: id.nullable(),
  jobNumber: z.int().nullable(),
  startedAt: instant,
  endedAt: instant.nullable(),
  isInterrupted: z.boolean(),
  /** A clock-out that was forgotten is flagged, never guessed. */
  isForgotten: z.boolean(),
  note: z.string(),
  version: z.int(),
});
export type ClockEntryDto = z.infer<typeof clockEntryDto>;

/** Somebody who rides along now, and whether that clock runs. */
export const crewClockDto = z.object({
  personId: id,
  name: z.string(),
  kind: z.enum(clockKinds).nullable(),
  since: instant.nullable(),
});

export const clockStateDto = z.object({
  personId: id,
  open: clockEntryDto.nullable(),
  today: z.array(clockEntryDto),
  inSince: instant.nullable(),
  todayMinutes: z.int(),
  weekMinutes: z.int(),
  forgotten: z.array(clockEntryDto),
  /** Who rides in the same van now. */
  crew: z.array(crewClockDto).default([]),
  /** The house's rule for reminding of breaks. */
  breaks: z
    .object({ mealAfterMinutes: z.int().nullable(), restAfterMinutes: z.int().nullable() })
    .default({ mealAfterMinutes: null, restAfterMinutes: null }),
});
export type ClockStateDto = z.infer<typeof clockStateDto>;

export const getClock = endpoint({
  method: 'get',
  path: '/api/clock',
  roles: everyone,
  summary: 'One’s own clock: what runs now, today, and the week so far.',
  response: z.object({ clock: clockStateDto.nullable() }),
});
export const postClockAction = endpoint({
  method: 'post',
  path: '/api/clock/actions',
  roles: everyone,
  summary: 'Clock in, change the kind of time, or clock out.',
  body: z.strictObject({
    key: z.uuid(),
    action: z.enum(['start', 'stop']),
    kind: z.enum(clockKinds).optional(),
    /** Somebody who rides along; left out: oneself. It is marked as pressed by another. */
    forPersonId: id.optional(),
    deviceAt: instant,
    offsetMs: z.int().default(0),
  }),
  response: z.object({ clock: clockStateDto, isRepeat: z.boolean() }),
});
export const listClock = endpoint({
  method: 'get',
  path: '/api/clock/entries',
  roles: desk,
  summary: 'Everybody’s clock entries of a span of days; hours, never money.',
  query: z.object({ from: day, to: day, personId: id.optional() }),
  response: z.object({ entries: z.array(clockEntryDto) }),
});
const span = { kind: z.enum(clockKinds), startedAt: instant, endedAt: instant.nullable(), isInterrupted: z.boolean() };
export const addClockEntry = endpoint({
  method: 'post',
  path: '/api/clock/entries',
  roles: desk,
  summary: 'Write down time that the clock missed, with a reason.',
  body: z.strictObject({ personId: id, visitId: id.nullable(), ...span, reason: shortText.min(1, 'Say why.') }),
  response: z.object({ entry: clockEntryDto }),
});
export const correctClockEntry = endpoint({
  method: 'put',
  path: '/api/clock/entries/:id',
  roles: desk,
  summary: 'Correct an entry with a reason; the first version stays on record.',
  params: z.object({ id }),
  body: z.strictObject({ ...span, version: z.int(), reason: shortText.min(1, 'Say what was wrong.') }),
  response: z.object({ entry: clockEntryDto }),
});
