import type { Transaction } from 'sequelize';
import { run } from '../../db/sequelize.ts';

/** Names and streets on a customer's invoices go, what the customer wrote goes, and links to bills end. Numbers and amounts stay. */
export async function eraseFromBills(
  tx: Transaction,
  customerIds: string[],
  { name, at }: { name: string; at: Date },
): Promise<void> {
  const mine = '(SELECT id FROM jobs WHERE customer_id IN (:customerIds))';
  await run(
    `UPDATE invoices SET bill_to = bill_to || jsonb_build_object('name', :name::text, 'line', '') WHERE job_id IN ${mine}`,
    { customerIds, name },
    tx,
  );
  await run(`UPDATE feedback SET words = '' WHERE job_id IN ${mine}`, { customerIds }, tx);
  await run(
    `UPDATE customer_links SET revoked_at = :at WHERE revoked_at IS NULL AND job_id IN ${mine}`,
    { customerIds, at },
    tx,
  );
}
