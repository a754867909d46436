import { createHmac } from 'node:crypto';
import type { FakeEvent } from './fake-objects.ts';

export type SignatureKind = 'right' | 'wrong' | 'stale' | 'missing';
/** Deliver at once; hold for later; or lose them. */
export type WebhookMode = 'deliver' | 'hold' | 'drop';

export interface Told {
  event: FakeEvent;
  /** The answer to each try: an HTTP status, or null when nobody answered. */
  tries: (number | null)[];
}

/** Waits before the tries after the first, in ms. The service itself goes on for three days. */
const WAITS = [250, 500, 1000, 2000, 5000, 15_000, 60_000, 300_000];
/** Older than the SDK's tolerance of five minutes. */
const STALE_SECONDS = 600;

/** Posts signed events to the app and tries again until it answers 2xx. */
export class WebhookSender {
  readonly #url: () => string;
  readonly #secret: string;
  readonly #told: Told[] = [];
  readonly #timers = new Set<NodeJS.Timeout>();
  #held: Told[] = [];
  #mode: WebhookMode = 'deliver';
  #isStopped = false;

  constructor(url: () => string, secret: string) {
    this.#url = url;
    this.#secret = secret;
  }

  tell(event: FakeEvent): void {
    const told: Told = { event, tries: [] };
    this.#told.push(told);
    if (this.#mode === 'hold') this.#held.push(told);
    if (this.#mode === 'deliver') void this.#deliver(told);
  }

  set mode(mode: WebhookMode) {
    this.#mode = mode;
  }

  get told(): readonly Told[] {
    return this.#told;
  }

  /** Sends what was held, one after another, and delivers at once from now on. */
  async release(order: 'as_made' | 'reversed'): Promise<void> {
    const held = order === 'reversed' ? this.#held.toReversed() : this.#held;
    this.#held = [];
    this.#mode = 'deliver';
    for (const told of held) await this.#deliver(told);
  }

  /** One try, now, whatever became of it before. @returns the answer's status, null when nobody answered */
  async send(told: Told, kind: SignatureKind = 'right'): Promise<number | null> {
    const payload = JSON.stringify(told.event);
    const status = await this.#post(payload, signatureOf(payload, this.#secret, kind));
    told.tries.push(status);
    return status;
  }

  stop(): void {
    this.#isStopped = true;
    for (const timer of this.#timers) clearTimeout(timer);
  }

  async #deliver(told: Told, nth = 0): Promise<void> {
    const status = await this.send(told);
    const wait = WAITS[nth];
    if (this.#isStopped || wait === undefined || (status !== null && status < 300)) return;
    const timer = setTimeout(() => {
      this.#timers.delete(timer);
      void this.#deliver(told, nth + 1);
    }, wait);
    timer.unref();
    this.#timers.add(timer);
  }

  async #post(payload: string, signature: string | null): Promise<number | null> {
    try {
      const answer = await fetch(this.#url(), {
        method: 'POST',
        headers: {
          'content-type': 'application/json; charset=utf-8',
          ...(signature && { 'stripe-signature': signature }),
        },
        body: payload,
        redirect: 'manual',
        signal: AbortSignal.timeout(10_000),
      });
      await answer.arrayBuffer();
      return answer.status;
    } catch {
      return null;
    }
  }
}

/** The scheme v1 of https://docs.stripe.com/webhooks/signature: HMAC-SHA256 over time, dot and body; always by the real clock. */
export function signatureOf(payload: string, secret: string, kind: SignatureKind): string | null {
  if (kind === 'missing') return null;
  const at = Math.floor(Date.now() / 1000) - (kind === 'stale' ? STALE_SECONDS : 0);
  const key = kind === 'wrong' ? `${secret}-not` : secret;
  return `t=${at},v1=${createHmac('sha256', key).update(`${at}.${payload}`).digest('hex')}`;
}
