import type { Transaction } from 'sequelize';
import { payEngine } from '@driprail/shared/domain/pay/pay-engines';
import type { PayLine, PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { StatementTimeOff } from '@driprail/shared/domain/pay/time-off/statement-time-off';
import type { PayWeek } from '../../db/models/index.ts';
import { PayLineRow, PayStatement } from '../../db/models/index.ts';

/** The engine's input that a week was locked with; null while it is open, or when its engine is not kept. */
export function frozenInput(week: PayWeek): PayWeekInput | null {
  const isKept = week.state === 'locked' && payEngine(week.engineVersion ?? '') !== null;
  return isKept ? (week.snapshot as PayWeekInput) : null;
}

/** The stored lines of a locked week, of everybody or of one person. */
export async function readFrozen(
  weekId: string,
  personId: string | null,
  tx?: Transaction,
): Promise<{
  people: PersonWeek[];
  lineIds: Record<string, string>;
  /** Balances by person as the statements showed them. */
  timeOff: Record<string, StatementTimeOff[]>;
}> {
  const where = { payWeekId: weekId, ...(personId && { personId }) };
  const options = { where, transaction: tx ?? null };
  const statements = await PayStatement.findAll(options);
  const rows = await PayLineRow.findAll({ ...options, order: [['position', 'ASC']] });
  const people = statements
    .map((statement) => ({
      ...(statement.summary as Omit<PersonWeek, 'lines'>),
      lines: rows.filter((row) => row.personId === statement.personId).map((row): PayLine => row.line),
    }))
    .sort((a, b) => a.name.localeCompare(b.name));
  return {
    people,
    lineIds: Object.fromEntries(rows.map((row) => [`${row.personId}:${row.key}`, row.id])),
    timeOff: Object.fromEntries(
      statements.map(({ personId: of, timeOff }) => [of, (timeOff ?? []) as StatementTimeOff[]]),
    ),
  };
}
