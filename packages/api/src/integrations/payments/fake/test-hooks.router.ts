import express from 'express';
import type { Router } from 'express';
import { z } from 'zod';
import type { Books } from './fake-objects.ts';
import type { Faults } from './faults.ts';
import { closeDispute, openDispute } from './refunds.ts';
import type { WebhookSender } from './webhook-sender.ts';

const modeBody = z.strictObject({ mode: z.enum(['deliver', 'hold', 'drop']) });
const releaseBody = z.strictObject({ order: z.enum(['as_made', 'reversed']).default('as_made') });
const sendBody = z.strictObject({
  times: z.int().min(1).max(20).default(1),
  signature: z.enum(['right', 'wrong', 'stale', 'missing']).default('right'),
});
const disputeBody = z.strictObject({
  paymentRef: z.string(),
  amountCents: z.int().positive().nullable().default(null),
});
const closeBody = z.strictObject({ as: z.enum(['won', 'lost']) });
const faultBody = z.strictObject({ when: z.enum(['before', 'after']), times: z.int().min(1).default(1) });

/** What the real service does to us at times, on order; for tests only. */
export function testHooksRouter(books: Books, sender: WebhookSender, faults: Faults): Router {
  const router = express.Router();
  router.use(express.json());

  router.get('/events', (_req, res) => {
    res.json({ events: sender.told.map(({ event: { id, type }, tries }) => ({ id, type, tries })) });
  });
  router.post('/events/:id/send', async (req, res) => {
    const { times, signature } = sendBody.parse(req.body ?? {});
    const told = sender.told.find(({ event }) => event.id === req.params.id);
    if (!told) return void res.status(404).json({ message: 'No such event.' });
    const answers: (number | null)[] = [];
    for (let nth = 0; nth < times; nth++) answers.push(await sender.send(told, signature));
    res.json({ answers });
  });
  router.post('/webhooks', (req, res) => {
    sender.mode = modeBody.parse(req.body).mode;
    res.status(204).end();
  });
  router.post('/webhooks/release', async (req, res) => {
    await sender.release(releaseBody.parse(req.body ?? {}).order);
    res.status(204).end();
  });
  router.post('/disputes', (req, res) => {
    const { paymentRef: intentId, amountCents: amount } = disputeBody.parse(req.body);
    res.json(openDispute(books, { intentId, amount }));
  });
  router.post('/disputes/:id/close', (req, res) => {
    res.json(closeDispute(books, req.params.id, closeBody.parse(req.body).as));
  });
  router.post('/faults', (req, res) => {
    faults.order(faultBody.parse(req.body));
    res.status(204).end();
  });
  return router;
}
