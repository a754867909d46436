import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { OutboxMail } from '../db/models/index.ts';

export interface Mail {
  to: string;
  subject: string;
  body: string;
}

/** What was or would be sent there goes, with its words. */
export async function dropMailsTo(tx: Transaction, recipient: string): Promise<void> {
  await OutboxMail.destroy({ where: { recipient }, transaction: tx });
}

/** A promise to send: a row in the change's own transaction, sent by the outbox's job with retries. */
export async function queueMail(tx: Transaction, now: Date, mail: Mail): Promise<void> {
  await OutboxMail.create(
    { id: uuid(), recipient: mail.to, subject: mail.subject, body: mail.body, createdAt: now, nextTryAt: now },
    { transaction: tx },
  );
}
