import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import type { AdjustmentKind } from '@driprail/shared/domain/pay/pay-week.types';
import { audit } from '../../db/audit.ts';
import { PayAdjustment, PayLineRow, PayWeek, Person } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { countedAmount, refuseRefund } from './adjustment-terms.ts';
import type { CountedFields } from './adjustment-terms.ts';
import { readPayWeek } from './pay-week.queries.ts';
import { weekOf } from './weeks.service.ts';

export interface AdjustmentFields {
  personId: string;
  kind: AdjustmentKind;
  /** Null where it is counted. */
  amountCents: number | null;
  reason: string;
  correctsLineId: string | null;
  counted: CountedFields | null;
  refundReasonId: string | null;
}

/** Adds an amount with its reason to an open week; what was checked must be checked again. */
export function addAdjustment({ actor, now }: Ctx, day: string, fields: AdjustmentFields): Promise<PayWeekDto> {
  return inTransaction(async (tx) => {
    const found = await weekOf(day, tx);
    const week = await PayWeek.findByPk(found.id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    refuseLocked(week);
    if (!(await Person.findByPk(fields.personId, { transaction: tx }))) throw notFound('That person');
    if (fields.correctsLineId) await refuseForeignLine(fields, week.id, tx);
    if (fields.refundReasonId) await refuseRefund(fields.personId, fields.refundReasonId, week.startsOn, tx);
    const amount = fields.counted
      ? await countedAmount(fields.personId, fields.counted, tx)
      : { amountCents: fields.amountCents ?? 0, counted: null };
    const row = await PayAdjustment.create(
      { id: uuid(), payWeekId: week.id, ...fields, ...amount, userId: actor.userId, at: now() },
      { transaction: tx },
    );
    await backToDraft(week, tx);
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_adjustment', row.id, 'added', {
      ...fields,
      ...amount,
      week: week.startsOn,
    });
    hintAfterCommit(tx, ['owners'], 'pay', week.id, week.version);
    return readPayWeek(week, now(), tx);
  });
}

export function removeAdjustment({ actor, now }: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    const row = await PayAdjustment.findByPk(id, { transaction: tx });
    if (!row) throw notFound('That adjustment');
    const week = await PayWeek.findByPk(row.payWeekId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    refuseLocked(week);
    await row.destroy({ transaction: tx });
    await backToDraft(week, tx);
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_adjustment', id, 'removed', {
      amountCents: row.amountCents,
      reason: row.reason,
    });
    hintAfterCommit(tx, ['owners'], 'pay', week.id, week.version);
  });
}

/** What was checked must be checked again. */
export async function backToDraft(week: PayWeek, tx: Transaction): Promise<void> {
  const version = week.version + 1;
  await week.update({ state: 'draft', checkedAt: null, checkedBy: null, version }, { transaction: tx });
}

/** @throws 422 */
export function refuseLocked(week: PayWeek): void {
  if (week.state === 'locked')
    throw unprocessable('locked_week', 'A locked week never changes. Add a correction to an open week.');
}

async function refuseForeignLine(
  { correctsLineId, personId }: AdjustmentFields,
  weekId: string,
  tx: Transaction,
): Promise<void> {
  const line = await PayLineRow.findByPk(correctsLineId ?? '', { transaction: tx });
  if (line?.personId === personId && line.payWeekId !== weekId) return;
  const message = 'Choose a line of this person in a locked week.';
  throw unprocessable('foreign_line', message, { fields: { correctsLineId: message } });
}
