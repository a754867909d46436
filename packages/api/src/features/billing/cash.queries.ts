import type { Transaction } from 'sequelize';
import type { CashCountDto, CashHolderDto } from '@driprail/shared/contracts/cash.contract';
import { select } from '../../db/sequelize.ts';
import { cashTaken, countFrom, countJson, holderName, isCash, isUncounted } from './cash.sql.ts';

/** Who holds cash that was not counted yet, the most first; of one person, or of all. */
export function readHolders(personId: string | null = null, tx?: Transaction): Promise<CashHolderDto[]> {
  return select<CashHolderDto>(
    `SELECT p.person_id AS "personId", ${holderName} AS name, sum(p.amount_cents + tip.cents)::bigint AS cents,
            json_agg(json_build_object('id', p.id, 'jobId', j.id, 'jobNumber', j.number, 'customerName', c.name,
              'receivedAt', to_json(p.received_at) #>> '{}', 'amountCents', p.amount_cents, 'tipCents', tip.cents)
              ORDER BY p.received_at, p.id) AS payments
       FROM ${cashTaken} JOIN jobs j ON j.id = p.job_id JOIN customers c ON c.id = j.customer_id
      WHERE ${isCash} AND ${isUncounted} AND (:personId::uuid IS NULL OR p.person_id = :personId::uuid)
      GROUP BY p.person_id, ${holderName} ORDER BY p.person_id IS NULL, cents DESC, name`,
    { personId },
    tx,
  );
}

/** The last counts, newest first. */
export async function readCounts(): Promise<CashCountDto[]> {
  const rows = await select<{ count: CashCountDto }>(
    `SELECT ${countJson} AS count FROM ${countFrom} ORDER BY c.counted_at DESC, c.id DESC LIMIT 50`,
  );
  return rows.map(({ count }) => count);
}
