import type { Transaction } from 'sequelize';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { ENGINE_VERSION, computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { customersOf } from './customers.queries.ts';
import { correctedLinesOf, correctionsOfWeek, differences } from './corrections.queries.ts';
import { readFrozen } from './frozen.queries.ts';
import { payInputOf } from './pay-input.queries.ts';
import { statementTimeOffOf } from './time-off/statement-time-off.queries.ts';
import { salesOf, unendedOf } from './week-figures.queries.ts';
import { yearsToDate } from './year-to-date.queries.ts';
import { headOf } from './weeks.service.ts';

/**
 * A week as the owner sees it: computed while open, as it was frozen once locked.
 * @param withTimeOff of an open week, everybody's balances too; they look back over all weeks
 */
export async function readPayWeek(
  week: PayWeek,
  now: Date,
  tx?: Transaction,
  { withTimeOff = false } = {},
): Promise<PayWeekDto> {
  const input = await payInputOf(week, now, tx);
  const computed = computePayWeek(input);
  const frozen = week.state === 'locked' ? await readFrozen(week.id, null, tx) : null;
  const people = frozen?.people ?? computed.people;
  return {
    week: await headOf(week, tx),
    people,
    adjustments: await adjustmentsOf(week.id, tx),
    salesCents: await salesOf(week, tx),
    lineIds: frozen?.lineIds ?? {},
    engineVersion: week.engineVersion ?? ENGINE_VERSION,
    lateDifferences: frozen ? differences(frozen.people, computed.people, await correctionsOfWeek(week.id, tx)) : [],
    correctedLines: await correctedLinesOf(people, tx),
    customers: await customersOf(people, tx),
    yearsToDate: await yearsToDate(week, people, tx),
    timeOff: frozen?.timeOff ?? (withTimeOff ? await statementTimeOffOf(week, people, tx) : {}),
    warningTimes: warningTimes(people, input),
    unended: frozen ? [] : await unendedOf(week, now, tx),
  };
}

function adjustmentsOf(weekId: string, tx?: Transaction): Promise<PayWeekDto['adjustments']> {
  return select(
    `SELECT x.id, x.person_id AS "personId", x.kind, x.amount_cents AS "amountCents", x.reason, x.corrects_line_id AS "correctsLineId",
            u.name AS by FROM pay_adjustments x JOIN users u ON u.id = x.user_id WHERE x.pay_week_id = :weekId ORDER BY x.at, x.id`,
    { weekId },
    tx,
  );
}

/** When what the warnings name took place, so that a screen can lead to the day. */
function warningTimes(people: readonly PersonWeek[], { entries, doneLines }: PayWeekInput): Record<string, string> {
  const named = new Set(people.flatMap((person) => person.warnings.flatMap((w) => [w.entryId, w.jobId])));
  const times = [
    ...entries.map((entry) => [entry.id, entry.startedAt] as const),
    ...doneLines.map((line) => [line.jobId, line.doneAt] as const),
  ];
  return Object.fromEntries(times.filter(([id]) => named.has(id)));
}
