import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import {
  cents,
  day,
  id,
  instant,
  longText,
  minutes,
  planVersion,
  positiveCents,
  shortText,
  sizeClass,
} from './fields.ts';
import { visitDto } from './visit.dto.ts';
import { callBackCauses } from '../domain/board/call-back.ts';
import { desk, everyone } from '../authz/actor.ts';

const lineBody = z.strictObject({
  id: id.optional(),
  serviceId: id,
  vehicleId: id.nullable(),
  sizeClass,
  /** Left out: the menu's price and minutes of the day. */
  priceCents: positiveCents.optional(),
  minutes: minutes.optional(),
});
const jobFields = {
  customerId: id,
  addressId: id,
  windowFrom: instant.nullable(),
  windowTo: instant.nullable(),
  notes: longText,
  discountCents: positiveCents,
  discountReason: shortText,
  lines: z.array(lineBody).min(1, 'Add at least one service.').max(100),
};
const windowInOrder = {
  check: (job: { windowFrom: string | null; windowTo: string | null }) =>
    !job.windowFrom || !job.windowTo || Date.parse(job.windowTo) > Date.parse(job.windowFrom),
  message: { path: ['windowTo'], message: 'The window must end after it starts.' },
};
const discountExplained = {
  check: (job: { discountCents: number; discountReason: string }) =>
    job.discountCents === 0 || job.discountReason !== '',
  message: { path: ['discountReason'], message: 'Say why there is a discount.' },
};
export const jobBody = z
  .strictObject(jobFields)
  .refine(windowInOrder.check, windowInOrder.message)
  .refine(discountExplained.check, discountExplained.message);
export type JobBody = z.input<typeof jobBody>;

export const jobDto = z.object({
  id,
  number: z.int(),
  ...jobFields,
  customerName: z.string(),
  lines: z.array(
    z.object({
      id,
      serviceId: id,
      serviceName: z.string(),
      vehicleId: id.nullable(),
      vehicle: z.string(),
      sizeClass,
      priceCents: z.int(),
      minutes: z.int(),
      isFinished: z.boolean(),
    }),
  ),
  totalCents: cents,
  /** The job that this one puts right. */
  callBackOf: z.object({ id, number: z.int() }).nullable(),
  callBackCause: z.enum(callBackCauses).nullable(),
  /** Jobs that put something of this one right. */
  callBacks: z.array(z.object({ id, number: z.int(), cause: z.enum(callBackCauses) })),
  tips: z.array(z.object({ id, amountCents: z.int(), method: z.string(), at: instant })),
  visits: z.array(visitDto),
  history: z.array(z.object({ at: instant, by: z.string(), text: z.string() })),
  version: z.int(),
});
export type JobDto = z.infer<typeof jobDto>;

export const getJob = endpoint({
  method: 'get',
  path: '/api/jobs/:id',
  roles: desk,
  summary: 'One job with its lines, visits and what happened so far.',
  params: z.object({ id }),
  response: z.object({ job: jobDto }),
});
export const findJobs = endpoint({
  method: 'get',
  path: '/api/jobs',
  roles: desk,
  summary: 'Jobs found by number, customer, plate or street.',
  query: z.object({ find: z.string().trim().min(1).max(80) }),
  response: z.object({
    jobs: z.array(
      z.object({
        id,
        number: z.int(),
        customerName: z.string(),
        address: z.string(),
        services: z.string(),
        progress: z.string(),
        from: instant.nullable(),
      }),
    ),
  }),
});
export const createJob = endpoint({
  method: 'post',
  path: '/api/jobs',
  roles: desk,
  summary: 'Order a job; its first visit lands on Unplaced.',
  body: jobBody,
  response: z.object({ job: jobDto }),
});
export const updateJob = endpoint({
  method: 'put',
  path: '/api/jobs/:id',
  roles: desk,
  summary: 'Change a job. Finished lines stay as they are.',
  params: z.object({ id }),
  body: z
    .strictObject({ ...jobFields, version: planVersion })
    .refine(windowInOrder.check, windowInOrder.message)
    .refine(discountExplained.check, discountExplained.message),
  response: z.object({ job: jobDto }),
});
export const copyJob = endpoint({
  method: 'post',
  path: '/api/jobs/:id/copy',
  roles: desk,
  summary: 'Order the same again at today’s prices; lands on Unplaced.',
  params: z.object({ id }),
  response: z.object({ job: jobDto }),
});
/** How many days ahead a car is listed as due. */
export const DUE_AHEAD_DAYS = 14;
export const listDue = endpoint({
  method: 'get',
  path: '/api/due-again',
  roles: desk,
  summary:
    'Cars whose service is due again by the menu’s interval, and that nothing is booked for; the longest overdue first.',
  response: z.object({
    due: z.array(
      z.object({
        /** The job that was done last. */
        jobId: id,
        jobNumber: z.int(),
        customerId: id,
        customerName: z.string(),
        phone: z.string(),
        vehicle: z.string(),
        serviceName: z.string(),
        doneOn: day,
        dueOn: day,
        priceCents: z.int(),
      }),
    ),
  }),
});
export const callBackJob = endpoint({
  method: 'post',
  path: '/api/jobs/:id/call-back',
  roles: desk,
  summary: 'Go back to put something of a past job right, free to the customer; lands on Unplaced.',
  params: z.object({ id }),
  body: z
    .strictObject({
      cause: z.enum(callBackCauses, 'Choose what is wrong.'),
      lineIds: z.array(id).min(1, 'Choose what has to be put right.').max(100),
      minutes,
      notes: longText,
      windowFrom: instant.nullable(),
      windowTo: instant.nullable(),
    })
    .refine(windowInOrder.check, windowInOrder.message),
  response: z.object({ job: jobDto }),
});
export const callOffJob = endpoint({
  method: 'post',
  path: '/api/jobs/:id/call-off',
  roles: desk,
  summary: 'Call a job off with a reason: its visits that have not been worked leave the day.',
  params: z.object({ id }),
  body: z.strictObject({ version: planVersion, reason: shortText.min(1, 'Say why the job is called off.') }),
  response: z.object({ job: jobDto }),
});
export const addVisit = endpoint({
  method: 'post',
  path: '/api/jobs/:id/visits',
  roles: desk,
  summary: 'Another going-out to the job (a second day, a second crew); lands on Unplaced.',
  params: z.object({ id }),
  body: z.strictObject({
    minutes,
    lineIds: z.array(id).max(100),
    /** The same parking place as this visit, so that both may run side by side. */
    besideVisitId: id.nullable(),
  }),
  response: z.object({ job: jobDto }),
});
/** A tip meant for one of the crew: shared by the crew all the same, or that person's. */
export const tipsGoTo = ['crew', 'person'] as const;
export const recordTip = endpoint({
  method: 'post',
  path: '/api/jobs/:id/tips',
  roles: everyone,
  summary: 'Record a tip. It belongs to the crew; cash kept on the spot adds nothing to what is to be paid.',
  params: z.object({ id }),
  body: z.strictObject({
    key: z.uuid(),
    amountCents: positiveCents.min(1, 'Give the amount of the tip.'),
    method: z.enum(['card', 'cash', 'invoice']),
    alreadyReceived: z.boolean(),
    /** One of the crew whom the customer meant; counts where the company's rule says so. */
    forPersonId: id.nullable().default(null),
  }),
  response: z.object({ ok: z.literal(true) }),
});
