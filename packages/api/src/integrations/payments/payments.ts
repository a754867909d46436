export interface LinkAsk {
  /** Our own id of the attempt: the idempotency key, and returned in events. */
  attemptId: string;
  amountCents: number;
  currency: 'usd';
  /** What the customer reads, e.g. "Invoice 1042, Tern & Tide". */
  label: string;
  /** Where the customer comes back to, paid or not. */
  returnUrl: string;
}

export interface PayLink {
  /** The service's name for the link. */
  ref: string;
  url: string;
}

/**
 * What the service tells. It may tell it twice, late and in any order: `id` is the same each time.
 * `paid` counts once per `paymentRef`, `refunded` once per `refundRef`.
 */
export type PaymentEvent =
  | {
      id: string;
      kind: 'paid';
      at: Date;
      ref: string;
      attemptId: string;
      paymentRef: string;
      amountCents: number;
    }
  /** A refused card (`failed`) leaves the link open, and the service then names the attempt alone: `ref` is ''. */
  | { id: string; kind: 'failed' | 'expired'; at: Date; ref: string; attemptId: string }
  | { id: string; kind: 'refunded'; at: Date; paymentRef: string; refundRef: string; amountCents: number }
  | {
      id: string;
      kind: 'dispute_opened' | 'dispute_won' | 'dispute_lost';
      at: Date;
      paymentRef: string;
      disputeRef: string;
      amountCents: number;
    }
  | { id: string; kind: 'other'; at: Date; type: string };

/** Card payments on pages of the payment service: no card number, name or date ever reaches Driprail. */
export interface Payments {
  /**
   * A page that takes this amount once. The same attempt gives the same link for at least a day, which is also how
   * long a link lives; after that take a new attempt.
   * @throws PaymentError
   */
  createLink(ask: LinkAsk): Promise<PayLink>;
  /**
   * Makes a link take no more money; fine if it has expired already.
   * @throws PaymentError with the reason `paid` when the money was faster
   */
  expireLink(ref: string): Promise<void>;
  /** What became of a link, for when its event got lost. @throws PaymentError */
  lookUp(ref: string): Promise<{ state: 'open' | 'paid' | 'expired'; paymentRef: string | null }>;
  /**
   * Gives back all or a part. The same key gives the same refund, for at least a day.
   * @throws PaymentError with the reason `too_much`, `unpaid`, `disputed`, `unknown` or `unreachable`
   */
  refund(ask: { paymentRef: string; amountCents: number; key: string }): Promise<{ refundRef: string }>;
  /**
   * Reads an event out of the request's body exactly as it came.
   * @throws PaymentSignatureError on a wrong, missing or stale signature
   */
  readEvent(raw: Buffer, signature: string | undefined): PaymentEvent;
}

export interface PaymentsPlace {
  secretKey: string;
  webhookSecret: string;
  /** Where a stand-in listens; null for the service itself. */
  host: string | null;
}

/** Why nothing was done. Only after `unreachable` may the same be asked again with the same key. */
export type PaymentFault =
  'paid' | 'too_much' | 'unpaid' | 'disputed' | 'unknown' | 'key_reused' | 'refused' | 'not_set_up' | 'unreachable';

/** The service would not or could not; the message is a sentence for people. */
export class PaymentError extends Error {
  readonly reason: PaymentFault;

  constructor(reason: PaymentFault, message: string, cause?: unknown) {
    super(message, { cause });
    this.reason = reason;
  }
}

/** An event that may come from anybody: nothing in it may be believed. */
export class PaymentSignatureError extends Error {}
