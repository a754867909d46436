import type { Transaction } from 'sequelize';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import type { FileStore } from '../../integrations/storage/index.ts';

const visits = `(SELECT v.id FROM visits v JOIN jobs j ON j.id = v.job_id WHERE j.customer_id IN (:customerIds))`;

/**
 * A customer's photos and initials go; what was found on the car stays. The files are named here and removed after the
 * commit, by whoever comes first: a file whose row is gone is never forgotten.
 */
export async function eraseWalkRounds(tx: Transaction, customerIds: string[], at: Date): Promise<void> {
  await run(
    `INSERT INTO files_to_remove (storage_key, since)
     SELECT storage_key, :at FROM photos WHERE visit_id IN ${visits} AND storage_key IS NOT NULL ON CONFLICT (storage_key) DO NOTHING`,
    { customerIds, at },
    tx,
  );
  await run(`DELETE FROM photos WHERE visit_id IN ${visits}`, { customerIds }, tx);
  await run(
    `UPDATE walk_rounds SET initials = NULL, absent_reason = 'Erased on request', items_note = '' WHERE visit_id IN ${visits}`,
    { customerIds },
    tx,
  );
}

/** Removes the files that erasures named. One that can't be removed now stays named for the next time. @throws what the store says */
export async function removeErasedFiles(store: FileStore): Promise<void> {
  const files = await select<{ key: string }>('SELECT storage_key AS key FROM files_to_remove ORDER BY since');
  for (const { key } of files) {
    await store.remove(key);
    await inTransaction((tx) => run('DELETE FROM files_to_remove WHERE storage_key = :key', { key }, tx));
  }
}
