import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll } from 'vitest';
import supertest from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import webPush from 'web-push';
import { createApp } from '../app.ts';
import type { App } from '../app.ts';
import { readConfig } from '../config.ts';
import { connect, disconnect } from '../db/sequelize.ts';
import { deliveryParts } from '../deliveries.ts';
import type { DeliveryParts } from '../features/messages/index.ts';
import { useCheapHashes } from '../features/access/index.ts';
import type { Payments } from '../integrations/payments/index.ts';
import { paymentsFor } from '../integrations/payments/index.ts';
import { SetUpCode } from '../features/settings/index.ts';
import { localTexts } from '../integrations/texts/index.ts';
import type { TakenText } from '../integrations/texts/index.ts';
import { createLogger } from '../log.ts';
import { localMail } from '../mail/transport.ts';
import type { TakenMail } from '../mail/transport.ts';

/** 11:00 on a Thursday in New York, which is the demo company's zone. */
export const NOON = '2026-05-14T15:00:00.000Z';

/** Sign what the fakes post back. */
export const HOOKS = { mail: 'mail-hook-secret-of-tests', texts: 'text-hook-secret-of-tests' };

export interface TestApp {
  app: App;
  setUpCode: string;
  taken: () => TakenMail[];
  send: ReturnType<typeof localMail>['send'];
  /** What messages to customers are sent by. */
  deliveries: DeliveryParts;
  takenTexts: () => TakenText[];
  /** The app's clock; set it to move time. */
  time: { now: string };
  /** Files that the app keeps; gone at the end. */
  dataDir: string;
  anonymous: () => TestAgent;
}

/** One app on this test file's own database, closed at its end. @param payments who takes cards; nobody by default */
export function useApp({ payments }: { payments?: () => Payments } = {}): TestApp {
  const test = { time: { now: NOON } } as TestApp;
  beforeAll(() => {
    useCheapHashes();
    test.dataDir = mkdtempSync(join(tmpdir(), 'driprail-api-'));
    const config = { ...readConfig(process.env), isTest: true, hookSecrets: HOOKS, dataDir: test.dataDir };
    connect(config.databaseUrl, 8);
    const now = () => new Date(test.time.now);
    const code = new SetUpCode();
    const mail = localMail(config.mailFrom, now);
    const texts = localTexts(now);
    test.deliveries = deliveryParts({
      ...{ secret: 'only for tests', sendMail: mail.send, texts, mailKnowsRepeats: true },
      baseUrl: () => 'http://127.0.0.1:4600',
    });
    test.takenTexts = texts.taken;
    test.app = createApp({
      config,
      now,
      log: createLogger('error'),
      secret: 'only for tests',
      setUpCode: code,
      localMail: mail.taken,
      deliveries: test.deliveries,
      localTexts: texts.taken,
      payments: payments?.() ?? paymentsFor(null),
      pushKeys: { ...webPush.generateVAPIDKeys(), contact: 'mailto:no-reply@driprail.example' },
    });
    test.setUpCode = code.make();
    test.taken = mail.taken;
    test.send = mail.send;
    test.anonymous = () => supertest.agent(test.app.server);
  });
  afterAll(async () => {
    await test.app.close();
    await disconnect();
    rmSync(test.dataDir, { recursive: true, force: true });
  });
  return test;
}
