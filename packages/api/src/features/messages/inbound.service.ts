import { createHmac, timingSafeEqual } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import { mailEvent, textEvent } from '@driprail/shared/contracts/messages.contract';
import { phoneDigits } from '@driprail/shared/domain/customer/fold';
import { Message } from '../../db/models/index.ts';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import { badRequest, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { noteBounce } from './bounces.service.ts';

/** Fewer name nobody. */
const FEWEST_DIGITS = 7;

/** What a hook was called with: its bytes as they came, and the header that signs them. */
export interface SignedCall {
  secret: string | null;
  signature: string | undefined;
  body: unknown;
}

/** A mail came back: noted on the customer it went to. One that is not known here is let pass, or it would be sent again. */
export async function takeMailEvent(call: SignedCall, now: Date): Promise<void> {
  const event = read(call, mailEvent);
  const id = /^<?([0-9a-f-]{36})@driprail>?$/.exec(event.messageId)?.[1];
  if (!id) return;
  await inTransaction(async (tx) => {
    const message = await Message.findOne({ where: { id, channel: 'mail' }, transaction: tx, lock: tx.LOCK.UPDATE });
    if (!message || message.bouncedAt) return;
    await noteBounce(tx, message, event.reason, now);
    hintAfterCommit(tx, ['desk'], 'message', message.customerId);
  });
}

/** Words that stop texts at once; those that carriers ask for. Common practice, no source. */
const STOP_WORDS = /^\s*(stop|stopall|unsubscribe|cancel|end|quit)\s*[.!]?\s*$/i;

/** A reply lands on the customer whose phone it came from, and among what waits for the desk. */
export async function takeTextEvent(call: SignedCall, now: Date): Promise<void> {
  const event = read(call, textEvent);
  await inTransaction(async (tx) => {
    const customerId = await customerOf(tx, event.from);
    const [fresh] = await select<{ id: string }>(
      `INSERT INTO enquiries (id, customer_id, sender, body, provider_key, received_at)
       VALUES (:id, :customerId, :sender, :body, :key, :now) ON CONFLICT (provider_key) DO NOTHING RETURNING id`,
      { id: uuid(), customerId, sender: event.from, body: event.body, key: event.key, now },
      tx,
    );
    if (!fresh) return;
    if (customerId && STOP_WORDS.test(event.body))
      await run(
        `INSERT INTO message_stops (customer_id, what, at) VALUES (:customerId, 'texts', :now) ON CONFLICT DO NOTHING`,
        { customerId, now },
        tx,
      );
    hintAfterCommit(tx, ['desk'], 'message', customerId ?? fresh.id);
  });
}

/** Whose number it is; of several the one that was written to last. Compared by digits, as numbers are written in many ways. */
async function customerOf(tx: Transaction, from: string): Promise<string | null> {
  const digits = phoneDigits(from);
  if (digits.length < FEWEST_DIGITS) return null;
  const [found] = await select<{ id: string }>(
    `SELECT c.id FROM customers c
      WHERE c.merged_into IS NULL AND c.erased_at IS NULL
        AND regexp_replace(regexp_replace(split_part(lower(c.phone), 'x', 1), '[^0-9]', '', 'g'), '^1([0-9]{10})$', '\\1') = :digits
      ORDER BY (SELECT max(m.sent_at) FROM messages m WHERE m.customer_id = c.id) DESC NULLS LAST, c.id LIMIT 1`,
    { digits },
    tx,
  );
  return found?.id ?? null;
}

/** @throws 404 without a secret or with another's signature, 400 for what can't be read */
function read<S extends z.ZodType>({ secret, signature, body }: SignedCall, schema: S): z.infer<S> {
  if (!secret || !Buffer.isBuffer(body)) throw notFound('That hook');
  const wanted = createHmac('sha256', secret).update(body).digest();
  const given = Buffer.from(signature ?? '', 'hex');
  if (given.length !== wanted.length || !timingSafeEqual(given, wanted)) throw notFound('That hook');
  const parsed = schema.safeParse(jsonOf(body));
  if (!parsed.success) throw badRequest('That event can’t be read.');
  return parsed.data;
}

function jsonOf(body: Buffer): unknown {
  try {
    return JSON.parse(body.toString('utf8'));
  } catch {
    return null;
  }
}
