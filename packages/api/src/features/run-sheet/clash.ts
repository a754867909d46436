import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { VisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { actionNames } from '@driprail/shared/domain/board/progress';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { formatClock } from '@driprail/shared/domain/time/format';
import { stampOf } from '../../db/models/columns.ts';
import type { CompanySettings, Visit } from '../../db/models/index.ts';
import { VisitEvent } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** States that only the board brings about: a press that does not fit them was made in ignorance of the board. */
const BY_BOARD: readonly Progress[] = ['unplaced', 'called_off'];

/** Whether a press that was refused tells of something the board does not know. */
export async function isNews(
  tx: Transaction,
  { id, progress }: Visit,
  { kind }: VisitAction,
  times: StampedTimes,
): Promise<boolean> {
  if (kind === 'undo' || kind === 'trouble') return false;
  return BY_BOARD.includes(progress) || movedSince(tx, id, times);
}

/** Whether the board changed a visit's plan after a press was made: then the presser could not know. */
export async function movedSince(tx: Transaction, visitId: string, { occurredAt }: StampedTimes): Promise<boolean> {
  const rows = await select(
    `SELECT 1 FROM visit_events WHERE visit_id = :visitId AND kind = 'plan' AND occurred_at > :occurredAt LIMIT 1`,
    { visitId, occurredAt },
    tx,
  );
  return rows.length > 0;
}

/** The press stays as a report among what needs dispatch, in words; the phone keeps it with the reason. Nothing is dropped. */
export async function tellDesk(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  action: VisitAction,
  times: StampedTimes,
  { zone, clock }: CompanySettings,
): Promise<void> {
  const what = action.kind === 'undo' || action.kind === 'trouble' ? 'something' : `“${actionNames[action.kind]}”`;
  const at = formatClock(times.occurredAt, zone, clock ?? '12');
  await VisitEvent.create(
    {
      ...{ id: uuid(), visitId: visit.id, kind: 'trouble', trouble: 'clash' },
      ...{ fromProgress: visit.progress, toProgress: visit.progress },
      ...{ userId: ctx.actor.userId, personId: ctx.actor.personId },
      ...stampOf(times),
      reason: `${ctx.name} marked ${what} at ${at}. ${action.reason}`.trim(),
    },
    { transaction: tx },
  );
  hintAfterCommit(tx, ['desk'], 'visit', visit.id, visit.version);
}

export function movedAway(): AppError {
  return new AppError(409, 'clash', 'This visit went to another crew or day meanwhile. Dispatch is told what you did.');
}
