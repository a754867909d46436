import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import { CardAttempt, Job, Payment, Refund } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import { conflict } from '../../http/errors.ts';
import { PaymentError } from '../../integrations/payments/index.ts';
import type { PaymentEvent, Payments } from '../../integrations/payments/index.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { keepTip } from '../booking/index.ts';
import { billIfOver, keepPayment, lockJob } from './payments.service.ts';
import { refundRow } from './refund-rows.ts';

type Paid = Extract<PaymentEvent, { kind: 'paid' }>;
type Expired = Pick<Extract<PaymentEvent, { kind: 'failed' | 'expired' }>, 'attemptId'>;
type Refunded = Extract<PaymentEvent, { kind: 'refunded' }>;
type Disputed = Extract<PaymentEvent, { kind: 'dispute_opened' | 'dispute_won' | 'dispute_lost' }>;

/**
 * Takes what the payments service tells, each event once, in whatever order it comes.
 * @throws 409 for what can't be placed yet; the service tells it again later
 */
export async function takeEvent(event: PaymentEvent, now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    const [isNew] = await select(
      `INSERT INTO payment_events (id, kind, happened_at, received_at) VALUES (:id, :kind, :at, :now)
       ON CONFLICT (id) DO NOTHING RETURNING id`,
      { id: event.id, kind: event.kind, at: event.at, now },
      tx,
    );
    if (isNew) await apply(tx, event, now);
  });
}

async function apply(tx: Transaction, event: PaymentEvent, now: Date): Promise<void> {
  switch (event.kind) {
    case 'paid':
      return takePaid(tx, event, now);
    case 'expired':
      return takeExpired(tx, event, now);
    case 'refunded':
      return takeRefunded(tx, event, now);
    case 'dispute_opened':
    case 'dispute_won':
    case 'dispute_lost':
      return takeDispute(tx, event, now);
    // A refused card leaves the page open for another try.
    case 'failed':
    case 'other':
      return;
  }
}

