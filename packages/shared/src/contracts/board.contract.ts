import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { clockTime, day, id, instant, planVersion, shortText } from './fields.ts';
import { visitDto } from './visit.dto.ts';
import { desk } from '../authz/actor.ts';
import { warningCodes } from '../domain/board/findings.ts';

export const boardCrewDto = z.object({
  personId: id,
  name: z.string(),
  skills: z.array(z.string()),
  isTrainee: z.boolean(),
  from: instant,
  to: instant,
  isOff: z.boolean(),
  /** Worked so far this workweek plus what is still planned; hours, never money. */
  weekMinutes: z.int(),
  isClockedIn: z.boolean(),
});
export const boardVanDto = z.object({
  id,
  name: z.string(),
  equipment: z.array(z.string()),
  crew: z.array(boardCrewDto),
});
export const boardDto = z.object({
  day,
  zone: z.string(),
  clock: z.enum(['12', '24']),
  now: instant,
  dayStartsAt: clockTime,
  dayEndsAt: clockTime,
  isLocked: z.boolean(),
  overtimeAfterMinutes: z.int(),
  reasonKinds: z.array(z.enum(warningCodes)),
  vans: z.array(boardVanDto),
  visits: z.array(visitDto),
  /** Every visit without a van or time, whatever its promised day. */
  unplaced: z.array(visitDto),
  /** Open reports of trouble on this day's visits. */
  troubles: z.array(z.object({ id, visitId: id, at: instant, kind: z.string(), note: z.string(), by: z.string() })),
});
export type BoardDto = z.infer<typeof boardDto>;
export type BoardVanDto = z.infer<typeof boardVanDto>;

export const getBoard = endpoint({
  method: 'get',
  path: '/api/board/:day',
  roles: desk,
  summary: 'A day by vans, and what is unplaced.',
  params: z.object({ day }),
  response: boardDto,
});
export const getBoardWeek = endpoint({
  method: 'get',
  path: '/api/board/:day/week',
  roles: desk,
  summary: 'The load of each van on each day of the week that holds a day, in planned minutes.',
  params: z.object({ day }),
  response: z.object({
    days: z.array(z.object({ day, vans: z.array(z.object({ vanId: id, minutes: z.int(), visits: z.int() })) })),
    capacityMinutes: z.int(),
  }),
});
export const moveBody = z.strictObject({
  visitId: id,
  planVersion,
  vanId: id.nullable(),
  from: instant.nullable(),
  to: instant.nullable(),
  stopId: id.optional(),
});
export const acceptBody = z.strictObject({
  visitId: id,
  key: z.string().max(200),
  reason: shortText.min(1, 'Give a reason.'),
});
export const moveVisits = endpoint({
  method: 'post',
  path: '/api/board/moves',
  roles: desk,
  summary: 'Place, move, resize or unplace visits: all of the list or nothing.',
  body: z.strictObject({ moves: z.array(moveBody).min(1).max(100), accept: z.array(acceptBody).max(500).default([]) }),
  response: z.object({ visits: z.array(visitDto) }),
});
export const settleTrouble = endpoint({
  method: 'post',
  path: '/api/troubles/:id/settle',
  roles: desk,
  summary: 'Say how a reported trouble was settled.',
  params: z.object({ id }),
  body: z.strictObject({ outcome: shortText.min(1, 'Say how it was settled.') }),
  response: z.object({ ok: z.literal(true) }),
});
