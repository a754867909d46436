import type { Transaction } from 'sequelize';
import { OutboxMail } from '../db/models/index.ts';
import { inTransaction, run, select } from '../db/sequelize.ts';
import type { SendMail } from '../mail/transport.ts';
import { RETRY_SECONDS } from './retry.ts';

/**
 * Sends what waits, one mail a transaction; a row that another process holds is left to it.
 * A failure is tried again later and later, then rests with its error.
 * @returns how many were sent
 */
export async function sendWaitingMails(send: SendMail, now: () => Date): Promise<number> {
  let sent = 0;
  while (await inTransaction((tx) => sendOne(tx, send, now()))) sent += 1;
  return sent;
}

async function sendOne(tx: Transaction, send: SendMail, now: Date): Promise<boolean> {
  const [row] = await select<{ id: string }>(
    `SELECT id FROM outbox_mails WHERE sent_at IS NULL AND next_try_at <= :now AND tries <= ${RETRY_SECONDS.length}
      ORDER BY next_try_at LIMIT 1 FOR UPDATE SKIP LOCKED`,
    { now },
    tx,
  );
  if (!row) return false;
  const mail = await OutboxMail.findByPk(row.id, { transaction: tx, rejectOnEmpty: true });
  try {
    await send({ id: mail.id, to: mail.recipient, subject: mail.subject, text: mail.body });
    await mail.update({ sentAt: now, tries: mail.tries + 1, lastError: null }, { transaction: tx });
  } catch (error) {
    await run(
      `UPDATE outbox_mails SET tries = tries + 1, last_error = :error, next_try_at = :now::timestamptz + make_interval(secs => :wait) WHERE id = :id`,
      { id: mail.id, error: String(error).slice(0, 500), now, wait: RETRY_SECONDS[mail.tries] ?? 86_400 },
      tx,
    );
  }
  return true;
}
