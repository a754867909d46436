import type { Transaction } from 'sequelize';
import { select } from '../../db/sequelize.ts';

/** The next number of a kind of document. The counter stays locked until the transaction ends: no gaps, none twice. */
export async function nextNumber(tx: Transaction, kind: 'invoice' | 'credit_note'): Promise<number> {
  const [row] = await select<{ number: number }>(
    'UPDATE document_counters SET last_number = last_number + 1 WHERE kind = :kind RETURNING last_number AS number',
    { kind },
    tx,
  );
  if (!row) throw new Error(`there is no counter for ${kind}`);
  return row.number;
}
