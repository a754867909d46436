import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { StatementTimeOff } from '@driprail/shared/domain/pay/time-off/statement-time-off';
import { inTransaction } from '../../../db/sequelize.ts';
import { readFrozen } from '../frozen.queries.ts';
import { payInputOf } from '../pay-input.queries.ts';
import { weekAt } from '../weeks.service.ts';
import { statementTimeOffOf } from './statement-time-off.queries.ts';

/** One person's balances in a week: as they were locked, or as they would be if it were locked now. */
export function readWeekTimeOff(day: string, personId: string, now: Date): Promise<StatementTimeOff[]> {
  return inTransaction(async (tx) => {
    const week = await weekAt(day, tx);
    if (week.state === 'locked') return (await readFrozen(week.id, personId, tx)).timeOff[personId] ?? [];
    const input = await payInputOf(week, now, tx);
    const own = { ...input, people: input.people.filter((person) => person.id === personId) };
    return (await statementTimeOffOf(week, computePayWeek(own).people, tx))[personId] ?? [];
  });
}
