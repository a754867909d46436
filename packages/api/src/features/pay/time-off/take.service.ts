import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { timeOffKindNames } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { audit } from '../../../db/audit.ts';
import { PayAdjustment, PayWeek } from '../../../db/models/index.ts';
import { inTransaction } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { unprocessable } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { backToDraft, refuseLocked } from '../adjustments.service.ts';
import { readPayWeek } from '../pay-week.queries.ts';
import { weekOf } from '../weeks.service.ts';
import { quoteOf } from './quote.queries.ts';
import type { Quote, TakingFields } from './quote.queries.ts';

export interface Taking extends TakingFields {
  reason: string;
  accept: { code: string; reason: string }[];
}

/**
 * Pays hours off in an open week: an adjustment with its hours, day, rate and rule. Takings of a person queue at the
 * week's row, so two at once can't both have the last hours.
 * @throws 404, 422 in a locked week, outside the week, without a rule or a rate, or for a warning without a reason
 */
export function takeTimeOff({ actor, now }: Ctx, day: string, taking: Taking): Promise<PayWeekDto> {
  return inTransaction(async (tx) => {
    const found = await weekOf(day, tx);
    const week = await PayWeek.findByPk(found.id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    refuseLocked(week);
    await queueTakings(tx, taking.personId);
    const quote = await quoteOf(week, taking, tx);
    refuseUnreasoned(quote, taking);
    const { personId, kind, on, reason } = taking;
    const accepted = taking.accept.filter(({ code }) => quote.warnings.some((warning) => warning.code === code));
    const row = await PayAdjustment.create(
      {
        ...{ id: uuid(), payWeekId: week.id, personId, kind: 'paid_time_off', amountCents: quote.amountCents },
        ...{ reason: reason || timeOffKindNames[kind], correctsLineId: null, userId: actor.userId, at: now() },
        ...{ timeOffKind: kind, timeOffHours: quote.hours, timeOffOn: on, timeOffRate: quote.rate },
        timeOffBasis: { ruleId: quote.ruleId, ruleWords: quote.ruleWords, rateWords: quote.rateWords, accepted },
      },
      { transaction: tx },
    );
    await backToDraft(week, tx);
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_adjustment', row.id, 'hours off taken', {
      ...{ personId, kind, on, hours: quote.hours, rate: quote.rate, amountCents: quote.amountCents },
      ...{ ruleId: quote.ruleId, week: week.startsOn, accepted },
    });
    hintAfterCommit(tx, ['owners', { personIds: [personId] }], 'pay', week.id, week.version);
    return readPayWeek(week, now(), tx);
  });
}

/** One taking of a person after the other, in whatever weeks. */
async function queueTakings(tx: Transaction, personId: string): Promise<void> {
  await PayAdjustment.sequelize?.query('SELECT pg_advisory_xact_lock(hashtext(:key))', {
    replacements: { key: `time off ${personId}` },
    transaction: tx,
  });
}

function refuseUnreasoned({ warnings }: Quote, { accept }: Taking): void {
  const [open] = warnings.filter(({ code }) => !accept.some((one) => one.code === code));
  if (!open) return;
  const reason = 'Give a reason to go on.';
  throw unprocessable('needs_reason', `${open.message} ${reason}`, { fields: { accept: reason, [open.code]: reason } });
}
