import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import { ActionRecord } from '../db/models/index.ts';
import { inTransaction, select } from '../db/sequelize.ts';
import type { Ctx } from './context.ts';
import { AppError, unprocessable } from './errors.ts';

export type Outcome<T> = { answer: T } | { refused: AppError };

/**
 * Takes an appended action once per user and key: the effect and the answer are stored in one transaction,
 * and the same key gets the same answer again. A refusal by the rules is kept as a clash.
 * @throws 422 when the key was used for another body
 */
export async function takeOnce<T extends object>(
  ctx: Ctx,
  key: string,
  body: unknown,
  work: (tx: Transaction) => Promise<Outcome<T>>,
): Promise<{ answer: T; isRepeat: boolean }> {
  const bodyHash = createHash('sha256').update(JSON.stringify(body)).digest('hex');
  const userId = ctx.actor.userId;
  const { record, isRepeat } = await inTransaction(async (tx) => {
    // A second press waits here until the first has committed, then finds its row.
    const [mine] = await select(
      `INSERT INTO actions (user_id, key, body_hash, status, answer, received_at) VALUES (:userId, :key, :bodyHash, 0, '{}', :at)
       ON CONFLICT (user_id, key) DO NOTHING RETURNING key`,
      { userId, key, bodyHash, at: ctx.now() },
      tx,
    );
    const found = await ActionRecord.findOne({ where: { userId, key }, transaction: tx, rejectOnEmpty: true });
    if (!mine) {
      if (found.bodyHash !== bodyHash)
        throw unprocessable('key_reused', 'This press was sent before with other content.');
      return { record: found, isRepeat: true };
    }
    const outcome = await work(tx);
    const refused = 'refused' in outcome ? outcome.refused : null;
    await found.update(
      {
        status: refused?.status ?? 200,
        isRefused: refused !== null,
        answer: 'refused' in outcome ? outcome.refused.toBody() : outcome.answer,
      },
      { transaction: tx },
    );
    return { record: found, isRepeat: false };
  });
  if (record.isRefused) {
    const { code, message, hint } = (record.answer as ErrorBody).error;
    throw new AppError(record.status, code, message, hint ? { hint } : {});
  }
  return { answer: record.answer as T, isRepeat };
}

/** Rewrites the kept answers that name any of these ids, so that what was erased is not handed out again. */
export async function rewriteAnswers(
  tx: Transaction,
  ids: readonly string[],
  rewrite: (answer: object) => object,
): Promise<void> {
  if (ids.length === 0) return;
  const rows = await select<{ userId: string; key: string }>(
    `SELECT user_id AS "userId", key FROM actions WHERE answer::text ~ :any`,
    { any: ids.join('|') },
    tx,
  );
  for (const where of rows) {
    const record = await ActionRecord.findOne({ where, transaction: tx, rejectOnEmpty: true });
    await record.update({ answer: rewrite(record.answer) }, { transaction: tx });
  }
}
