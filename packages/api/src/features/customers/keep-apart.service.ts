import { CustomerApart } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';

/** Once is enough: the same word again changes nothing. @throws 404 */
export async function keepApart({ actor, now }: Ctx, ids: [string, string]): Promise<void> {
  const [customerId, otherId] = [...ids].sort() as [string, string];
  await inTransaction(async (tx) => {
    const known = await select('SELECT id FROM customers WHERE id IN (:ids)', { ids }, tx);
    if (known.length < 2) throw notFound('That customer');
    await CustomerApart.findOrCreate({
      where: { customerId, otherId },
      defaults: { customerId, otherId, userId: actor.userId, at: now() },
      transaction: tx,
    });
  });
}
