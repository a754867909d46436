import { v7 as uuid } from 'uuid';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import { CardAttempt } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { AppError, conflict, unprocessable } from '../../http/errors.ts';
import { PaymentError } from '../../integrations/payments/index.ts';
import type { Payments } from '../../integrations/payments/index.ts';
import { readBill } from './bill.presenter.ts';
import type { By } from './note-paid.ts';
import { lookUpPage } from './payment-events.service.ts';
import { billIfOver, lockJob } from './payments.service.ts';

export interface CardAsk {
  jobId: string;
  /** What is asked beforehand, or all that is owed. */
  part: 'deposit' | 'all';
  /** For the crew, on top of what is owed. */
  tipCents: number;
  /** Where the customer comes back to. */
  returnUrl: string;
}

/** A service's link lives a day; a younger one is handed out again. */
const LINK_LIVES_MS = 20 * 3_600_000;

/**
 * The payments service's own page for what is owed now and a tip. Asked twice it is the same page; with another tip the
 * page before stops taking money first, so that nobody pays twice from two tabs.
 * @throws 404, 409 when the page before has just been paid, 422 when nothing is owed or the service refuses, 503 when it
 * can't be reached
 */
export async function openCardPage(payments: Payments, ask: CardAsk, by: By): Promise<{ url: string }> {
  const { attempt, outdated, label } = await beginAttempt(ask, by);
  for (const other of outdated) await endAttempt(payments, other, by.at);
  if (attempt.url) {
    // The page may be gone meanwhile.
    const state = await lookUpPage(payments, attempt, by.at).catch(asRefusal);
    if (state === 'paid') throw beingPaid();
    return state === 'open' ? { url: attempt.url } : openCardPage(payments, ask, by);
  }
  const link = await payments
    .createLink({
      ...{ attemptId: attempt.id, amountCents: attempt.amountCents + attempt.tipCents, currency: 'usd' },
      ...{ label, returnUrl: ask.returnUrl },
    })
    .catch(asRefusal);
  await attempt.update({ providerRef: link.ref, url: link.url });
  return { url: link.url };
}

function beginAttempt({ jobId, part, tipCents }: CardAsk, by: By) {
  return inTransaction(async (tx) => {
    const job = await lockJob(tx, jobId);
    await billIfOver(tx, jobId, by);
    const bill = await readBill(jobId, by.at, tx);
    const amountCents = part === 'deposit' ? bill.depositCents : bill.owedCents;
    if (amountCents <= 0) throw unprocessable('nothing_owed', `Nothing is owed on job ${job.number} any more.`);
    const open = await CardAttempt.findAll({ where: { jobId, state: 'open' }, transaction: tx });
    const isSame = (one: CardAttempt) =>
      one.amountCents === amountCents &&
      one.tipCents === tipCents &&
      by.at.getTime() - one.createdAt.getTime() < LINK_LIVES_MS;
    const same = open.find(isSame);
    const attempt =
      same ??
      (await CardAttempt.create(
        { id: uuid(), jobId, amountCents, tipCents, createdAt: by.at, createdBy: by.userId },
        { transaction: tx },
      ));
    if (!same) await audit(tx, by, 'card_attempt', attempt.id, 'opened', { jobNumber: job.number, tipCents });
    const what = bill.invoice
      ? `Invoice ${bill.invoice.number}`
      : `${part === 'deposit' ? 'Deposit for job' : 'Job'} ${job.number}`;
    return {
      ...{ attempt, outdated: open.filter((one) => one !== same) },
      label: `${what}, ${(await companyOf(tx)).name}`,
    };
  });
}

/** @throws 409 when it was paid before it could be ended */
async function endAttempt(payments: Payments, attempt: CardAttempt, at: Date): Promise<void> {
  try {
    if (attempt.providerRef) await payments.expireLink(attempt.providerRef);
  } catch (error) {
    const reason = error instanceof PaymentError ? error.reason : null;
    if (reason === 'paid') throw beingPaid();
    // A page that the service does not know takes no money.
    if (reason !== 'unknown') asRefusal(error);
  }
  await attempt.update({ state: 'expired', settledAt: at });
}

const beingPaid = () => conflict('being_paid', 'A card payment has just been made. Wait a moment and look again.');

function asRefusal(error: unknown): never {
  if (!(error instanceof PaymentError)) throw error;
  if (error.reason === 'unreachable')
    throw new AppError(
      503,
      'cards_unreachable',
      'The card page can’t be reached just now and nothing was taken. Try again in a minute.',
    );
  throw unprocessable('card_refused', error.message);
}
