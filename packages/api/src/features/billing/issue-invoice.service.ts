import type { Transaction } from 'sequelize';
import { Invoice, Job } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { queueMessage } from '../messages/index.ts';
import { billableLines, isOver } from './bill.presenter.ts';
import { isOpenVisit, readJobRow } from './bill.queries.ts';
import { noteIfPaid } from './note-paid.ts';
import type { By } from './note-paid.ts';
import { writeInvoice } from './write-invoice.ts';

/**
 * Bills the finished lines of a job that is over, once; one that is billed stays as it is.
 * @returns the invoice's id
 * @throws 404, 422 for a job that is not over
 */
export async function issueInvoice(tx: Transaction, jobId: string, { userId, at }: By): Promise<string> {
  // Whoever comes second waits here, and then finds the invoice.
  await Job.findByPk(jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
  const standing = await Invoice.findOne({ where: { jobId, voidedAt: null }, transaction: tx });
  if (standing) return standing.id;
  const job = await readJobRow(jobId, tx);
  if (!job) throw notFound('That job');
  if (!isOver(job))
    throw unprocessable('not_over', `Job ${job.jobNumber} is not done yet. It can be billed when its work is.`);
  const lines = billableLines(job).map(({ id: jobLineId, isFinished: _done, ...line }) => ({ jobLineId, ...line }));
  const discount = { cents: job.discountCents, reason: job.discountReason };
  const id = await writeInvoice(tx, job, lines, discount, { userId, at });
  // A deposit may have covered it all.
  await noteIfPaid(tx, { id: jobId, number: job.jobNumber }, { userId, at });
  await queueMessage(tx, at, { kind: 'done', jobId, causeId: id, eventKey: `invoice:${id}` });
  hintAfterCommit(tx, ['everyone'], 'bill', jobId);
  return id;
}

/** Jobs that are over and past the time in which Done may be taken back are billed, oldest first, each in its own transaction. */
export async function issueDueInvoices(now: Date): Promise<number> {
  const due = await select<{ jobId: string }>(
    `SELECT j.id AS "jobId" FROM jobs j CROSS JOIN company_settings s
      WHERE j.call_back_of IS NULL AND EXISTS (SELECT 1 FROM job_lines l WHERE l.job_id = j.id AND l.finished_at >= s.bills_from)
        AND NOT EXISTS (SELECT 1 FROM invoices i WHERE i.job_id = j.id)
        AND NOT EXISTS (SELECT 1 FROM visits v WHERE v.job_id = j.id AND ${isOpenVisit})
        AND NOT EXISTS (SELECT 1 FROM visit_events e JOIN visits v ON v.id = e.visit_id WHERE v.job_id = j.id
              AND e.kind IN ('finish', 'part_done') AND NOT e.is_undone
              AND e.received_at > :now::timestamptz - make_interval(secs => s.undo_seconds))
      ORDER BY j.number LIMIT 200`,
    { now },
  );
  for (const { jobId } of due) await inTransaction((tx) => issueInvoice(tx, jobId, { userId: null, at: now }));
  return due.length;
}