/** Money that came is always recorded, also on a page that was ended, or after the job was called off. */
async function takePaid(tx: Transaction, event: Paid, now: Date): Promise<void> {
  const asked = await CardAttempt.findByPk(event.attemptId, { transaction: tx });
  if (!asked) throw conflict('unknown_attempt', 'That payment was not asked for here.');
  const job = await lockJob(tx, asked.jobId);
  const attempt = await CardAttempt.findByPk(asked.id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
  const isKnown =
    (await Payment.count({
      where: { [Op.or]: [{ attemptId: attempt.id }, { providerRef: event.paymentRef }] },
      transaction: tx,
    })) > 0;
  if (isKnown) return;
  await attempt.update({ state: 'paid', settledAt: now }, { transaction: tx });
  const by = { userId: null, at: now };
  await billIfOver(tx, job.id, by);
  const paymentId = await keepPayment(tx, job, {
    ...{
      method: 'card',
      amountCents: event.amountCents - attempt.tipCents,
      reference: '',
      userId: null,
      personId: null,
    },
    ...{ receivedAt: earlier(event.at, now), recordedAt: now, attemptId: attempt.id, providerRef: event.paymentRef },
  });
  if (attempt.tipCents > 0)
    await keepTip(tx, by, job, {
      ...{ amountCents: attempt.tipCents, method: 'card', alreadyReceived: false, forPersonId: null, paymentId },
    });
}

async function takeExpired(tx: Transaction, event: Expired, now: Date): Promise<void> {
  await CardAttempt.update(
    { state: 'expired', settledAt: now },
    { where: { id: event.attemptId, state: 'open' }, transaction: tx },
  );
}

async function takeRefunded(tx: Transaction, event: Refunded, now: Date): Promise<void> {
  const payment = await paymentOf(tx, event.paymentRef);
  if (await Refund.count({ where: { providerRef: event.refundRef }, transaction: tx })) return;
  const asked = await Refund.findOne({
    where: { paymentId: payment.id, amountCents: event.amountCents, state: 'asked', providerRef: null },
    order: [['madeAt', 'ASC']],
    transaction: tx,
  });
  if (asked) await asked.update({ state: 'done', providerRef: event.refundRef }, { transaction: tx });
  else
    await Refund.create(
      refundRow(payment, event.amountCents, {
        ...{
          kind: 'refund',
          state: 'done',
          madeAt: earlier(event.at, now),
          madeBy: null,
          providerRef: event.refundRef,
        },
        note: 'Given back at the payments service',
      }),
      { transaction: tx },
    );
  hintAfterCommit(tx, ['everyone'], 'bill', payment.jobId);
}

/** Disputed money is held by the service from the start; when the dispute is won it is back. */
async function takeDispute(tx: Transaction, event: Disputed, now: Date): Promise<void> {
  const payment = await paymentOf(tx, event.paymentRef);
  const known = await Refund.findOne({ where: { providerRef: event.disputeRef }, transaction: tx });
  const state = event.kind === 'dispute_won' ? 'failed' : 'done';
  const fault = event.kind === 'dispute_won' ? 'The dispute was won.' : '';
  if (!known)
    await Refund.create(
      refundRow(payment, Math.min(event.amountCents, payment.amountCents), {
        ...{
          kind: 'dispute',
          state,
          fault,
          madeAt: earlier(event.at, now),
          madeBy: null,
          providerRef: event.disputeRef,
        },
        note: 'Disputed by the card’s holder',
      }),
      { transaction: tx },
    );
  else if (event.kind !== 'dispute_opened') await known.update({ state, fault }, { transaction: tx });
  hintAfterCommit(tx, ['everyone'], 'bill', payment.jobId);
}

/** The service's clock may run ahead of ours. */
function earlier(at: Date, now: Date): Date {
  return at < now ? at : now;
}

async function paymentOf(tx: Transaction, providerRef: string): Promise<Payment> {
  const payment = await Payment.findOne({ where: { providerRef }, transaction: tx });
  if (!payment) throw conflict('unknown_payment', 'That payment is not known here yet.');
  await Job.findByPk(payment.jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
  return payment;
}

/** Asks after pages whose event may have got lost; of one job, or of all that have been open for a while. */
export async function lookUpOpenPages(payments: Payments, now: Date, jobId: string | null = null): Promise<void> {
  const open = await CardAttempt.findAll({
    where: {
      ...{ state: 'open', providerRef: { [Op.ne]: null } },
      ...(jobId ? { jobId } : { createdAt: { [Op.lt]: new Date(now.getTime() - 120_000) } }),
    },
    order: [['createdAt', 'ASC']],
    limit: 50,
  });
  for (const attempt of open) {
    try {
      await lookUpPage(payments, attempt, now);
    } catch (error) {
      // One that can't be looked up must not keep the others waiting; it is asked after again.
      if (!(error instanceof PaymentError)) throw error;
    }
  }
}

/**
 * Asks what became of one page and takes it like the event that would have told it. A page that the service does not
 * know takes no money: it has expired.
 * @throws PaymentError when the service does not answer
 */
export async function lookUpPage(
  payments: Payments,
  { id, providerRef, amountCents, tipCents }: CardAttempt,
  now: Date,
): Promise<PageState['state']> {
  const ref = providerRef ?? '';
  const found = await payments.lookUp(ref).catch(asExpired);
  const base = { id: `looked-up:${ref}:${found.state}`, at: now, ref, attemptId: id };
  if (found.state === 'paid' && found.paymentRef)
    await takeEvent({ ...base, kind: 'paid', paymentRef: found.paymentRef, amountCents: amountCents + tipCents }, now);
  else if (found.state === 'expired') await takeEvent({ ...base, kind: 'expired' }, now);
  return found.state;
}

type PageState = Awaited<ReturnType<Payments['lookUp']>>;

function asExpired(error: unknown): PageState {
  if (error instanceof PaymentError && error.reason === 'unknown') return { state: 'expired', paymentRef: null };
  throw error;
}
