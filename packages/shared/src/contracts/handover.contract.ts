import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { bytes, day, done, id, instant, planVersion, shortText } from './fields.ts';
import { everyone } from '../authz/actor.ts';

const owner = ['owner'] as const;

/** A locked week as a payday lists it; cents. */
export const handoverWeek = z.object({
  startsOn: day,
  endsOn: day,
  number: z.int(),
  people: z.int(),
  grossCents: z.int(),
});
export type HandoverWeek = z.infer<typeof handoverWeek>;

export const paydayDto = z.object({
  id,
  paysOn: day,
  note: z.string(),
  madeBy: z.string(),
  /** Null until it is handed over; from then on nothing changes. */
  handedOverAt: instant.nullable(),
  handedOverBy: z.string().nullable(),
  /** Oldest first; each was worked out alone. */
  weeks: z.array(handoverWeek),
  version: z.int(),
});
export type PaydayDto = z.infer<typeof paydayDto>;

/** One person's week on a payday; tips and reimbursements are parts of the gross. Cents. */
const personWeekSums = z.object({
  startsOn: day,
  grossCents: z.int(),
  tipCents: z.int(),
  reimbursementCents: z.int(),
});
export const paydayPerson = z.object({ personId: id, name: z.string(), weeks: z.array(personWeekSums) });
export type PaydayPerson = z.infer<typeof paydayPerson>;

export const listPaydays = endpoint({
  method: 'get',
  path: '/api/pay/paydays',
  roles: owner,
  summary: 'The paydays, newest first, and the locked weeks that are on none yet, oldest first.',
  response: z.object({ waiting: z.array(handoverWeek), paydays: z.array(paydayDto) }),
});

const paydayParam = z.object({ id });
export const getPayday = endpoint({
  method: 'get',
  path: '/api/pay/paydays/:id',
  roles: owner,
  summary: 'A payday with each person’s weeks: gross, and the tips and reimbursements in it.',
  params: paydayParam,
  response: z.object({ payday: paydayDto, people: z.array(paydayPerson) }),
});

const paydayBody = z.strictObject({
  paysOn: day,
  note: shortText.default(''),
  /** First days of locked weeks. */
  weeks: z.array(day).min(1, 'Tick at least one locked week.').max(10, 'At most ten weeks on one payday.'),
});
const paydayAnswer = z.object({ payday: paydayDto });
export const makePayday = endpoint({
  method: 'post',
  path: '/api/pay/paydays',
  roles: owner,
  summary: 'Put locked weeks on a payday; each week is on one payday at most.',
  body: paydayBody,
  response: paydayAnswer,
});
export const changePayday = endpoint({
  method: 'put',
  path: '/api/pay/paydays/:id',
  roles: owner,
  summary: 'Change a payday that is not handed over yet: its date, note or weeks.',
  params: paydayParam,
  body: paydayBody.extend({ version: planVersion }),
  response: paydayAnswer,
});
export const removePayday = endpoint({
  method: 'delete',
  path: '/api/pay/paydays/:id',
  roles: owner,
  summary: 'Take a payday away that is not handed over yet; its weeks wait again.',
  params: paydayParam,
  query: z.object({ version: z.coerce.number().int().min(0) }),
  response: done,
});
export const handOverPayday = endpoint({
  method: 'post',
  path: '/api/pay/paydays/:id/hand-over',
  roles: owner,
  summary: 'Mark a payday as handed over. From then on nothing in it changes.',
  params: paydayParam,
  body: z.strictObject({ version: planVersion }),
  response: paydayAnswer,
});

const weekParam = z.object({ startsOn: day });

export const exportPaydayKinds = endpoint({
  method: 'get',
  path: '/api/pay/paydays/:id/kinds.csv',
  roles: owner,
  summary: 'A row per person and week, a column per kind of pay (docs/export.md).',
  params: paydayParam,
  response: z.string(),
  format: 'csv',
});
export const exportPaydayLines = endpoint({
  method: 'get',
  path: '/api/pay/paydays/:id/lines.csv',
  roles: owner,
  summary: 'A row per person and line of every week on the payday, as the week’s own export.',
  params: paydayParam,
  response: z.string(),
  format: 'csv',
});
export const exportPaydayHours = endpoint({
  method: 'get',
  path: '/api/pay/paydays/:id/hours.csv',
  roles: owner,
  summary: 'The clock entries that were paid, cut by day, with the hours that counted.',
  params: paydayParam,
  response: z.string(),
  format: 'csv',
});
export const exportPaydayAll = endpoint({
  method: 'get',
  path: '/api/pay/paydays/:id/export.zip',
  roles: owner,
  summary: 'The statements as PDFs, every file of the payday and a README that names each column.',
  params: paydayParam,
  response: bytes,
  format: 'zip',
});

export const exportWeekKinds = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/kinds.csv',
  roles: owner,
  summary: 'A locked week: a row per person, a column per kind of pay (docs/export.md).',
  params: weekParam,
  response: z.string(),
  format: 'csv',
});
export const exportWeekHours = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/hours.csv',
  roles: owner,
  summary: 'A locked week: the clock entries that were paid, cut by day, with the hours that counted.',
  params: weekParam,
  response: z.string(),
  format: 'csv',
});
export const exportWeekAll = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/export.zip',
  roles: owner,
  summary: 'A locked week: its statements as PDFs, every file and a README that names each column.',
  params: weekParam,
  response: bytes,
  format: 'zip',
});

export const exportPersonPay = endpoint({
  method: 'get',
  path: '/api/pay/people/:personId/export.zip',
  roles: everyone,
  summary: 'Everything kept about one person’s pay: anybody’s for the owner, one’s own for everybody else.',
  params: z.object({ personId: id }),
  response: bytes,
  format: 'zip',
});
