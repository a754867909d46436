import type { Transaction } from 'sequelize';
import { Enquiry, Message } from '../../db/models/index.ts';
import { run } from '../../db/sequelize.ts';

/** All that was written to customers and came back from them goes, with their words and addresses. */
export async function eraseMessages(tx: Transaction, customerIds: string[]): Promise<void> {
  const where = { customerId: customerIds };
  await Message.destroy({ where, transaction: tx });
  await Enquiry.destroy({ where, transaction: tx });
  for (const table of ['message_stops', 'mail_bounces'])
    await run(`DELETE FROM ${table} WHERE customer_id IN (:customerIds)`, { customerIds }, tx);
}

/** When two records are found to be one: what was stopped by either stays stopped. */
export async function moveMessages(tx: Transaction, fromId: string, toId: string): Promise<void> {
  const own = { where: { customerId: fromId }, transaction: tx };
  await Message.update({ customerId: toId }, own);
  await Enquiry.update({ customerId: toId }, own);
  const both = { fromId, toId };
  await run(
    `INSERT INTO message_stops SELECT :toId, what, at FROM message_stops WHERE customer_id = :fromId ON CONFLICT DO NOTHING`,
    both,
    tx,
  );
  await run(
    `INSERT INTO mail_bounces SELECT :toId, address, reason, at FROM mail_bounces WHERE customer_id = :fromId ON CONFLICT DO NOTHING`,
    both,
    tx,
  );
  for (const table of ['message_stops', 'mail_bounces'])
    await run(`DELETE FROM ${table} WHERE customer_id = :fromId`, { fromId }, tx);
}
