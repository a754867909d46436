import { createRequire as requireFrom } from 'node:module';
import type { Stripe } from 'stripe';
import type { Payments, PaymentsPlace } from './payments.ts';
import { PaymentError, PaymentSignatureError } from './payments.ts';
import { asPaymentError } from './stripe-errors.ts';
import { paymentEventOf } from './stripe-events.ts';

/** How long one request may take, in ms. */
const TIMEOUT = 15_000;

/** Card payments by Stripe's hosted pages ("Checkout Sessions"), https://docs.stripe.com/api/checkout/sessions. */
export function stripePayments({ secretKey, webhookSecret, host }: PaymentsPlace): Payments {
  let made: Stripe | null = null;
  const stripe = () => (made ??= client(secretKey, host));

  return {
    async createLink({ attemptId, amountCents, currency, label, returnUrl }) {
      const unit_amount = cents(amountCents);
      const session = await asked(() =>
        stripe().checkout.sessions.create(
          {
            mode: 'payment',
            // A card is taken or refused while the customer waits; other ways to pay answer days later.
            allowed_payment_method_types: ['card'],
            line_items: [{ quantity: 1, price_data: { currency, unit_amount, product_data: { name: label } } }],
            success_url: returnUrl,
            cancel_url: returnUrl,
            client_reference_id: attemptId,
            metadata: { attemptId },
            payment_intent_data: { description: label, metadata: { attemptId } },
          },
          // Keys are shared by all endpoints of an account, hence the prefixes.
          { idempotencyKey: `link-${attemptId}` },
        ),
      );
      if (!session.url) throw new PaymentError('refused', 'The payment service made no page for this payment.');
      return { ref: session.id, url: session.url };
    },

    async expireLink(ref) {
      try {
        await stripe().checkout.sessions.expire(ref);
      } catch (error) {
        const why = asPaymentError(error);
        if (why.reason !== 'refused') throw why;
        // Only an open session can be ended: what became of it says whether that is well.
        const { status } = await asked(() => stripe().checkout.sessions.retrieve(ref));
        if (status === 'expired') return;
        throw status === 'complete' ? new PaymentError('paid', 'This link has been paid already.', error) : why;
      }
    },

    async lookUp(ref) {
      const { status, payment_status, payment_intent } = await asked(() => stripe().checkout.sessions.retrieve(ref));
      const state = status === 'expired' ? 'expired' : payment_status === 'paid' ? 'paid' : 'open';
      return { state, paymentRef: typeof payment_intent === 'string' ? payment_intent : (payment_intent?.id ?? null) };
    },

    async refund({ paymentRef, amountCents, key }) {
      const amount = cents(amountCents);
      const { id, status } = await asked(() =>
        stripe().refunds.create({ payment_intent: paymentRef, amount }, { idempotencyKey: `refund-${key}` }),
      );
      if (status === 'failed' || status === 'canceled') {
        throw new PaymentError('refused', 'The card’s bank did not take the money back. Give it back another way.');
      }
      return { refundRef: id };
    },

    readEvent(raw, signature) {
      try {
        return paymentEventOf(stripe().webhooks.constructEvent(raw, signature ?? '', webhookSecret));
      } catch (error) {
        if ((error as { type?: unknown }).type !== 'StripeSignatureVerificationError') throw error;
        throw new PaymentSignatureError('This message does not carry the payment service’s signature.', {
          cause: error,
        });
      }
    },
  };
}

/** The SDK is large and a message must be read without waiting: it is loaded at once with the first need. */
function client(secretKey: string, host: string | null): Stripe {
  const StripeClient = requireFrom(import.meta.url)('stripe') as typeof Stripe;
  const place = host ? new URL(host) : null;
  return new StripeClient(secretKey, {
    ...(place && {
      host: place.hostname,
      port: place.port || (place.protocol === 'https:' ? '443' : '80'),
      protocol: place.protocol === 'http:' ? 'http' : 'https',
    }),
    maxNetworkRetries: 2,
    timeout: TIMEOUT,
    telemetry: false,
  });
}

async function asked<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    throw asPaymentError(error);
  }
}

function cents(amount: number): number {
  if (!Number.isSafeInteger(amount) || amount <= 0) throw new RangeError('an amount is a whole number of cents over 0');
  return amount;
}
