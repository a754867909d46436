import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type {
  creditBill as creditContract,
  refundPayment as contract,
} from '@driprail/shared/contracts/billing.contract';
import { tag } from '@driprail/shared/authz/ability';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { CashCountPayment, Payment, Refund } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { takeOnce } from '../../http/once.ts';
import { PaymentError } from '../../integrations/payments/index.ts';
import type { Payments } from '../../integrations/payments/index.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { queueMessage } from '../messages/index.ts';
import { readBill } from './bill.presenter.ts';
import { creditLines } from './credit-notes.service.ts';
import { noteIfPaid } from './note-paid.ts';
import { lockJob } from './payments.service.ts';
import { refundRow } from './refund-rows.ts';

type RefundFields = z.infer<(typeof contract)['body']>;
type CreditFields = z.infer<(typeof creditContract)['body']>;

/**
 * Gives money of one payment back: with a credit note for what was billed, or what was paid too much. Tips stay with the crew.
 * A card refund is asked for in the transaction and made after it, until the service has answered.
 * @throws 404, 403, 422 at the amount
 */
export async function refundPayment(
  payments: Payments,
  ctx: Ctx,
  paymentId: string,
  fields: RefundFields,
): Promise<BillDto> {
  const found = await Payment.findByPk(paymentId);
  if (!found) throw notFound('That payment');
  authorizeRefund(ctx, found.jobId);
  await takeOnce(ctx, fields.key, { paymentId, ...fields }, async (tx) => {
    const job = await lockJob(tx, found.jobId);
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    if (fields.kind === 'mistake') await refuseNoMistake(tx, found, fields);
    const creditNoteId =
      fields.kind === 'refund' && fields.lines.length > 0
        ? await creditLines(tx, job, fields.lines, { reasonId: fields.reasonId, note: fields.note }, ctx)
        : null;
    if (fields.kind === 'refund') await refuseMoreThanOver(tx, ctx, job.id, fields.amountCents);
    const row = refundRow(found, fields.amountCents, {
      ...{ kind: fields.kind, note: fields.note, creditNoteId, madeAt: by.at, madeBy: by.userId },
      state: found.method === 'card' ? 'asked' : 'done',
    });
    await Refund.create(row, { transaction: tx });
    if (fields.kind === 'refund')
      await queueMessage(tx, by.at, {
        ...{
          kind: 'refund',
          jobId: job.id,
          causeId: row.id,
          eventKey: `refund:${row.id}`,
          amountCents: fields.amountCents,
        },
      });
    await audit(tx, by, 'refund', row.id, fields.kind, { jobNumber: job.number, amountCents: fields.amountCents });
    hintAfterCommit(tx, ['everyone'], 'bill', job.id);
    return { answer: { ok: true } };
  });
  await settleAskedRefunds(payments);
  return readBill(found.jobId, ctx.now());
}

/**
 * Credits lines of an invoice and moves no money: it lowers what is owed, once per key.
 * @throws 404, 403, 422 at the lines
 */
export async function creditBill(ctx: Ctx, jobId: string, fields: CreditFields): Promise<BillDto> {
  authorizeRefund(ctx, jobId);
  await takeOnce(ctx, fields.key, { jobId, ...fields }, async (tx) => {
    const job = await lockJob(tx, jobId);
    await creditLines(tx, job, fields.lines, { reasonId: fields.reasonId, note: fields.note }, ctx);
    // Where nothing is owed any more it counts as paid.
    await noteIfPaid(tx, job, { userId: ctx.actor.userId, at: ctx.now() });
    hintAfterCommit(tx, ['everyone'], 'bill', job.id);
    return { answer: { ok: true } };
  });
  return readBill(jobId, ctx.now());
}

function authorizeRefund(ctx: Ctx, jobId: string): void {
  authorize(ctx.ability, 'refund', tag('Bill', { id: jobId, crewPersonIds: [], day: null, daysFromToday: null }));
}

/** A payment that never was is taken back whole; money that was counted or came by card was there. */
async function refuseNoMistake(tx: Transaction, payment: Payment, { amountCents }: RefundFields): Promise<void> {
  const isCounted = (await CashCountPayment.count({ where: { paymentId: payment.id }, transaction: tx })) > 0;
  const message =
    payment.method === 'card'
      ? 'The card payment was really made. Give it back instead.'
      : isCounted
        ? 'This cash was counted already. Give it back instead.'
        : amountCents !== payment.amountCents
          ? `A payment recorded by mistake is taken back whole: ${centsText(payment.amountCents)}.`
          : null;
  if (message) throw unprocessable('no_mistake', message, { fields: { amountCents: message } });
}

async function refuseMoreThanOver(tx: Transaction, ctx: Ctx, jobId: string, amountCents: number): Promise<void> {
  const over = Math.max(0, -(await readBill(jobId, ctx.now(), tx)).owedCents);
  if (amountCents <= over) return;
  const message =
    over === 0
      ? 'Nothing was paid too much. Choose the lines to credit first.'
      : `With these lines credited, ${centsText(over)} was paid too much. Give back at most that.`;
  throw unprocessable('more_than_over', message, { fields: { amountCents: message } });
}

/** Makes the card refunds that wait; what the service refuses rests with its reason, what it did not answer waits on. */
export async function settleAskedRefunds(payments: Payments): Promise<void> {
  const asked = await Refund.findAll({
    where: { state: 'asked', providerRef: null },
    order: [['madeAt', 'ASC']],
    limit: 50,
  });
  for (const refund of asked) {
    const payment = await Payment.findByPk(refund.paymentId, { rejectOnEmpty: true });
    try {
      const { refundRef } = await payments.refund({
        ...{ paymentRef: payment.providerRef ?? '', amountCents: refund.amountCents, key: refund.id },
      });
      // Its event may have been faster.
      await Refund.update({ state: 'done', providerRef: refundRef }, { where: { id: refund.id, state: 'asked' } });
    } catch (error) {
      if (!(error instanceof PaymentError)) throw error;
      if (error.reason === 'unreachable') continue;
      await Refund.update({ state: 'failed', fault: error.message }, { where: { id: refund.id, state: 'asked' } });
    }
  }
}
