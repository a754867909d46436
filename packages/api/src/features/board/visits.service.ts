import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { Stop, Visit, VisitLine } from '../../db/models/index.ts';

export interface NewVisit {
  jobId: string;
  addressId: string;
  minutes: number;
  lineIds: string[];
  /** Left out: a parking place of its own. */
  stopId?: string;
}

/** A new going-out to a job, unplaced, after the job's last one. */
export async function createVisit(
  tx: Transaction,
  { jobId, addressId, minutes, lineIds, stopId }: NewVisit,
): Promise<Visit> {
  const part = ((await Visit.max<number, Visit>('part', { where: { jobId }, transaction: tx })) ?? 0) + 1;
  const visit = await Visit.create(
    { id: uuid(), jobId, stopId: stopId ?? (await ownStop(tx, addressId)), part, minutes },
    { transaction: tx },
  );
  await setVisitLines(tx, visit.id, lineIds);
  return visit;
}

export async function setVisitLines(tx: Transaction, visitId: string, lineIds: string[]): Promise<void> {
  await VisitLine.destroy({ where: { visitId }, transaction: tx });
  await VisitLine.bulkCreate(
    lineIds.map((jobLineId) => ({ visitId, jobLineId })),
    { transaction: tx },
  );
}

/** Takes a visit away again: only one that was never placed. */
export async function removeVisit(tx: Transaction, visit: Visit): Promise<void> {
  await VisitLine.destroy({ where: { visitId: visit.id }, transaction: tx });
  await visit.destroy({ transaction: tx });
}

/** A parking place of its own. */
export async function ownStop(tx: Transaction, addressId: string): Promise<string> {
  const stop = await Stop.create({ id: uuid(), addressId }, { transaction: tx });
  return stop.id;
}

/** Locks a visit's row for the rest of the transaction. */
export function lockVisit(tx: Transaction, id: string): Promise<Visit | null> {
  return Visit.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
}
