import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { randomBytes } from 'node:crypto';
import express from 'express';
import type { ErrorRequestHandler } from 'express';
import { z } from 'zod';
import type { PaymentsPlace } from '../payments.ts';
import { apiRouter } from './api.router.ts';
import type { Books } from './fake-objects.ts';
import { FakeError, newId, seconds } from './fake-objects.ts';
import { Faults } from './faults.ts';
import { payPageRouter } from './pay-page.router.ts';
import { sessionOf } from './sessions.ts';
import { testHooksRouter } from './test-hooks.router.ts';
import { WebhookSender } from './webhook-sender.ts';

export interface FakePayments {
  /** Where it listens, without a slash at the end. */
  url: string;
  secret: string;
  /** What `paymentsFor` needs to talk to it. */
  place: PaymentsPlace;
  stop: () => Promise<void>;
}

export interface FakePaymentsOptions {
  /** Where events are posted; a function when the app's port is not known yet. */
  webhookUrl: string | (() => string);
  /** Signs the events; made up when left out. */
  secret?: string;
  /** 0 or left out: a free one. */
  port?: number;
  /** The time that events carry and sessions end by. */
  now?: () => Date;
  /** Opens /test: troubles on order. */
  hasTestHooks?: boolean;
}

/** How often sessions whose day is over are looked for, in ms. */
const SWEEP = 60_000;

/** A stand-in for the payment service on this machine. No card is asked for and no money moves. */
export async function startFakePayments(options: FakePaymentsOptions): Promise<FakePayments> {
  const { webhookUrl, port = 0, now = () => new Date(), hasTestHooks = false } = options;
  const secret = options.secret ?? `whsec_${randomBytes(24).toString('hex')}`;
  const sender = new WebhookSender(typeof webhookUrl === 'string' ? () => webhookUrl : webhookUrl, secret);
  const faults = new Faults();
  const books: Books = {
    sessions: new Map(),
    words: new Map(),
    intents: new Map(),
    refunds: new Map(),
    disputes: new Map(),
    now,
    tell: (type, object) =>
      sender.tell({
        id: newId('evt'),
        object: 'event',
        type,
        created: seconds(now()),
        livemode: false,
        data: { object: structuredClone(object) },
      }),
  };

  let url = '';
  const app = express();
  app.disable('x-powered-by');
  app.use(
    '/v1',
    apiRouter(books, faults, (id) => `${url}/pay/${id}`),
  );
  app.use('/pay', payPageRouter(books));
  if (hasTestHooks) app.use('/test', testHooksRouter(books, sender, faults));
  app.use(answerErrors);

  const server = createServer(app);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const sweep = setInterval(() => [...books.sessions.keys()].forEach((id) => sessionOf(books, id)), SWEEP);
  sweep.unref();

  return {
    url,
    secret,
    place: { secretKey: 'sk_test_local', webhookSecret: secret, host: url },
    async stop() {
      clearInterval(sweep);
      sender.stop();
      await new Promise((resolve) => {
        server.close(resolve);
        server.closeAllConnections();
      });
    },
  };
}

const answerErrors: ErrorRequestHandler = (error: unknown, _req, res, next) => {
  if (error instanceof FakeError) res.status(error.status).json(error.body);
  else if (error instanceof z.ZodError) res.status(400).json({ message: z.prettifyError(error) });
  else next(error);
};
