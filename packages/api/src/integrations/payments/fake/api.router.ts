import express from 'express';
import type { Request, RequestHandler, Router } from 'express';
import { z } from 'zod';
import type { Books } from './fake-objects.ts';
import { FakeError } from './fake-objects.ts';
import type { Faults } from './faults.ts';
import { intentNamed, refund } from './refunds.ts';
import { Replies } from './replies.ts';
import { createSession, expireSession, sessionOf } from './sessions.ts';

const cents = z.coerce.number().int().positive();
const metadata = z.record(z.string(), z.string()).default({});

const sessionBody = z.object({
  mode: z.literal('payment'),
  line_items: z
    .array(
      z.object({
        quantity: z.coerce.number().int().positive(),
        price_data: z.object({
          currency: z.literal('usd'),
          unit_amount: cents,
          product_data: z.object({ name: z.string().min(1) }),
        }),
      }),
    )
    .length(1),
  success_url: z.url(),
  cancel_url: z.url(),
  client_reference_id: z.string().max(200).optional(),
  metadata,
  payment_intent_data: z.object({ metadata }).prefault({}),
});

const refundBody = z.object({ payment_intent: z.string(), amount: cents.optional() });

/** The part of the service's API that the SDK calls for Driprail. */
export function apiRouter(books: Books, faults: Faults, pageUrl: (id: string) => string): Router {
  const replies = new Replies();
  const router = express.Router();
  router.use(express.urlencoded({ extended: true, limit: '100kb' }), needsKey);

  const serve =
    (work: (req: Request) => object): RequestHandler =>
    (req, res) => {
      const fault = faults.take();
      if (fault === 'before') {
        res.status(500).json({ error: { type: 'api_error', message: 'An error occurred with our service.' } });
        return;
      }
      const key = req.method === 'POST' ? req.get('idempotency-key') : undefined;
      const asked = `${req.method} ${req.path} ${JSON.stringify(req.body ?? {})}`;
      const { status, body, isReplay } = replies.once(key, asked, () => work(req));
      if (fault === 'after') {
        req.socket.destroy();
        return;
      }
      if (isReplay) res.setHeader('idempotent-replayed', 'true');
      res.status(status).json(body);
    };

  router.post(
    '/checkout/sessions',
    serve((req) => {
      const body = parsed(sessionBody, req.body);
      const [line] = body.line_items;
      if (!line) throw new FakeError(400, { param: 'line_items', message: 'A line is missing.' }, { isKept: false });
      const ask = {
        amount: line.price_data.unit_amount * line.quantity,
        currency: line.price_data.currency,
        label: line.price_data.product_data.name,
        successUrl: body.success_url,
        cancelUrl: body.cancel_url,
        reference: body.client_reference_id ?? null,
        metadata: body.metadata,
        intentMetadata: body.payment_intent_data.metadata,
      };
      return createSession(books, ask, pageUrl);
    }),
  );
  router.get(
    '/checkout/sessions/:id',
    serve((req) => sessionOf(books, named(req))),
  );
  router.post(
    '/checkout/sessions/:id/expire',
    serve((req) => expireSession(books, named(req))),
  );
  router.get(
    '/payment_intents/:id',
    serve((req) => intentNamed(books, named(req))),
  );
  router.post(
    '/refunds',
    serve((req) => {
      const { payment_intent: intentId, amount } = parsed(refundBody, req.body);
      return refund(books, { intentId, amount: amount ?? null });
    }),
  );
  router.use((req, res) => {
    const message = `Unrecognized request URL (${req.method}: /v1${req.path}).`;
    res.status(404).json({ error: { type: 'invalid_request_error', message } });
  });
  return router;
}

/** Any key for tests will do: there is nothing behind it. A live one must never be typed in here. */
const needsKey: RequestHandler = (req, res, next) => {
  if (req.get('authorization')?.startsWith('Bearer sk_test_')) return next();
  const message = 'Invalid API Key provided.';
  res.status(401).json({ error: { type: 'invalid_request_error', message } });
};

const named = (req: Request) => String(req.params['id']);

function parsed<T>(schema: z.ZodType<T>, body: unknown): T {
  const result = schema.safeParse(body ?? {});
  if (result.success) return result.data;
  const [issue] = result.error.issues;
  const param = issue?.path.join('.') ?? '';
  throw new FakeError(400, { code: 'parameter_invalid', param, message: `Invalid ${param}` }, { isKept: false });
}
