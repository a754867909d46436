import type { Transaction } from 'sequelize';
import type { Job } from '../../db/models/index.ts';
import { noteJobPaid } from '../pay/index.ts';
import { readBill } from './bill.presenter.ts';

/** Who did something to a bill, and when the server learned of it; null for the customer or the company's own rule. */
export interface By {
  userId: string | null;
  at: Date;
}

/** When nothing is owed on the invoice any more, the job counts as paid: commission may wait for that. */
export async function noteIfPaid(tx: Transaction, job: Pick<Job, 'id' | 'number'>, by: By): Promise<void> {
  const bill = await readBill(job.id, by.at, tx);
  if (bill.invoice && bill.owedCents <= 0) await noteJobPaid(tx, by, job);
}
