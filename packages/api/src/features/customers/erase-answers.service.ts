import type { Transaction } from 'sequelize';
import { withoutWords } from '@driprail/shared/domain/customer/erasure';
import { select } from '../../db/sequelize.ts';
import { rewriteAnswers } from '../../http/once.ts';

/** Answers kept for a phone that sends a press twice say what the visit said then: the customer's words in them go too. */
export async function eraseFromAnswers(tx: Transaction, customerIds: string[]): Promise<void> {
  const [known] = await select<{ words: string[]; ids: string[] }>(
    `SELECT ARRAY(
       SELECT unnest(ARRAY[name, phone, email, notes, must_know]) FROM customers WHERE id IN (:customerIds)
       UNION SELECT unnest(ARRAY[line, gate_code, access_notes, must_know, key_goes_back]) FROM addresses WHERE customer_id IN (:customerIds)
       UNION SELECT unnest(ARRAY[plate, vin, paint, interior, notes, must_know]) FROM vehicles WHERE customer_id IN (:customerIds)
       UNION SELECT notes FROM jobs WHERE customer_id IN (:customerIds)) AS words,
     ARRAY(SELECT v.id::text FROM visits v JOIN jobs j ON j.id = v.job_id WHERE j.customer_id IN (:customerIds)
       UNION SELECT id::text FROM jobs WHERE customer_id IN (:customerIds)) AS ids`,
    { customerIds },
    tx,
  );
  if (known) await rewriteAnswers(tx, known.ids, (answer) => withoutWords(answer, known.words));
}
