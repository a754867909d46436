import { PaymentError, PaymentSignatureError } from './payments.ts';
import type { Payments, PaymentsPlace } from './payments.ts';
import { stripePayments } from './stripe-payments.ts';

export { PaymentError, PaymentSignatureError } from './payments.ts';
export type { LinkAsk, PayLink, PaymentEvent, PaymentFault, Payments, PaymentsPlace } from './payments.ts';

/** The payments that the settings name; with none every question is answered that cards are not set up. */
export function paymentsFor(place: PaymentsPlace | null): Payments {
  return place ? stripePayments(place) : withoutCards;
}

const notSetUp = (): Promise<never> =>
  Promise.reject(
    new PaymentError(
      'not_set_up',
      'Card payments are not set up. Take cash or a check, or ask the owner to set them up.',
    ),
  );

const withoutCards: Payments = {
  createLink: notSetUp,
  expireLink: notSetUp,
  lookUp: notSetUp,
  refund: notSetUp,
  readEvent() {
    throw new PaymentSignatureError('Card payments are not set up.');
  },
};
