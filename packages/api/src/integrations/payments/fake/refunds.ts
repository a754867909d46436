import type { Books, Dispute, Intent, Refund } from './fake-objects.ts';
import { FakeError, missing, newId, seconds } from './fake-objects.ts';

/** @throws FakeError 404 */
export function intentNamed(books: Books, id: string): Intent {
  const intent = books.intents.get(id);
  if (!intent) throw missing('payment_intent', id, 'payment_intent');
  return intent;
}

/**
 * Gives back a part or, without an amount, what is left. The wording of the errors is from memory; that they are
 * errors is in https://docs.stripe.com/api/refunds/create.
 */
export function refund(books: Books, { intentId, amount }: { intentId: string; amount: number | null }): Refund {
  const intent = intentNamed(books, intentId);
  if (intent.status !== 'succeeded') {
    throw new FakeError(400, {
      message: `This PaymentIntent (${intent.id}) does not have a successful charge to refund.`,
    });
  }
  const disputes = [...books.disputes.values()].filter(({ payment_intent: id }) => id === intent.id);
  if (disputes.some(({ status }) => status !== 'won')) {
    throw new FakeError(400, { code: 'charge_disputed', message: 'This charge has been charged back.' });
  }
  const left = intent.amount_received - refundedOf(books, intent.id);
  if (left === 0) {
    throw new FakeError(400, { code: 'charge_already_refunded', message: 'This charge has already been refunded.' });
  }
  const given = amount ?? left;
  if (given > left) {
    const dollars = (cents: number) => `$${(cents / 100).toFixed(2)}`;
    throw new FakeError(400, {
      param: 'amount',
      message: `Refund amount (${dollars(given)}) is greater than unrefunded amount on charge (${dollars(left)})`,
    });
  }
  const made: Refund = {
    id: newId('re'),
    object: 'refund',
    amount: given,
    currency: intent.currency,
    payment_intent: intent.id,
    status: 'succeeded',
    metadata: {},
    created: seconds(books.now()),
  };
  books.refunds.set(made.id, made);
  books.tell('refund.created', made);
  return made;
}

/** Cents of a payment that went back so far. */
function refundedOf(books: Books, intentId: string): number {
  return [...books.refunds.values()]
    .filter(({ payment_intent: id }) => id === intentId)
    .reduce((sum, { amount }) => sum + amount, 0);
}

/** The customer's bank takes the money back until somebody is right. */
export function openDispute(books: Books, { intentId, amount }: { intentId: string; amount: number | null }): Dispute {
  const intent = intentNamed(books, intentId);
  if (intent.status !== 'succeeded') throw new FakeError(400, { message: 'Only a paid payment can be disputed.' });
  const dispute: Dispute = {
    id: newId('du'),
    object: 'dispute',
    amount: amount ?? intent.amount_received - refundedOf(books, intent.id),
    currency: intent.currency,
    payment_intent: intent.id,
    reason: 'general',
    status: 'needs_response',
    created: seconds(books.now()),
    livemode: false,
  };
  books.disputes.set(dispute.id, dispute);
  books.tell('charge.dispute.created', dispute);
  return dispute;
}

export function closeDispute(books: Books, id: string, status: 'won' | 'lost'): Dispute {
  const dispute = books.disputes.get(id);
  if (!dispute) throw missing('dispute', id, 'dispute');
  if (dispute.status !== 'needs_response') throw new FakeError(400, { message: 'This dispute is closed already.' });
  dispute.status = status;
  books.tell('charge.dispute.closed', dispute);
  return dispute;
}
