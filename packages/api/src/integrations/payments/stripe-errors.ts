import type { PaymentFault } from './payments.ts';
import { PaymentError } from './payments.ts';

/**
 * One sentence for what the service answered. Types and codes: https://docs.stripe.com/error-codes; that a refund
 * over what is left has no code but names the parameter `amount`, and the wording of one of a payment that never
 * succeeded, are from memory.
 * @returns the very error when it is one of ours or no answer of the service (a fault of this program)
 */
export function asPaymentError(error: unknown): PaymentError {
  if (error instanceof PaymentError) return error;
  const { type, code, param, message } = error as { type?: string; code?: string; param?: string; message?: string };
  if (!type?.startsWith('Stripe')) throw error;
  const say = (reason: PaymentFault, sentence: string) => new PaymentError(reason, sentence, error);

  if (unreachable.has(type)) {
    return say('unreachable', 'The payment service can’t be reached just now. Nothing is lost; try again in a while.');
  }
  if (type === 'StripeAuthenticationError' || type === 'StripePermissionError') {
    return say('not_set_up', 'The payment service does not accept Driprail’s key. The owner must check the settings.');
  }
  if (type === 'StripeIdempotencyError') {
    return say('key_reused', 'This payment was asked for before with another amount. Start a new one.');
  }
  if (code === 'resource_missing') return say('unknown', 'The payment service does not know this payment.');
  if (code === 'charge_already_refunded') return say('too_much', 'All of this payment has been given back already.');
  if (code === 'charge_disputed') {
    return say(
      'disputed',
      'The customer’s bank is looking into this payment: it can’t be given back before that ends.',
    );
  }
  if (code === 'amount_too_small') return say('refused', 'That is less than a card can pay (50 cents).');
  if (code === 'amount_too_large') return say('refused', 'That is more than one card payment can be. Split it.');
  if (/successful charge/.test(message ?? '')) {
    return say('unpaid', 'This payment never went through, so there is nothing to give back.');
  }
  if (param === 'amount') return say('too_much', 'That is more than what is left of this payment.');
  if (type === 'StripeCardError') return say('refused', 'The card was refused. Nothing was taken.');
  return say('refused', `The payment service refused: ${message ?? 'it did not say why'}`);
}

/** SDK types for an answer that never came, or came too often: asking again with the same key is safe. */
const unreachable = new Set(['StripeConnectionError', 'StripeAPIError', 'StripeRateLimitError']);
