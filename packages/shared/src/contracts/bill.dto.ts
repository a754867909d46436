import { z } from 'zod';
import { cents, day, id, instant } from './fields.ts';
import { taxClasses } from '../domain/billing/tax-rates.ts';

export const billTo = z.object({ name: z.string(), line: z.string(), city: z.string(), postcode: z.string() });
export type BillTo = z.infer<typeof billTo>;

export const paymentMethods = ['cash', 'check', 'card', 'transfer'] as const;
export type PaymentMethod = (typeof paymentMethods)[number];
export const paymentMethodNames: Record<PaymentMethod, string> = {
  cash: 'Cash',
  check: 'Check',
  card: 'Card',
  transfer: 'Bank transfer',
};

/** `draft`: not billed yet, worked out from the job as it stands. */
export const billStates = ['draft', 'open', 'overdue', 'paid', 'owes_back'] as const;
export type BillState = (typeof billStates)[number];

export const billLineDto = z.object({
  id,
  label: z.string(),
  /** The vehicle. */
  detail: z.string(),
  taxClass: z.enum(taxClasses),
  priceCents: z.int(),
  discountCents: z.int(),
  creditedCents: z.int(),
});
export const billTaxDto = z.object({
  id: id.nullable(),
  name: z.string(),
  place: z.string(),
  taxClass: z.enum(taxClasses),
  percent: z.string(),
  baseCents: z.int(),
  taxCents: z.int(),
  creditedCents: z.int(),
});
export const billPaymentDto = z.object({
  id,
  method: z.enum(paymentMethods),
  amountCents: z.int(),
  receivedAt: instant,
  /** Who took or recorded it; empty for a card payment of the customer's own. */
  by: z.string(),
  reference: z.string(),
  /** Given back so far, without what failed. */
  refundedCents: z.int(),
});
export const billRefundDto = z.object({
  id,
  paymentId: id,
  kind: z.enum(['refund', 'mistake', 'dispute']),
  amountCents: z.int(),
  state: z.enum(['asked', 'done', 'failed']),
  fault: z.string(),
  note: z.string(),
  madeAt: instant,
  creditNoteNumber: z.int().nullable(),
});

/** What a job costs, what was received and what is owed; integer cents throughout. */
export const billDto = z.object({
  jobId: id,
  jobNumber: z.int(),
  customerId: id,
  customerName: z.string(),
  state: z.enum(billStates),
  invoice: z.object({ id, number: z.int(), issuedAt: instant, dueOn: day }).nullable(),
  billTo,
  place: z.string(),
  lines: z.array(billLineDto),
  discountReason: z.string(),
  taxes: z.array(billTaxDto),
  discountCents: z.int(),
  netCents: z.int(),
  taxCents: z.int(),
  totalCents: z.int(),
  creditedCents: z.int(),
  payments: z.array(billPaymentDto),
  refunds: z.array(billRefundDto),
  creditNotes: z.array(z.object({ id, number: z.int(), totalCents: z.int(), issuedAt: instant, note: z.string() })),
  /** Above zero owed by the customer, below zero to the customer. */
  owedCents: cents,
  /** The work is done: it can be billed. */
  isDone: z.boolean(),
  /** Nothing was done and nothing is to come; only a fee can be billed. */
  isCalledOff: z.boolean(),
  /** What is asked before the work and has not come in yet. */
  depositCents: z.int(),
  /** By the policy that the customer agreed to; nobody has billed it yet. */
  proposedFeeCents: z.int().nullable(),
});
export type BillDto = z.infer<typeof billDto>;
