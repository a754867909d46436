import type { Transaction } from 'sequelize';
import type { ChangedLine } from '@driprail/shared/domain/job-work/judge-change';
import type { JobChange, Visit } from '../../db/models/index.ts';
import { JobLine, VisitLine } from '../../db/models/index.ts';
import { conflict } from '../../http/errors.ts';
import { setVisitLines, stretchVisit } from '../board/index.ts';
import { putJobLines } from '../booking/index.ts';
import { fixChecklists } from './demands.ts';

type PutLine = Parameters<typeof putJobLines>[2][number];

/**
 * Puts an agreed change onto the job as it is now: only the lines it is about are touched, at the agreed price.
 * @throws 409 when one of them is finished or gone meanwhile
 */
export async function applyChange(tx: Transaction, visit: Visit, change: JobChange): Promise<void> {
  const lines = await JobLine.findAll({
    where: { jobId: visit.jobId },
    order: [['position', 'ASC']],
    transaction: tx,
  });
  const touched = change.before.filter((was) => !isSame(was, change.after));
  for (const was of touched) {
    const line = lines.find((one) => one.id === was.id);
    if (!line || line.finishedAt)
      throw conflict('moved_on', `${was.serviceName} is finished or gone meanwhile. Book it as a job of its own.`);
  }
  const kept = lines.flatMap((line): PutLine[] => {
    const as = touched.some((was) => was.id === line.id) ? change.after.find((next) => next.id === line.id) : line;
    if (!as) return [];
    const { serviceId, priceCents, minutes } = as;
    return [{ id: line.id, vehicleId: line.vehicleId, sizeClass: line.sizeClass, serviceId, priceCents, minutes }];
  });
  const added = change.after.filter((line) => line.id === null).map(toPutLine);
  const newIds = await putJobLines(tx, visit.jobId, [...kept, ...added]);
  const links = await VisitLine.findAll({ where: { visitId: visit.id }, transaction: tx });
  await setVisitLines(tx, visit.id, [...links.map((link) => link.jobLineId), ...newIds]);
  await stretchVisit(tx, visit, change.minutesDifference);
  await fixChecklists(tx, visit.id);
}

function isSame(was: ChangedLine, after: readonly ChangedLine[]): boolean {
  const next = after.find((line) => line.id === was.id);
  return next?.serviceId === was.serviceId && next.priceCents === was.priceCents && next.minutes === was.minutes;
}

function toPutLine({ serviceId, vehicleId, sizeClass, priceCents, minutes }: ChangedLine): PutLine {
  return { serviceId, vehicleId, sizeClass, priceCents, minutes };
}
