import type { Transaction } from 'sequelize';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { statementRow } from '@driprail/shared/domain/pay/time-off/statement-time-off';
import type { StatementTimeOff } from '@driprail/shared/domain/pay/time-off/statement-time-off';
import type { PayWeek } from '../../../db/models/index.ts';
import { ledgerRecords, ledgersOf } from './ledger-records.queries.ts';

/**
 * The balances that a week's statements show, by person. They are worked out from the locked weeks before and this one
 * as if it were locked; at the lock they are stored beside the summary, so that a week locked later out of order
 * changes no statement that was handed over.
 */
export async function statementTimeOffOf(
  week: PayWeek,
  people: readonly Pick<PersonWeek, 'personId' | 'hoursWorked'>[],
  tx?: Transaction,
): Promise<Record<string, StatementTimeOff[]>> {
  const records = await ledgerRecords(
    people.map((person) => person.personId),
    tx,
  );
  const { startsOn, endsOn } = week;
  return Object.fromEntries(
    people.map(({ personId, hoursWorked }) => {
      const ledgers = ledgersOf(records, personId, [{ startsOn, endsOn, hoursWorked }], startsOn);
      return [personId, ledgers.flatMap(({ kind, weeks }) => statementRow(kind, weeks) ?? [])];
    }),
  );
}
