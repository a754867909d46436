import { v7 as uuid } from 'uuid';
import { exact, fractionText } from '@driprail/shared/domain/money/exact';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { audit } from '../../../db/audit.ts';
import { Person, TimeOffAdjustment } from '../../../db/models/index.ts';
import { inTransaction } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { notFound } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { refuseLockedDay } from '../start-dates.ts';
import { balancesOf } from './balances.queries.ts';
import type { PersonBalances } from './balances.queries.ts';

export interface AdjustFields {
  personId: string;
  kind: TimeOffKind;
  on: string;
  /** Signed decimal hours. */
  hours: string;
  reason: string;
}

/** Adds an opening balance or a correction to a person's ledger; it stays there. @throws 404, 422 in a locked week */
export function adjustTimeOff({ actor, now }: Ctx, fields: AdjustFields): Promise<PersonBalances> {
  return inTransaction(async (tx) => {
    const { personId, kind, on, reason } = fields;
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    await refuseLockedDay(on, tx, 'on');
    const hours = fractionText(exact(fields.hours));
    const row = await TimeOffAdjustment.create(
      { id: uuid(), personId, kind, onDate: on, hours, reason, userId: actor.userId, at: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'time_off_adjustment', row.id, 'added', {
      ...{ personId, kind, on, hours, reason },
    });
    hintAfterCommit(tx, ['owners', { personIds: [personId] }], 'pay', row.id);
    return balancesOf(personId, now(), tx);
  });
}
