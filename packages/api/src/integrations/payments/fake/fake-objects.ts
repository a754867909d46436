import { randomBytes } from 'node:crypto';
import type { Stripe } from 'stripe';

/** Of the service's objects exactly the fields that Driprail reads or a person at the stand-in needs. */
export type Session = Pick<
  Stripe.Checkout.Session,
  | 'id'
  | 'object'
  | 'mode'
  | 'status'
  | 'payment_status'
  | 'amount_total'
  | 'currency'
  | 'client_reference_id'
  | 'metadata'
  | 'created'
  | 'expires_at'
  | 'url'
  | 'success_url'
  | 'cancel_url'
  | 'livemode'
> & { payment_intent: string | null };

export type Intent = Pick<
  Stripe.PaymentIntent,
  'id' | 'object' | 'amount' | 'amount_received' | 'currency' | 'status' | 'metadata' | 'created' | 'livemode'
> & { description: string | null; last_payment_error: { type: string; code: string; message: string } | null };

export type Refund = Pick<
  Stripe.Refund,
  'id' | 'object' | 'amount' | 'currency' | 'status' | 'created' | 'metadata'
> & { payment_intent: string };

export type Dispute = Pick<
  Stripe.Dispute,
  'id' | 'object' | 'amount' | 'currency' | 'status' | 'reason' | 'created' | 'livemode'
> & { payment_intent: string };

export interface FakeEvent {
  id: string;
  object: 'event';
  type: string;
  created: number;
  livemode: false;
  data: { object: object };
}

/** What a session's page shows besides the session. */
export interface PageWords {
  label: string;
  intentMetadata: Record<string, string>;
}

/** Everything the stand-in knows, in memory; it is forgotten with the process. */
export interface Books {
  sessions: Map<string, Session>;
  words: Map<string, PageWords>;
  intents: Map<string, Intent>;
  refunds: Map<string, Refund>;
  disputes: Map<string, Dispute>;
  now: () => Date;
  tell: (type: string, object: object) => void;
}

export const newId = (prefix: string) => `${prefix}_${randomBytes(12).toString('hex')}`;

export const seconds = (at: Date) => Math.floor(at.getTime() / 1000);

/** An answer like the service's own: https://docs.stripe.com/api/errors. */
export class FakeError extends Error {
  readonly status: number;
  readonly body: object;
  /** The request was wrong in itself, so the service keeps no answer for its key. */
  readonly isKept: boolean;

  constructor(
    status: number,
    error: { type?: string; code?: string; param?: string; message: string },
    { isKept = true }: { isKept?: boolean } = {},
  ) {
    super(error.message);
    this.status = status;
    this.body = { error: { type: 'invalid_request_error', ...error } };
    this.isKept = isKept;
  }
}

export const missing = (what: string, id: string, param: string) =>
  new FakeError(404, { code: 'resource_missing', param, message: `No such ${what}: '${id}'` }, { isKept: false });
