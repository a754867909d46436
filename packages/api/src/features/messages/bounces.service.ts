import type { Transaction } from 'sequelize';
import type { Message } from '../../db/models/index.ts';
import { run } from '../../db/sequelize.ts';

/** Notes that an address took no mail: nothing more goes there until the customer's address is another one. */
export async function noteBounce(tx: Transaction, message: Message, reason: string, at: Date): Promise<void> {
  await message.update({ bouncedAt: at }, { transaction: tx });
  await run(
    `INSERT INTO mail_bounces (customer_id, address, reason, at) VALUES (:customerId, :address, :reason, :at)
     ON CONFLICT (customer_id, address) DO UPDATE SET reason = excluded.reason, at = excluded.at`,
    { customerId: message.customerId, address: message.recipient, reason: reason.slice(0, 500), at },
    tx,
  );
}
