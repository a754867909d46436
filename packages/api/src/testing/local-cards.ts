import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll } from 'vitest';
import { startFakePayments } from '../integrations/payments/fake/fake-payments.ts';
import type { FakePayments } from '../integrations/payments/fake/fake-payments.ts';
import { paymentsFor } from '../integrations/payments/index.ts';
import type { TestApp } from './app.ts';
import { useApp } from './app.ts';

export interface CardsApp extends TestApp {
  /** Presses a button of a payment page. */
  press: (url: string, button: 'pay' | 'refuse') => Promise<Response>;
  /** Troubles on order, see the stand-in's test hooks. */
  hook: <T>(path: string, body?: object) => Promise<T>;
}

/** An app that takes cards at the local stand-in, which posts its events back over a real socket. */
export function useCardsApp(): CardsApp {
  let fake: FakePayments | null = null;
  let appUrl = '';
  beforeAll(async () => {
    const webhookUrl = () => `${appUrl}/api/webhooks/payments`;
    fake = await startFakePayments({ webhookUrl, hasTestHooks: true });
  });
  const test = useApp({ payments: () => paymentsFor(fake?.place ?? null) }) as CardsApp;
  beforeAll(async () => {
    const { server } = test.app;
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    appUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    test.press = (url, button) =>
      fetch(url, { method: 'POST', body: new URLSearchParams({ press: button }), redirect: 'manual' });
    test.hook = async <T>(path: string, body?: object) => {
      const headers = { 'content-type': 'application/json' };
      const init = body && { method: 'POST', headers, body: JSON.stringify(body) };
      const answer = await fetch(`${fake?.url}/test${path}`, init);
      if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`);
      return (answer.status === 204 ? null : await answer.json()) as T;
    };
  });
  afterAll(() => fake?.stop());
  return test;
}
