import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, beforeEach } from 'vitest';
import type { FakePayments } from '../integrations/payments/fake/fake-payments.ts';
import { startFakePayments } from '../integrations/payments/fake/fake-payments.ts';
import type { PaymentEvent, Payments } from '../integrations/payments/index.ts';
import { PaymentSignatureError, paymentsFor } from '../integrations/payments/index.ts';

/** What tests do at the stand-in from outside. */
export interface StandIn {
  /** Presses a button of a pay page. @returns the answer, redirects not followed */
  press: (url: string, button: 'pay' | 'refuse') => Promise<Response>;
  /** Troubles on order, see docs/payments.md. @throws Error with the answer when it is not 2xx */
  hook: <T>(path: string, body?: object) => Promise<T>;
}

export function standInAt(url: () => string): StandIn {
  return {
    press: (page, button) =>
      fetch(page, { method: 'POST', body: new URLSearchParams({ press: button }), redirect: 'manual' }),
    async hook<T>(path: string, body?: object) {
      const headers = { 'content-type': 'application/json' };
      const init = body && { method: 'POST', headers, body: JSON.stringify(body) };
      const answer = await fetch(`${url()}/test${path}`, init);
      if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`);
      return (answer.status === 204 ? null : await answer.json()) as T;
    },
  };
}

export interface PaymentsRig extends StandIn {
  fake: FakePayments;
  payments: Payments;
  /** Every event that came in and was believed, in order of arrival. */
  events: PaymentEvent[];
  /** How many were refused for their signature. */
  refused: () => number;
  /** The receiver answers the next so many events with 500. */
  failNext: (times: number) => void;
  /** Resolves when an event of this kind has come, also when it came before. */
  arrived: <K extends PaymentEvent['kind']>(kind: K) => Promise<Extract<PaymentEvent, { kind: K }>>;
}

/** The SDK, the stand-in and a receiver of its events, each behind a real socket; events start anew with each test. */
export function usePayments(): PaymentsRig {
  const rig = {} as PaymentsRig;
  let wake: (() => void)[] = [];
  let refused = 0;
  let failing = 0;

  const receiver = createServer((req, res) => {
    const chunks: Buffer[] = [];
    req.on('data', (chunk: Buffer) => chunks.push(chunk));
    req.on('end', () => {
      res.statusCode = take(Buffer.concat(chunks), String(req.headers['stripe-signature'] ?? ''));
      res.end();
    });
  });

  function take(raw: Buffer, signature: string): number {
    if (failing > 0) {
      failing -= 1;
      return 500;
    }
    try {
      rig.events.push(rig.payments.readEvent(raw, signature || undefined));
      for (const tell of wake.splice(0)) tell();
      return 200;
    } catch (error) {
      if (!(error instanceof PaymentSignatureError)) throw error;
      refused += 1;
      return 400;
    }
  }

  beforeAll(async () => {
    await new Promise<void>((resolve) => receiver.listen(0, '127.0.0.1', resolve));
    const webhookUrl = `http://127.0.0.1:${(receiver.address() as AddressInfo).port}/`;
    rig.fake = await startFakePayments({ webhookUrl, hasTestHooks: true });
    rig.payments = paymentsFor(rig.fake.place);
    rig.refused = () => refused;
    rig.failNext = (times) => (failing = times);
    Object.assign(
      rig,
      standInAt(() => rig.fake.url),
    );
    rig.arrived = async (kind) => {
      const found = () => rig.events.find((event) => event.kind === kind);
      while (!found()) await new Promise<void>((resolve) => wake.push(resolve));
      return found() as never;
    };
  });
  beforeEach(() => {
    rig.events = [];
    wake = [];
    refused = 0;
    failing = 0;
  });
  afterAll(async () => {
    await rig.fake.stop();
    receiver.closeAllConnections();
    await new Promise((resolve) => receiver.close(resolve));
  });
  return rig;
}
