import type { Transaction } from 'sequelize';
import { Job } from '../../db/models/index.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import type { PricedLine } from './job-lines.ts';
import { keepLines } from './job-lines.ts';

/**
 * All lines of a job as they were agreed at the car, inside the caller's transaction.
 * @returns the ids of those that are new
 * @throws 404, 422 when the discount would be more than the job or a finished line is left out
 */
export async function putJobLines(tx: Transaction, jobId: string, lines: PricedLine[]): Promise<string[]> {
  const job = await Job.findByPk(jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!job) throw notFound('That job');
  const total = lines.reduce((sum, line) => sum + line.priceCents, 0);
  if (job.discountCents > total)
    throw unprocessable('discount', 'The discount would be more than the job. Call dispatch.');
  const { newIds } = await keepLines(tx, jobId, lines);
  await job.update({ version: job.version + 1 }, { transaction: tx });
  return newIds;
}
