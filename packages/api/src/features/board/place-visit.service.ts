import type { Transaction } from 'sequelize';
import { companyOf } from '../../db/company.ts';
import { Visit } from '../../db/models/index.ts';
import type { Doer } from '../../http/context.ts';
import { readVisits } from './board.queries.ts';
import { judge, savePlan, tell } from './moves.service.ts';

/**
 * Places a visit inside the caller's transaction, as the board would, without a press of the desk.
 * @returns false, and the visit stays as it is, when the board's rules refuse the place
 */
export async function placeVisit(
  tx: Transaction,
  doer: Doer,
  visitId: string,
  place: { vanId: string; from: string; to: string },
): Promise<boolean> {
  const visit = await Visit.findByPk(visitId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
  const before = new Map((await readVisits({ ids: [visitId] }, tx)).map((one) => [one.id, one]));
  const was = before.get(visitId);
  if (!was) throw new Error('a visit that is locked can be read');
  const move = { visitId, planVersion: visit.planVersion, ...place };
  const judgement = await judge(tx, doer, [move], before);
  if (judgement.refusals.length > 0) return false;
  const { zone } = await companyOf(tx);
  await savePlan(tx, doer, visit, was, move, { accept: [], judgement, zone });
  await tell(tx, [visitId], before);
  return true;
}
