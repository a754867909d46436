import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { tag } from '@driprail/shared/authz/ability';
import { formatDate } from '@driprail/shared/domain/time/format';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../../authz/authorize.ts';
import { audit } from '../../../db/audit.ts';
import { PayWeek, Payday, PaydayWeek } from '../../../db/models/index.ts';
import { inTransaction, select } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { onePayday } from './paydays.queries.ts';

export interface PaydayFields {
  paysOn: string;
  note: string;
  /** First days of locked weeks. */
  weeks: string[];
}

/** @throws 422 for a week that is open or on another payday, or a date before a week's end */
export function makePayday(ctx: Ctx, fields: PaydayFields): Promise<PaydayDto> {
  return inTransaction(async (tx) => {
    const id = uuid();
    authorize(ctx.ability, 'create', tag('Payday', { id }));
    const weeks = await weeksFor(fields, null, tx);
    const { paysOn, note } = fields;
    await Payday.create({ id, paysOn, note, madeBy: ctx.actor.userId, madeAt: ctx.now() }, { transaction: tx });
    await putWeeks(id, weeks, tx);
    return told(tx, ctx, id, 'made', null);
  });
}

/** @throws 409 when it changed meanwhile or is handed over, 422 as for a new one */
export function changePayday(ctx: Ctx, id: string, fields: PaydayFields, version: number): Promise<PaydayDto> {
  return inTransaction(async (tx) => {
    const payday = await openPayday(ctx, 'update', id, version, tx);
    const before = await onePayday(id, tx);
    const weeks = await weeksFor(fields, id, tx);
    const { paysOn, note } = fields;
    await payday.update({ paysOn, note, version: version + 1 }, { transaction: tx });
    await PaydayWeek.destroy({ where: { paydayId: id }, transaction: tx });
    await putWeeks(id, weeks, tx);
    return told(tx, ctx, id, 'changed', before);
  });
}

/** @throws 409 when it changed meanwhile or is handed over */
export function removePayday(ctx: Ctx, id: string, version: number): Promise<void> {
  return inTransaction(async (tx) => {
    const payday = await openPayday(ctx, 'remove', id, version, tx);
    const before = await onePayday(id, tx);
    await PaydayWeek.destroy({ where: { paydayId: id }, transaction: tx });
    await payday.destroy({ transaction: tx });
    await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'payday', id, 'removed', { before: kept(before) });
    hintAfterCommit(tx, ['owners'], 'pay', id, version + 1);
  });
}

/** From here on the triggers refuse every change. @throws 409 when it changed meanwhile or is handed over */
export function handOverPayday(ctx: Ctx, id: string, version: number): Promise<PaydayDto> {
  return inTransaction(async (tx) => {
    const payday = await openPayday(ctx, 'update', id, version, tx);
    const before = await onePayday(id, tx);
    await payday.update(
      { handedOverAt: ctx.now(), handedOverBy: ctx.actor.userId, version: version + 1 },
      { transaction: tx },
    );
    return told(tx, ctx, id, 'handed over', before);
  });
}

/** The payday's row, held until the change is through, as long as it may still be changed. */
async function openPayday(
  ctx: Ctx,
  action: 'update' | 'remove',
  id: string,
  version: number,
  tx: Transaction,
): Promise<Payday> {
  const payday = await Payday.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!payday) throw notFound('That payday');
  authorize(ctx.ability, action, tag('Payday', { id }));
  if (payday.handedOverAt)
    throw conflict('handed_over', 'This payday is handed over and never changes.', await onePayday(id, tx));
  if (payday.version !== version)
    throw conflict('stale', 'Somebody changed this payday meanwhile. Look at it again.', await onePayday(id, tx));
  return payday;
}

interface LockedWeek {
  id: string;
  startsOn: string;
  endsOn: string;
  state: string;
}

/** The weeks that the fields name, held so that nobody puts them on another payday meanwhile. */
async function weeksFor({ paysOn, weeks }: PaydayFields, paydayId: string | null, tx: Transaction): Promise<string[]> {
  const days = [...new Set(weeks)].sort();
  const known: LockedWeek[] = await PayWeek.findAll({
    attributes: ['id', 'startsOn', 'endsOn', 'state'],
    where: { startsOn: days },
    order: [['startsOn', 'ASC']],
    lock: tx.LOCK.UPDATE,
    transaction: tx,
  });
  const open = days.find((day) => known.find((week) => week.startsOn === day)?.state !== 'locked');
  if (open)
    throw unprocessable('open_week', `Week ${weekNumberOf(open)} is not locked. Lock it first, or leave it out.`, {
      fields: { weeks: `Week ${weekNumberOf(open)} is not locked. Lock it first, or leave it out.` },
    });
  const [taken] = await select<{ startsOn: string; paysOn: string }>(
    `SELECT w.starts_on AS "startsOn", p.pays_on AS "paysOn" FROM payday_weeks pw JOIN paydays p ON p.id = pw.payday_id
       JOIN pay_weeks w ON w.id = pw.pay_week_id
      WHERE pw.pay_week_id IN (:ids) AND (:paydayId::uuid IS NULL OR p.id <> :paydayId::uuid) ORDER BY w.starts_on LIMIT 1`,
    { ids: known.map((week) => week.id), paydayId },
    tx,
  );
  if (taken) {
    const sentence = `Week ${weekNumberOf(taken.startsOn)} is on the payday of ${formatDate(taken.paysOn)} already. A week is handed over once.`;
    throw unprocessable('taken_week', sentence, { fields: { weeks: sentence } });
  }
  const last = known.at(-1);
  if (last && paysOn < last.endsOn) {
    const sentence = `The payday can’t be before ${formatDate(last.endsOn)}, when week ${weekNumberOf(last.startsOn)} ends.`;
    throw unprocessable('early', sentence, { fields: { paysOn: sentence } });
  }
  return known.map((week) => week.id);
}

async function putWeeks(paydayId: string, weekIds: string[], tx: Transaction): Promise<void> {
  await PaydayWeek.bulkCreate(
    weekIds.map((payWeekId) => ({ paydayId, payWeekId })),
    { transaction: tx },
  );
}

/** Writes the audit line, before and after, and sends the hint. */
async function told(
  tx: Transaction,
  { actor, now }: Ctx,
  id: string,
  action: string,
  before: PaydayDto | null,
): Promise<PaydayDto> {
  const after = await onePayday(id, tx);
  const details = { before: before && kept(before), after: kept(after) };
  await audit(tx, { userId: actor.userId, at: now() }, 'payday', id, action, details);
  hintAfterCommit(tx, ['owners'], 'pay', id, after.version);
  return after;
}

function kept({ paysOn, note, weeks, handedOverAt }: PaydayDto) {
  return { paysOn, note, weeks: weeks.map((week) => week.startsOn), handedOverAt };
}
