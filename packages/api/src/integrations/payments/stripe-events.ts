import type { Stripe } from 'stripe';
import type { PaymentEvent } from './payments.ts';

/**
 * What a verified event means for an invoice; all else is `other`. Event types: https://docs.stripe.com/api/events/types.
 * Sessions without our attempt were made elsewhere in the same account and are `other` too.
 */
export function paymentEventOf(event: Stripe.Event): PaymentEvent {
  return meaningOf(event) ?? { ...stamp(event), kind: 'other', type: event.type };
}

function meaningOf(event: Stripe.Event): PaymentEvent | null {
  switch (event.type) {
    case 'checkout.session.completed':
    case 'checkout.session.async_payment_succeeded':
      return paid(event, event.data.object);
    case 'checkout.session.async_payment_failed':
      return ofAttempt(event, 'failed', event.data.object.id, event.data.object.metadata);
    case 'checkout.session.expired':
      return ofAttempt(event, 'expired', event.data.object.id, event.data.object.metadata);
    case 'payment_intent.payment_failed':
      return ofAttempt(event, 'failed', '', event.data.object.metadata);
    case 'refund.created':
      return refunded(event, event.data.object);
    case 'refund.updated':
      // Told once: when it became what it was not before.
      return event.data.previous_attributes?.status === undefined ? null : refunded(event, event.data.object);
    case 'charge.dispute.created':
      return isInquiry(event.data.object.status) ? null : disputed(event, 'dispute_opened', event.data.object);
    case 'charge.dispute.updated': {
      const before = event.data.previous_attributes?.status;
      const isNew = before !== undefined && isInquiry(before) && !isInquiry(event.data.object.status);
      return isNew ? disputed(event, 'dispute_opened', event.data.object) : null;
    }
    case 'charge.dispute.closed': {
      const { status } = event.data.object;
      if (status !== 'won' && status !== 'lost') return null;
      return disputed(event, status === 'won' ? 'dispute_won' : 'dispute_lost', event.data.object);
    }
    default:
      return null;
  }
}

function paid(event: Stripe.Event, session: Stripe.Checkout.Session): PaymentEvent | null {
  const { id: ref, payment_status, payment_intent, amount_total: amountCents } = session;
  const attemptId = session.metadata?.['attemptId'];
  const paymentRef = idOf(payment_intent);
  if (payment_status !== 'paid' || !attemptId || !paymentRef || amountCents === null) return null;
  return { ...stamp(event), kind: 'paid', ref, attemptId, paymentRef, amountCents };
}

function ofAttempt(
  event: Stripe.Event,
  kind: 'failed' | 'expired',
  ref: string,
  metadata: Stripe.Metadata | null,
): PaymentEvent | null {
  const attemptId = metadata?.['attemptId'];
  return attemptId ? { ...stamp(event), kind, ref, attemptId } : null;
}

function refunded(event: Stripe.Event, refund: Stripe.Refund): PaymentEvent | null {
  const paymentRef = idOf(refund.payment_intent);
  if (refund.status !== 'succeeded' || !paymentRef) return null;
  return { ...stamp(event), kind: 'refunded', paymentRef, refundRef: refund.id, amountCents: refund.amount };
}

function disputed(
  event: Stripe.Event,
  kind: 'dispute_opened' | 'dispute_won' | 'dispute_lost',
  dispute: Stripe.Dispute,
): PaymentEvent | null {
  const paymentRef = idOf(dispute.payment_intent);
  if (!paymentRef) return null;
  return { ...stamp(event), kind, paymentRef, disputeRef: dispute.id, amountCents: dispute.amount };
}

/** A bank's mere question: no money moves (https://docs.stripe.com/disputes/how-disputes-work, "inquiries"). */
const isInquiry = (status: string) => status.startsWith('warning_');

const idOf = (named: string | { id: string } | null | undefined) => (typeof named === 'string' ? named : named?.id);

const stamp = ({ id, created }: Stripe.Event) => ({ id, at: new Date(created * 1000) });
