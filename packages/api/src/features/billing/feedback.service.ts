import { audit } from '../../db/audit.ts';
import { Feedback } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { isOver } from './bill.presenter.ts';
import { readJobRow } from './bill.queries.ts';

/** A customer's word on a job that is done; the last one counts. @throws 422 before it is done */
export function giveFeedback(
  jobId: string,
  { stars, words }: { stars: number; words: string },
  now: Date,
): Promise<void> {
  return inTransaction(async (tx) => {
    const job = await readJobRow(jobId, tx);
    if (!job || !isOver(job)) throw unprocessable('not_over', 'The work is not done yet. Come back when it is.');
    await Feedback.upsert({ jobId, stars, words, givenAt: now }, { transaction: tx });
    await audit(tx, { userId: null, at: now }, 'feedback', jobId, 'given', { jobNumber: job.jobNumber, stars });
    hintAfterCommit(tx, ['desk'], 'job', jobId);
  });
}
