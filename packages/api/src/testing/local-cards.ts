import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll } from 'vitest';
import { startFakePayments } from '../integrations/payments/fake/fake-payments.ts';
import type { FakePayments } from '../integrations/payments/fake/fake-payments.ts';
import { paymentsFor } from '../integrations/payments/index.ts';
import type { TestApp } from './app.ts';
import { useApp } from './app.ts';
import type { StandIn } from './payments.ts';
import { standInAt } from './payments.ts';

export interface CardsApp extends TestApp, StandIn {
  /** Starts the stand-in anew at its place: it has forgotten every page. */
  restartCards: () => Promise<void>;
}

/** An app that takes cards at the local stand-in, which posts its events back over a real socket. */
export function useCardsApp(): CardsApp {
  let fake: FakePayments | null = null;
  let appUrl = '';
  const options = { webhookUrl: () => `${appUrl}/api/webhooks/payments`, hasTestHooks: true };
  beforeAll(async () => {
    fake = await startFakePayments(options);
  });
  const test = useApp({ payments: () => paymentsFor(fake?.place ?? null) }) as CardsApp;
  beforeAll(async () => {
    const { server } = test.app;
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    appUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    Object.assign(
      test,
      standInAt(() => fake?.url ?? ''),
    );
    test.restartCards = async () => {
      if (!fake) throw new Error('the stand-in has not been started');
      const { url, secret } = fake;
      await fake.stop();
      fake = await startFakePayments({ ...options, secret, port: Number(new URL(url).port) });
    };
  });
  afterAll(() => fake?.stop());
  return test;
}
