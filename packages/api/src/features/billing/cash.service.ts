import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import { tag } from '@driprail/shared/authz/ability';
import type { CashHolderDto, countCash as contract } from '@driprail/shared/contracts/cash.contract';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { CashCount, CashCountPayment, Person } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import type { AppError } from '../../http/errors.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { readHolders } from './cash.queries.ts';

type CountFields = z.infer<(typeof contract)['body']>;

/**
 * Notes what a person handed in, once per key. Over and short are noted with a reason and touch no one's pay.
 * @throws 404, 403, 409 when that cash was counted or more came in meanwhile, 422 at the note
 */
export async function countCash(ctx: Ctx, fields: CountFields): Promise<void> {
  const { personId, countedCents, note } = fields;
  authorize(ctx.ability, 'create', tag('Cash', { personId }));
  await takeOnce(ctx, fields.key, fields, async (tx) => {
    // Whoever counts second waits here, and then finds nothing left.
    const person = await Person.findByPk(personId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!person) throw notFound('That person');
    const [held] = await readHolders(personId, tx);
    if (!held || !isSame(held, fields.paymentIds)) throw changed(person.name, held);
    if (countedCents !== held.cents && note === '') throw unexplained(countedCents - held.cents);
    const id = uuid();
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    const sums = { expectedCents: held.cents, countedCents };
    await CashCount.create(
      { id, personId, ...sums, note, countedAt: by.at, countedBy: by.userId },
      { transaction: tx },
    );
    await CashCountPayment.bulkCreate(
      held.payments.map((payment) => ({ paymentId: payment.id, cashCountId: id })),
      { transaction: tx },
    );
    await audit(tx, by, 'cash_count', id, 'counted', { personId, ...sums, note });
    hintAfterCommit(tx, ['desk'], 'bill', id);
    return { answer: { ok: true } };
  });
}

function isSame({ payments }: CashHolderDto, seen: readonly string[]): boolean {
  const ids = new Set(seen);
  return payments.length === ids.size && payments.every((payment) => ids.has(payment.id));
}

function changed(name: string, held: CashHolderDto | undefined): AppError {
  return conflict(
    'cash_changed',
    held
      ? `What ${name} holds has changed meanwhile, to ${centsText(held.cents)}. Look at it and count again.`
      : `The cash of ${name} was counted just now. Look at the counts below.`,
  );
}

function unexplained(over: number): AppError {
  const message = `Say what explains that it is ${centsText(Math.abs(over))} ${over > 0 ? 'over' : 'short'}.`;
  return unprocessable('unexplained', message, { fields: { note: message } });
}
