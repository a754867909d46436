import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { progressActions } from '@driprail/shared/domain/board/progress';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { stampOf } from '../../db/models/columns.ts';
import type { Visit } from '../../db/models/index.ts';
import { Invoice, VisitEvent } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { clearCrew, takeFinishBack } from './visit-steps.ts';

/** Takes the last mark back while it is fresh. @returns a sentence when it can't be, null when it was */
export async function undoLast(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  times: StampedTimes,
  undoSeconds: number,
): Promise<string | null> {
  const last = await VisitEvent.findOne({
    where: { visitId: visit.id, isUndone: false, kind: [...progressActions] },
    order: [
      ['receivedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    transaction: tx,
  });
  if (!last || last.toProgress !== visit.progress) return 'There is nothing to take back.';
  if (Date.parse(times.receivedAt) - last.receivedAt.getTime() > undoSeconds * 1000)
    return 'It is too late to take that back. Call dispatch.';
  const isEnd = last.kind === 'finish' || last.kind === 'part_done';
  const invoice = isEnd && (await Invoice.findOne({ where: { jobId: visit.jobId, voidedAt: null }, transaction: tx }));
  if (invoice) return `Invoice ${invoice.number} has gone out. Call dispatch.`;
  if (isEnd && !(await takeFinishBack(tx, visit, last.kind === 'part_done'))) {
    return 'Dispatch has placed the rest already. Call dispatch.';
  }
  if (last.kind === 'arrive') await clearCrew(tx, visit);
  await last.update({ isUndone: true }, { transaction: tx });
  await VisitEvent.create(
    {
      id: uuid(),
      visitId: visit.id,
      kind: 'undo',
      fromProgress: visit.progress,
      toProgress: last.fromProgress,
      userId: ctx.actor.userId,
      personId: ctx.actor.personId,
      ...stampOf(times),
    },
    { transaction: tx },
  );
  await visit.update(
    { progress: last.fromProgress, progressSince: new Date(times.occurredAt), reason: '', version: visit.version + 1 },
    { transaction: tx },
  );
  return null;
}
