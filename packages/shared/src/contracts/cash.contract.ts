import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { id, instant, positiveCents, shortText } from './fields.ts';
import { desk } from '../authz/actor.ts';

/** Cash of one payment; a tip that the crew kept on the spot is not in it. */
export const heldPaymentDto = z.object({
  id,
  jobId: id,
  jobNumber: z.int(),
  customerName: z.string(),
  receivedAt: instant,
  amountCents: z.int(),
  /** Handed over with it, for the crew by way of pay. */
  tipCents: z.int(),
});
export const cashHolderDto = z.object({
  /** Null: recorded by a login that belongs to no person. */
  personId: id.nullable(),
  name: z.string(),
  /** All that was taken and not counted yet, tips in it. */
  cents: z.int(),
  payments: z.array(heldPaymentDto),
});
export type CashHolderDto = z.infer<typeof cashHolderDto>;
export const cashCountDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  expectedCents: z.int(),
  countedCents: z.int(),
  note: z.string(),
  countedAt: instant,
  countedBy: z.string(),
});
export type CashCountDto = z.infer<typeof cashCountDto>;

const cash = z.object({ holders: z.array(cashHolderDto), counts: z.array(cashCountDto) });
export const getCash = endpoint({
  method: 'get',
  path: '/api/cash',
  roles: desk,
  summary: 'Who holds cash that was not counted yet, and the last counts.',
  response: cash,
});
export const countCash = endpoint({
  method: 'post',
  path: '/api/cash/counts',
  roles: desk,
  summary: 'Count what a person hands in; over or short is noted and never touches pay.',
  body: z.strictObject({
    key: z.uuid(),
    personId: id,
    /** The payments that were seen: when others came in meanwhile the count is refused, 409. */
    paymentIds: z.array(id).min(1, 'This person holds no cash.').max(1000),
    countedCents: positiveCents,
    note: shortText,
  }),
  response: cash,
});
