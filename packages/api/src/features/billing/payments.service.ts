import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { BillDto, PaymentMethod } from '@driprail/shared/contracts/bill.dto';
import type { recordPayment as contract } from '@driprail/shared/contracts/billing.contract';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { stamp } from '@driprail/shared/domain/time/device';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { minutesBetween } from '@driprail/shared/domain/time/zone';
import { audit } from '../../db/audit.ts';
import { Job, Payment } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { keepTip } from '../booking/index.ts';
import { queueMessage } from '../messages/index.ts';
import { authorizeBill } from './bill-access.ts';
import { isOver, readBill } from './bill.presenter.ts';
import { readJobRow } from './bill.queries.ts';
import { issueInvoice } from './issue-invoice.service.ts';
import { noteIfPaid } from './note-paid.ts';
import type { By } from './note-paid.ts';

/** Cash that was taken this long before it arrived here was taken without signal: it is recorded, whatever was owed. */
const WAITED_MINUTES = 2;

type PaymentFields = z.infer<(typeof contract)['body']>;

/**
 * Records what a customer handed over, once per key; billed first where the work is done.
 * @throws 404, 403, 422 at the amount when more is paid than is owed
 */
export async function recordPayment(ctx: Ctx, jobId: string, fields: PaymentFields): Promise<BillDto> {
  if (fields.tipIsKept && fields.method !== 'cash')
    throw unprocessable('not_cash', 'Only cash can be kept on the spot.', {
      fields: { tipIsKept: 'Only cash can be kept on the spot.' },
    });
  await takeOnce(ctx, fields.key, { jobId, ...fields }, async (tx) => {
    const times = stamp(fields.deviceAt, fields.offsetMs, ctx.now());
    await authorizeBill(ctx, 'collect', jobId, { tx, madeAt: times.occurredAt });
    const job = await lockJob(tx, jobId);
    await billIfOver(tx, jobId, { userId: ctx.actor.userId, at: ctx.now() });
    await refuseMoreThanOwed(tx, ctx, jobId, fields.amountCents, times);
    const paymentId = await keepPayment(tx, job, {
      ...{ method: fields.method, amountCents: fields.amountCents, reference: fields.reference },
      ...{ receivedAt: new Date(times.occurredAt), recordedAt: ctx.now() },
      ...{ userId: ctx.actor.userId, personId: ctx.actor.personId, attemptId: null, providerRef: null },
    });
    if (fields.tipCents > 0)
      await keepTip(tx, { userId: ctx.actor.userId, at: ctx.now() }, job, {
        ...{ amountCents: fields.tipCents, method: fields.method === 'cash' ? 'cash' : 'invoice', forPersonId: null },
        ...{ alreadyReceived: fields.tipIsKept, paymentId },
      });
    return { answer: { ok: true } };
  });
  return readBill(jobId, ctx.now());
}

export async function lockJob(tx: Transaction, jobId: string): Promise<Job> {
  const job = await Job.findByPk(jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!job) throw notFound('That job');
  return job;
}

/** Whoever pays for work that is done pays a bill with a number. */
export async function billIfOver(tx: Transaction, jobId: string, by: By): Promise<void> {
  const row = await readJobRow(jobId, tx);
  if (row && isOver(row)) await issueInvoice(tx, jobId, by);
}

async function refuseMoreThanOwed(
  tx: Transaction,
  ctx: Ctx,
  jobId: string,
  amountCents: number,
  { occurredAt, receivedAt }: StampedTimes,
): Promise<void> {
  if (minutesBetween(occurredAt, receivedAt) >= WAITED_MINUTES) return;
  const bill = await readBill(jobId, ctx.now(), tx);
  if (amountCents <= bill.owedCents) return;
  const message =
    bill.owedCents <= 0
      ? `Nothing is owed on job ${bill.jobNumber}. What the customer gives on top is a tip.`
      : `Only ${centsText(bill.owedCents)} is owed. Give change, or record the rest as a tip.`;
  throw unprocessable('more_than_owed', message, { fields: { amountCents: message } });
}

export interface PaymentRecord {
  method: PaymentMethod;
  amountCents: number;
  reference: string;
  receivedAt: Date;
  recordedAt: Date;
  /** Null for the customer's own card payment. */
  userId: string | null;
  personId: string | null;
  attemptId: string | null;
  providerRef: string | null;
}

/** A payment as a row; when nothing is owed on the invoice any more, the job counts as paid. @returns its id */
export async function keepPayment(
  tx: Transaction,
  job: Pick<Job, 'id' | 'number'>,
  { userId, ...fields }: PaymentRecord,
): Promise<string> {
  const id = uuid();
  await Payment.create({ id, jobId: job.id, ...fields, recordedBy: userId }, { transaction: tx });
  const by = { userId, at: fields.recordedAt };
  await audit(tx, by, 'payment', id, 'received', {
    ...{ jobNumber: job.number, method: fields.method, amountCents: fields.amountCents },
  });
  await noteIfPaid(tx, job, by);
  await queueMessage(tx, fields.recordedAt, {
    ...{ kind: 'receipt', jobId: job.id, causeId: id, eventKey: `payment:${id}`, amountCents: fields.amountCents },
  });
  hintAfterCommit(tx, ['everyone'], 'bill', job.id);
  return id;
}
