import type { Books, Intent, Session } from './fake-objects.ts';
import { FakeError, missing, newId, seconds } from './fake-objects.ts';

export interface SessionAsk {
  amount: number;
  currency: string;
  label: string;
  successUrl: string;
  cancelUrl: string;
  reference: string | null;
  metadata: Record<string, string>;
  intentMetadata: Record<string, string>;
}

/** A session ends by itself after a day: https://docs.stripe.com/api/checkout/sessions/object, `expires_at`. */
const LIFE = 24 * 60 * 60;
/** Least charge in US dollars: https://docs.stripe.com/currencies#minimum-and-maximum-charge-amounts. */
const LEAST = 50;

export function createSession(books: Books, ask: SessionAsk, pageUrl: (id: string) => string): Session {
  if (ask.amount < LEAST) {
    throw new FakeError(400, {
      code: 'amount_too_small',
      message: 'The Checkout Session’s total amount must convert to at least 50 cents.',
    });
  }
  const id = newId('cs_test');
  const created = seconds(books.now());
  const session: Session = {
    id,
    object: 'checkout.session',
    mode: 'payment',
    status: 'open',
    payment_status: 'unpaid',
    payment_intent: null,
    amount_total: ask.amount,
    currency: ask.currency,
    client_reference_id: ask.reference,
    metadata: ask.metadata,
    created,
    expires_at: created + LIFE,
    url: pageUrl(id),
    success_url: ask.successUrl.replaceAll('{CHECKOUT_SESSION_ID}', id),
    cancel_url: ask.cancelUrl,
    livemode: false,
  };
  books.sessions.set(id, session);
  books.words.set(id, { label: ask.label, intentMetadata: ask.intentMetadata });
  return session;
}

/** @throws FakeError 404 */
export function sessionOf(books: Books, id: string): Session {
  const session = books.sessions.get(id);
  if (!session) throw missing('checkout.session', id, 'session');
  if (session.status === 'open' && session.expires_at <= seconds(books.now())) end(books, session);
  return session;
}

/** @throws FakeError 400 unless the session is open, as https://docs.stripe.com/api/checkout/sessions/expire says */
export function expireSession(books: Books, id: string): Session {
  const session = sessionOf(books, id);
  if (session.status !== 'open') {
    throw new FakeError(400, {
      message: `Only Checkout Sessions with a status in ["open"] can be expired. This one is ${session.status}.`,
    });
  }
  end(books, session);
  return session;
}

function end(books: Books, session: Session): void {
  session.status = 'expired';
  session.url = null;
  books.tell('checkout.session.expired', session);
}

/** The customer presses Pay. A second press, in whatever tab, takes nothing. */
export function pay(books: Books, session: Session): void {
  if (session.status !== 'open') return;
  const intent = intentOf(books, session);
  intent.status = 'succeeded';
  intent.amount_received = intent.amount;
  intent.last_payment_error = null;
  session.status = 'complete';
  session.payment_status = 'paid';
  session.url = null;
  books.tell('payment_intent.succeeded', intent);
  books.tell('checkout.session.completed', session);
}

/** The bank refuses the card; the session stays open for another. */
export function refuse(books: Books, session: Session): void {
  if (session.status !== 'open') return;
  const intent = intentOf(books, session);
  intent.status = 'requires_payment_method';
  intent.last_payment_error = { type: 'card_error', code: 'card_declined', message: 'Your card was declined.' };
  books.tell('payment_intent.payment_failed', intent);
}

/** The service makes the intent with the first try at paying, not with the session. */
function intentOf(books: Books, session: Session): Intent {
  const known = books.intents.get(session.payment_intent ?? '');
  if (known) return known;
  const words = books.words.get(session.id);
  const intent: Intent = {
    id: newId('pi'),
    object: 'payment_intent',
    amount: session.amount_total ?? 0,
    amount_received: 0,
    currency: session.currency ?? 'usd',
    status: 'requires_payment_method',
    description: words?.label ?? null,
    metadata: words?.intentMetadata ?? {},
    last_payment_error: null,
    created: seconds(books.now()),
    livemode: false,
  };
  books.intents.set(intent.id, intent);
  session.payment_intent = intent.id;
  return intent;
}
