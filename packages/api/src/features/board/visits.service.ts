import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { addMinutes, isBefore } from '@driprail/shared/domain/time/zone';
import { rangeOf, spanOf } from '../../db/models/columns.ts';
import { Stop, Visit, VisitLine } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

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

/**
 * Makes a visit that is under way longer or shorter on the board, as far as its van's next stop leaves room: what really
 * happens is recorded all the same.
 */
export async function stretchVisit(tx: Transaction, visit: Visit, byMinutes: number): Promise<void> {
  const minutes = Math.max(5, visit.minutes + byMinutes);
  const changed = { minutes, planVersion: visit.planVersion + 1, version: visit.version + 1 };
  if (!visit.planned) {
    await visit.update(changed, { transaction: tx });
    return;
  }
  const { from, to } = spanOf(visit.planned);
  const [next] = await select<{ from: string }>(
    `SELECT to_json(min(lower(planned))) #>> '{}' AS "from" FROM visits
      WHERE van_id = :vanId AND stop_id <> :stopId AND progress <> 'called_off' AND lower(planned) >= :to`,
    { vanId: visit.vanId, stopId: visit.stopId, to },
    tx,
  );
  const wanted = addMinutes(from, minutes);
  const end = next?.from && isBefore(next.from, wanted) ? next.from : wanted;
  await visit.update({ ...changed, planned: rangeOf(from, end) }, { transaction: tx });
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
