import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, id, instant } from './fields.ts';
import { channels } from '../domain/customer/consent.ts';
import { messageKinds } from '../domain/messages/kinds.ts';
import { messageStates } from '../domain/messages/states.ts';

const desk = ['owner', 'dispatcher'] as const;

export const messageDto = z.object({
  id,
  kind: z.enum(messageKinds),
  channel: z.enum(channels),
  state: z.enum(messageStates),
  customerId: id,
  customerName: z.string(),
  jobId: id,
  jobNumber: z.int(),
  /** Why it was dropped. */
  reason: z.string(),
  /** What the service said at the last try. */
  lastError: z.string(),
  tries: z.int(),
  createdAt: instant,
  /** When it goes out, or is tried again. */
  nextTryAt: instant,
  sentAt: instant.nullable(),
  bouncedAt: instant.nullable(),
  /** As it went out; empty before. */
  recipient: z.string(),
  subject: z.string(),
  body: z.string(),
});
export type MessageDto = z.infer<typeof messageDto>;

export const enquiryDto = z.object({
  id,
  customerId: id.nullable(),
  customerName: z.string(),
  sender: z.string(),
  body: z.string(),
  receivedAt: instant,
  settledAt: instant.nullable(),
  settledBy: z.string(),
});
export type EnquiryDto = z.infer<typeof enquiryDto>;

/** What the desk may look at: `open` is what waits to go out. */
export const messageViews = ['open', 'sent', 'dead', 'dropped'] as const;
export type MessageView = (typeof messageViews)[number];

export const listMessages = endpoint({
  method: 'get',
  path: '/api/messages',
  roles: desk,
  summary:
    'What waits to be sent to customers, was sent, was dropped or could not be delivered; and what came back unanswered.',
  query: z.object({
    show: z.enum(messageViews).default('open'),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  response: z.object({
    messages: z.array(messageDto),
    counts: z.object({ open: z.int(), sent: z.int(), dead: z.int(), dropped: z.int() }),
    enquiries: z.array(enquiryDto),
  }),
});
export const listCustomerMessages = endpoint({
  method: 'get',
  path: '/api/customers/:id/messages',
  roles: desk,
  summary: 'All that was written to one customer and came back, newest first.',
  params: z.object({ id }),
  response: z.object({
    messages: z.array(messageDto),
    enquiries: z.array(enquiryDto),
    /** What the customer has stopped, in words. */
    stops: z.array(z.object({ what: z.string(), at: instant })),
    bounces: z.array(z.object({ address: z.string(), reason: z.string(), at: instant })),
  }),
});
export const retryMessage = endpoint({
  method: 'post',
  path: '/api/messages/:id/retry',
  roles: desk,
  summary: 'Try a message that could not be delivered again, now.',
  params: z.object({ id }),
  response: done,
});
export const dropMessage = endpoint({
  method: 'post',
  path: '/api/messages/:id/drop',
  roles: desk,
  summary: 'Drop a message that waits or could not be delivered.',
  params: z.object({ id }),
  response: done,
});
export const settleEnquiry = endpoint({
  method: 'post',
  path: '/api/enquiries/:id/settle',
  roles: desk,
  summary: 'Mark what a customer wrote as answered.',
  params: z.object({ id }),
  response: done,
});

const stopToken = z.object({ token: z.string().min(20).max(80) });
const stopState = z.object({
  companyName: z.string(),
  companyPhone: z.string(),
  what: z.string(),
  isStopped: z.boolean(),
});

export const getUnsubscribe = endpoint({
  method: 'get',
  path: '/api/unsubscribe/:token',
  roles: 'public',
  summary: 'Which mails a signed link stops, and whether they are stopped.',
  params: stopToken,
  response: stopState,
});
export const unsubscribe = endpoint({
  method: 'post',
  path: '/api/unsubscribe/:token',
  roles: 'public',
  summary: 'Stop such mails; mail programs post here by themselves (RFC 8058).',
  params: stopToken,
  response: stopState,
});
export const subscribeAgain = endpoint({
  method: 'delete',
  path: '/api/unsubscribe/:token',
  roles: 'public',
  summary: 'Take the stop back.',
  params: stopToken,
  response: stopState,
});

export const takeMailEvent = endpoint({
  method: 'post',
  path: '/api/webhooks/mail',
  roles: 'public',
  summary: 'A mail service tells that a mail came back; signed, 404 without a secret.',
  response: done,
});
export const takeTextEvent = endpoint({
  method: 'post',
  path: '/api/webhooks/texts',
  roles: 'public',
  summary: 'A text service hands over a reply; signed, 404 without a secret.',
  response: done,
});

/** What the two hooks carry, read after the signature was checked. */
export const mailEvent = z.object({
  kind: z.literal('bounce'),
  /** As it was sent: <id@driprail>. */
  messageId: z.string().min(1).max(300),
  reason: z.string().max(2000).default(''),
});
export const textEvent = z.object({
  /** The service's own key of the reply: the same is taken once. */
  key: z.string().min(1).max(200),
  from: z.string().min(3).max(60),
  body: z.string().max(10_000),
});
