import type { Transaction } from 'sequelize';
import { JobLine, Person, Visit, VisitCrew, VisitLine } from '../../db/models/index.ts';
import { run, select } from '../../db/sequelize.ts';
import { createVisit, lockVisit, removeVisit } from '../board/index.ts';

/** Writes down who worked the visit: those who ride in its van when it arrives, in crew order. */
export async function recordCrew(tx: Transaction, visit: Visit, at: string): Promise<void> {
  await run(
    `INSERT INTO visit_crew (visit_id, person_id, position, weight, is_trainee)
     SELECT :visitId, r.person_id, row_number() OVER (ORDER BY r.position, r.id) - 1, 1, p.is_trainee
       FROM van_crew r JOIN people p ON p.id = r.person_id
      WHERE r.van_id = :vanId AND r.span @> :at::timestamptz ON CONFLICT (visit_id, person_id) DO NOTHING`,
    { visitId: visit.id, vanId: visit.vanId, at },
    tx,
  );
}

/** An owner or dispatcher who marks a crewless visit did not work it; a person of the crew did. */
export async function recordPresser(tx: Transaction, visit: Visit, personId: string | null): Promise<void> {
  if (!personId || (await VisitCrew.count({ where: { visitId: visit.id }, transaction: tx })) > 0) return;
  const person = await Person.findByPk(personId, { transaction: tx, rejectOnEmpty: true });
  await VisitCrew.create(
    { visitId: visit.id, personId, position: 0, isTrainee: person.isTrainee },
    { transaction: tx },
  );
}

export async function clearCrew(tx: Transaction, visit: Visit): Promise<void> {
  await VisitCrew.destroy({ where: { visitId: visit.id }, transaction: tx });
}

/** The lines that this visit does and that are not finished yet. */
export async function openLineIds(tx: Transaction, visitId: string): Promise<string[]> {
  const links = await VisitLine.findAll({ where: { visitId }, transaction: tx });
  const lines = await JobLine.findAll({
    where: { id: links.map((link) => link.jobLineId), finishedAt: null },
    order: [['position', 'ASC']],
    transaction: tx,
  });
  return lines.map((line) => line.id);
}

export async function finishLines(tx: Transaction, visitId: string, lineIds: string[], at: string): Promise<void> {
  if (lineIds.length === 0) return;
  await JobLine.update(
    { finishedVisitId: visitId, finishedAt: new Date(at) },
    { where: { id: lineIds, finishedAt: null }, transaction: tx },
  );
}

/** The rest of a part-done visit goes back to Unplaced with its remaining minutes. */
export async function splitRest(tx: Transaction, visit: Visit, restLineIds: string[], minutes: number): Promise<void> {
  const [job] = await select<{ addressId: string }>(
    'SELECT address_id AS "addressId" FROM jobs WHERE id = :id',
    { id: visit.jobId },
    tx,
  );
  if (job) await createVisit(tx, { jobId: visit.jobId, addressId: job.addressId, minutes, lineIds: restLineIds });
}

/** Takes finished lines and a still unplaced rest back again. @returns false when the rest has been placed meanwhile */
export async function takeFinishBack(tx: Transaction, visit: Visit, wasPartDone: boolean): Promise<boolean> {
  if (wasPartDone) {
    // The rest is the visit that was added last.
    const rest = await Visit.findOne({ where: { jobId: visit.jobId }, order: [['part', 'DESC']], transaction: tx });
    if (rest?.progress !== 'unplaced') return false;
    const locked = rest && (await lockVisit(tx, rest.id));
    if (locked) await removeVisit(tx, locked);
  }
  await JobLine.update(
    { finishedVisitId: null, finishedAt: null },
    { where: { finishedVisitId: visit.id }, transaction: tx },
  );
  return true;
}
