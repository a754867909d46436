import { z } from 'zod';
import { billDto, billPaymentDto } from './bill.dto.ts';
import { endpoint } from './endpoint.ts';
import { bytes, done, id, instant, positiveCents } from './fields.ts';
import { progressStates } from '../domain/board/progress.ts';
import { photoViews } from '../domain/walk-round/views.ts';

const token = z.object({ token: z.string().min(20).max(80) });

export const customerPhotoDto = z.object({
  id,
  view: z.enum(photoViews),
  moment: z.enum(['before', 'after']),
});
export type CustomerPhotoDto = z.infer<typeof customerPhotoDto>;

/**
 * A customer's own page of one job. No address, no gate code, no phone but the company's; of the crew first names, of the
 * van its name. Where the van is stays unsaid.
 */
export const customerPageDto = z.object({
  companyName: z.string(),
  companyPhone: z.string(),
  zone: z.string(),
  clock: z.enum(['12', '24']),
  /** A first name to be greeted by; a company's whole name. */
  name: z.string(),
  jobNumber: z.int(),
  /** Of the visit that is under way, comes next, or was the last. */
  progress: z.enum(progressStates),
  since: instant.nullable(),
  windowFrom: instant.nullable(),
  windowTo: instant.nullable(),
  /** The start planned for today, once the crew is on its way: an estimate. */
  expectedAt: instant.nullable(),
  vanName: z.string(),
  crewNames: z.array(z.string()),
  /** Who took a payment stays with the company. */
  bill: billDto
    .omit({ customerId: true, billTo: true, refunds: true })
    .extend({ payments: z.array(billPaymentDto.omit({ by: true, reference: true })) }),
  /** What was given to the crew so far. */
  tipCents: z.int(),
  /** A payment page is open, or has just been left: the money may be under way. */
  isPaying: z.boolean(),
  /** Before and after, once the work is done. */
  photos: z.array(customerPhotoDto),
  feedback: z.object({ stars: z.int(), words: z.string() }).nullable(),
});
export type CustomerPageDto = z.infer<typeof customerPageDto>;

export const getCustomerPage = endpoint({
  method: 'get',
  path: '/api/customer-pages/:token',
  roles: 'public',
  summary: 'What a customer sees of one job, by the link that was sent; no account.',
  params: token,
  query: z.object({ returned: z.stringbool().default(false) }),
  response: z.object({ page: customerPageDto }),
});
export const getCustomerInvoice = endpoint({
  method: 'get',
  path: '/api/customer-pages/:token/invoice.pdf',
  roles: 'public',
  summary: 'The invoice on paper, by the link that was sent; 404 while it is not billed.',
  params: token,
  response: bytes,
  format: 'pdf',
});
export const getCustomerPhoto = endpoint({
  method: 'get',
  path: '/api/customer-pages/:token/photos/:id',
  roles: 'public',
  summary: 'A photo of the job, by the link that was sent.',
  params: token.extend({ id }),
  response: bytes,
  format: 'jpeg',
});
export const payByCard = endpoint({
  method: 'post',
  path: '/api/customer-pages/:token/card',
  roles: 'public',
  summary: 'The payment service’s page for what is owed, with a tip for the crew.',
  params: token,
  body: z.strictObject({
    /** What is asked before the work, or all that is owed. */
    part: z.enum(['deposit', 'all']).default('all'),
    tipCents: positiveCents.max(1_000_000, 'That tip looks like a slip. Give at most 10,000.'),
  }),
  response: z.object({ url: z.url() }),
});
export const giveFeedback = endpoint({
  method: 'post',
  path: '/api/customer-pages/:token/feedback',
  roles: 'public',
  summary: 'How it went, one to five stars and words; given again it replaces what was said.',
  params: token,
  body: z.strictObject({
    stars: z.int().min(1, 'Choose one to five stars.').max(5, 'Choose one to five stars.'),
    words: z.string().trim().max(2000, 'At most 2,000 letters.'),
  }),
  response: done,
});
