import type { Transaction } from 'sequelize';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { select } from '../../db/sequelize.ts';

/**
 * Who the jobs of people's lines were for, from today's rows: the lines themselves name customers by job number only,
 * so a locked week needs no change when a customer is erased.
 * @returns customer names by job id
 */
export async function customersOf(people: readonly PersonWeek[], tx?: Transaction): Promise<Record<string, string>> {
  const ids = new Set(people.flatMap((person) => person.lines.flatMap((line) => line.jobId ?? [])));
  if (ids.size === 0) return {};
  const rows = await select<{ id: string; name: string }>(
    'SELECT j.id, c.name FROM jobs j JOIN customers c ON c.id = j.customer_id WHERE j.id IN (:ids)',
    { ids: [...ids] },
    tx,
  );
  return Object.fromEntries(rows.map(({ id, name }) => [id, name]));
}
