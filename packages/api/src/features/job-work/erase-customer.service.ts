import type { Transaction } from 'sequelize';
import { JobChange } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

/** Who said yes to a change at the car goes; the change and its price stay. */
export async function eraseSaidYes(tx: Transaction, customerIds: string[]): Promise<void> {
  const jobs = await select<{ id: string }>(
    'SELECT id FROM jobs WHERE customer_id IN (:customerIds)',
    { customerIds },
    tx,
  );
  await JobChange.update({ saidYesBy: '' }, { where: { jobId: jobs.map(({ id }) => id) }, transaction: tx });
}
