import type { Progress } from '@driprail/shared/domain/board/progress';
import * as models from '@driprail/api/db/models/index';
import type { inTransaction } from '@driprail/api/db/sequelize';
import type { DemoRows } from './rows.ts';

/** The transaction that the seeding is in. */
export type Transaction = Parameters<Parameters<typeof inTransaction>[0]>[0];

/**
 * Visits in the order in which they happened: the crew is on site, walks round the cars, then work begins. The
 * database takes no walk-round as made before work once the visit is past Start work, from the demo neither.
 */
export async function storeVisits(rows: DemoRows, transaction: Transaction): Promise<void> {
  const options = { transaction };
  const walked = new Set(rows.walkRounds.map(({ visitId }) => visitId));
  const onSite = (visit: DemoRows['visits'][number]) =>
    walked.has(visit.id) ? { ...visit, progress: 'on_site' as const } : visit;
  await models.Visit.bulkCreate(rows.visits.map(onSite), options);
  await models.WalkRound.bulkCreate(rows.walkRounds, options);
  await models.WalkMark.bulkCreate(rows.walkMarks, options);
  const reached = new Map<Progress, string[]>();
  for (const { id, progress = 'on_site' } of rows.visits) {
    if (walked.has(id)) reached.set(progress, [...(reached.get(progress) ?? []), id]);
  }
  for (const [progress, id] of reached) await models.Visit.update({ progress }, { where: { id }, transaction });
  await models.WalkLook.bulkCreate(rows.walkLooks, options);
}
