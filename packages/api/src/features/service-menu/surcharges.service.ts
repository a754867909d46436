import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { DatedSurcharge, Surcharges } from '@driprail/shared/domain/menu/condition-surcharge';
import { surchargesOn } from '@driprail/shared/domain/menu/condition-surcharge';
import { audit } from '../../db/audit.ts';
import { ConditionSurcharge } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** What a dirtier car costs and takes on top on a day. */
export async function surchargesOfDay(day: string, tx?: Transaction): Promise<Surcharges> {
  const rows = await ConditionSurcharge.findAll({ transaction: tx ?? null });
  return surchargesOn(rows, day);
}

/** A surcharge from a day on. @throws 422 when that day has one already */
export function setSurcharge({ actor, now }: Ctx, fields: DatedSurcharge): Promise<void> {
  return inTransaction(async (tx) => {
    const { condition, startsOn } = fields;
    const message = 'This condition has a surcharge from that day on already. Choose another day.';
    if ((await ConditionSurcharge.count({ where: { condition, startsOn }, transaction: tx })) > 0)
      throw unprocessable('same_day', message, { fields: { startsOn: message } });
    const id = uuid();
    await ConditionSurcharge.create({ id, ...fields, setBy: actor.userId, setAt: now() }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'condition_surcharge', id, 'set', { ...fields });
    hintAfterCommit(tx, ['everyone'], 'service', id);
  });
}
