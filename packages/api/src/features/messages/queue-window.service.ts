import type { Transaction } from 'sequelize';
import { Message } from '../../db/models/index.ts';
import { queueMessage } from './queue-message.service.ts';

/** Tells a job's arrival window: as booked the first time, as a new time after that. */
export async function queueWindow(
  tx: Transaction,
  now: Date,
  { jobId, version }: { jobId: string; version: number },
): Promise<void> {
  const told = await Message.count({
    where: { jobId, kind: 'booked', state: ['waiting', 'sending', 'sent'] },
    transaction: tx,
  });
  await queueMessage(tx, now, { kind: told > 0 ? 'moved' : 'booked', jobId, eventKey: `job:${jobId}:v${version}` });
}
