import type { z } from 'zod';
import type { billFee as contract } from '@driprail/shared/contracts/billing.contract';
import { feeNames } from '@driprail/shared/contracts/billing.contract';
import { Invoice } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { authorizeBill } from './bill-access.ts';
import { isCalledOff } from './bill.presenter.ts';
import { readJobRow } from './bill.queries.ts';
import { noteIfPaid } from './note-paid.ts';
import { lockJob } from './payments.service.ts';
import { writeInvoice } from './write-invoice.ts';

type FeeFields = z.infer<(typeof contract)['body']>;

/**
 * Bills a fee for a job that was called off, and nothing else of it.
 * @throws 404, 403, 409 when an invoice stands for it, 422 when it is not called off
 */
export async function billFee(
  ctx: Ctx,
  jobId: string,
  { kind, amountCents, taxClass, note }: FeeFields,
): Promise<void> {
  await authorizeBill(ctx, 'create', jobId);
  await inTransaction(async (tx) => {
    const job = await lockJob(tx, jobId);
    const standing = await Invoice.findOne({ where: { jobId, voidedAt: null }, transaction: tx });
    if (standing) throw conflict('billed', `Invoice ${standing.number} stands for this job already.`);
    const row = await readJobRow(jobId, tx);
    if (!row) throw notFound('That job');
    if (!isCalledOff(row))
      throw unprocessable('not_called_off', `Job ${job.number} is not called off. A fee comes only after that.`);
    const line = { jobLineId: null, label: feeNames[kind], detail: note, taxClass, priceCents: amountCents };
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    await writeInvoice(tx, row, [line], { cents: 0, reason: '' }, by);
    await noteIfPaid(tx, job, by);
    hintAfterCommit(tx, ['everyone'], 'bill', jobId);
  });
}
