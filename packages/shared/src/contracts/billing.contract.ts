import { z } from 'zod';
import { billDto, billStates } from './bill.dto.ts';
import { endpoint } from './endpoint.ts';
import { bytes, day, done, id, instant, positiveCents, shortText } from './fields.ts';
import { taxClasses } from '../domain/billing/tax-rates.ts';
import { desk, everyone } from '../authz/actor.ts';

const bill = z.object({ bill: billDto });

export const getBill = endpoint({
  method: 'get',
  path: '/api/jobs/:id/bill',
  roles: everyone,
  summary: 'What a job costs, what was received and what is owed; for the desk, and the crew of its visits on the day.',
  params: z.object({ id }),
  response: bill,
});
export const getDayBills = endpoint({
  method: 'get',
  path: '/api/run-sheet/:day/bills',
  roles: everyone,
  summary: 'The bills of one’s own crew’s day, to be shown and paid at the car; for days near today.',
  params: z.object({ day }),
  response: z.object({ bills: z.array(billDto) }),
});
export const issueInvoice = endpoint({
  method: 'post',
  path: '/api/jobs/:id/invoice',
  roles: desk,
  summary: 'Bill the finished lines of a job now; once, with the next number.',
  params: z.object({ id }),
  response: bill,
});
export const getInvoicePdf = endpoint({
  method: 'get',
  path: '/api/jobs/:id/invoice.pdf',
  roles: desk,
  summary: 'A job’s invoice on paper; 404 while it is not billed.',
  params: z.object({ id }),
  response: bytes,
  format: 'pdf',
});
export const feeKinds = ['late_call_off', 'no_show'] as const;
/** As they stand on the invoice. */
export const feeNames: Record<(typeof feeKinds)[number], string> = {
  late_call_off: 'Fee for calling off late',
  no_show: 'Fee for a visit where nobody was there',
};
export const billFee = endpoint({
  method: 'post',
  path: '/api/jobs/:id/fee',
  roles: desk,
  summary: 'Bill a fee for a job that was called off, by the policy that the customer knew.',
  params: z.object({ id }),
  body: z.strictObject({
    kind: z.enum(feeKinds, 'Choose what the fee is for.'),
    amountCents: positiveCents.min(1, 'Give the amount of the fee.'),
    taxClass: z.enum(taxClasses, 'Choose how it is taxed.'),
    note: shortText,
  }),
  response: bill,
});
/** Cash, checks and transfers are recorded by a person; card payments come from the payments service alone. */
export const handMethods = ['cash', 'check', 'transfer'] as const;
export const recordPayment = endpoint({
  method: 'post',
  path: '/api/jobs/:id/payments',
  roles: everyone,
  summary: 'Record what a customer handed over; the same key is taken once.',
  params: z.object({ id }),
  body: z.strictObject({
    key: z.uuid(),
    method: z.enum(handMethods, 'Choose how it was paid.'),
    amountCents: positiveCents.min(1, 'Give the amount that was paid.'),
    /** Beside the amount, for the crew. */
    tipCents: positiveCents.default(0),
    /** Cash that the crew kept on the spot: it adds nothing to what is to be paid. */
    tipIsKept: z.boolean().default(false),
    reference: shortText.default(''),
    deviceAt: instant,
    /** Device time minus server time at the last contact, milliseconds. */
    offsetMs: z.int().default(0),
  }),
  response: bill,
});
export const openPayLink = endpoint({
  method: 'post',
  path: '/api/jobs/:id/pay-link',
  roles: everyone,
  summary: 'The customer’s own page of this job, where the card payment is made; to be shown as a code or sent.',
  params: z.object({ id }),
  response: z.object({ url: z.url() }),
});
const creditedLines = z
  .array(z.strictObject({ id, netCents: positiveCents.min(1, 'Give the amount to credit.') }))
  .max(100);
export const refundPayment = endpoint({
  method: 'post',
  path: '/api/payments/:id/refunds',
  roles: ['owner'],
  summary: 'Give money back: by a credit note on lines, or as overpaid, or take back a payment recorded by mistake.',
  params: z.object({ id }),
  body: z.strictObject({
    key: z.uuid(),
    kind: z.enum(['refund', 'mistake']),
    /** Net amounts by invoice line; their tax goes back with them. Empty: what was overpaid. */
    lines: creditedLines,
    amountCents: positiveCents.min(1, 'Give the amount that goes back.'),
    reasonId: id.nullable(),
    note: shortText.min(1, 'Say why.'),
  }),
  response: bill,
});
export const creditBill = endpoint({
  method: 'post',
  path: '/api/jobs/:id/credit-notes',
  roles: ['owner'],
  summary: 'Credit lines of an invoice without moving money: it lowers what is owed.',
  params: z.object({ id }),
  body: z.strictObject({
    key: z.uuid(),
    lines: creditedLines.min(1, 'Choose what to credit.'),
    reasonId: id.nullable(),
    note: shortText.min(1, 'Say why.'),
  }),
  response: bill,
});
export const listHeld = endpoint({
  method: 'get',
  path: '/api/bills/held',
  roles: desk,
  summary: 'Jobs that were called off and still hold money: to be given back, or billed as a fee.',
  response: z.object({
    held: z.array(z.object({ jobId: id, jobNumber: z.int(), customerName: z.string(), cents: z.int() })),
  }),
});
export const listInvoices = endpoint({
  method: 'get',
  path: '/api/invoices',
  roles: desk,
  summary: 'Invoices with what is owed on each, newest first; found by number, job or customer.',
  query: z.object({
    state: z.enum([...billStates, 'unpaid', 'all']).default('unpaid'),
    find: z.string().trim().max(80).default(''),
    limit: z.coerce.number().int().min(1).max(200).default(50),
    /** Those numbered below it: the next of a long list. */
    before: z.coerce.number().int().optional(),
  }),
  response: z.object({
    invoices: z.array(
      z.object({
        id,
        number: z.int(),
        jobId: id,
        jobNumber: z.int(),
        customerName: z.string(),
        issuedAt: instant,
        dueOn: day,
        totalCents: z.int(),
        owedCents: z.int(),
        state: z.enum(billStates),
      }),
    ),
    total: z.int(),
    owedCents: z.int(),
    overdueCents: z.int(),
  }),
});
export const takePaymentEvent = endpoint({
  method: 'post',
  path: '/api/webhooks/payments',
  roles: 'public',
  summary: 'What the payments service tells; the signature is checked, each event is taken once.',
  response: done,
});
