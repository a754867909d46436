import type { Transaction } from 'sequelize';
import { Customer, Job } from '../../db/models/index.ts';
import { conflict } from '../../http/errors.ts';

/** All jobs of one customer become another's, when two records are found to be one. @returns how many */
export async function moveJobs(tx: Transaction, fromId: string, toId: string): Promise<number> {
  const [count] = await Job.update({ customerId: toId }, { where: { customerId: fromId }, transaction: tx });
  return count;
}

/** What was written about a customer on the jobs goes; the jobs stay, with what was done and paid. */
export async function eraseJobNotes(tx: Transaction, customerIds: string[]): Promise<void> {
  await Job.update({ notes: '' }, { where: { customerId: customerIds }, transaction: tx });
}

/** Waits for a merge or an erasure that runs now. @throws 409 for a record that was merged or erased */
export async function refuseGoneCustomer(tx: Transaction, id: string): Promise<void> {
  const customer = await Customer.findByPk(id, { transaction: tx, lock: tx.LOCK.KEY_SHARE });
  if (customer?.erasedAt) throw conflict('erased', 'That customer was erased. Book for another one.');
  if (customer?.mergedInto)
    throw conflict('merged', `${customer.name} was merged into another record. Book for that one.`);
}
