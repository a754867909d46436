import type { Transaction } from 'sequelize';
import { Job } from '../../db/models/index.ts';

/** All jobs of one customer become another's, when two records are found to be one. @returns how many */
export async function moveJobs(tx: Transaction, fromId: string, toId: string): Promise<number> {
  const [count] = await Job.update({ customerId: toId }, { where: { customerId: fromId }, transaction: tx });
  return count;
}

/** What was written about a customer on the jobs goes; the jobs stay, with what was done and paid. */
export async function eraseJobNotes(tx: Transaction, customerIds: string[]): Promise<void> {
  await Job.update({ notes: '' }, { where: { customerId: customerIds }, transaction: tx });
}
