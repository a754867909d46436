import { tag } from '@driprail/shared/authz/ability';
import type { StatementDto } from '@driprail/shared/contracts/pay.contract';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../authz/authorize.ts';
import { companyOf } from '../../db/company.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';
import { customersOf } from './customers.queries.ts';
import { correctedLinesOf } from './corrections.queries.ts';
import { readFrozen } from './frozen.queries.ts';
import { readPayWeek } from './pay-week.queries.ts';
import { statementTimeOffOf } from './time-off/statement-time-off.queries.ts';
import { yearsToDate } from './year-to-date.queries.ts';
import { headOf, weekAt } from './weeks.service.ts';

interface StatementHead {
  weekId: string;
  startsOn: string;
  endsOn: string;
  lockedAt: string;
  grossCents: number;
}

/** One's own statements of locked weeks, newest first. */
export async function listStatements({ actor }: Ctx) {
  const rows = await select<StatementHead>(
    `SELECT w.id AS "weekId", w.starts_on AS "startsOn", w.ends_on AS "endsOn", to_json(w.locked_at) #>> '{}' AS "lockedAt",
            s.gross_cents AS "grossCents"
       FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
      WHERE s.person_id = :personId::uuid AND w.state = 'locked' ORDER BY w.starts_on DESC`,
    { personId: actor.personId },
  );
  return rows.map((row) => ({ ...row, number: weekNumberOf(row.startsOn) }));
}

/** @throws 403 for another's statement or a week that is not locked yet, except to the owner */
export function readStatement({ ability, now }: Ctx, day: string, personId: string): Promise<StatementDto> {
  return inTransaction(async (tx) => {
    const week = await weekAt(day, tx);
    authorize(ability, 'read', tag('Statement', { personId, state: week.state }));
    const { people, timeOff } =
      week.state === 'locked' ? await readFrozen(week.id, personId, tx) : await readPayWeek(week, now(), tx);
    const person = people.find((p) => p.personId === personId);
    if (!person) throw notFound('A statement of this person for that week');
    const yearToDate = (await yearsToDate(week, [person], tx))[personId];
    if (!yearToDate) throw new Error('a person with pay in the week has a year');
    return {
      week: await headOf(week, tx),
      person,
      yearToDate,
      timeOff: timeOff[personId] ?? (await statementTimeOffOf(week, [person], tx))[personId] ?? [],
      companyName: (await companyOf(tx)).name,
      correctedLines: await correctedLinesOf([person], tx),
      customers: await customersOf([person], tx),
    };
  });
}
