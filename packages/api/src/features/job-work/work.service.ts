import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { VisitWorkDto, workActionBody } from '@driprail/shared/contracts/job-work.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import type { WorkKind } from '@driprail/shared/domain/job-work/fold-work';
import { afterKnown, stamp } from '@driprail/shared/domain/time/device';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { companyOf } from '../../db/company.ts';
import { stampOf } from '../../db/models/columns.ts';
import type { Visit } from '../../db/models/index.ts';
import { WorkEventRow } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, notFound, unprocessable } from '../../http/errors.ts';
import type { Outcome } from '../../http/once.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { authorizeVisit, lockVisit } from '../board/index.ts';
import { fixChecklists } from './demands.ts';
import { readVisitWork } from './job-work.queries.ts';
import { linesOf } from './work-state.ts';
import type { WorkRow } from './work-rows.queries.ts';
import { readWorkRows } from './work-rows.queries.ts';

export type WorkAction = z.infer<typeof workActionBody>;

/** Told to every board; the rest only to whoever looks at the visit's work. */
const shownOnBoard: readonly WorkKind[] = ['key_taken', 'key_back', 'go_on'];
const worded: Partial<Record<WorkKind, string>> = {
  used: 'Say what was used.',
  note: 'Say something in the note.',
  go_on: 'Say why the job goes on without it.',
};

/**
 * One press at the car, taken once and appended.
 * @throws 404 for another crew's visit, 403 by row, 409 for a tick before work has started, 422 for a step that is not on
 *   the list, several steps with one that wants a press of its own, or missing words
 */
export async function actAtWork(
  ctx: Ctx,
  visitId: string,
  action: WorkAction,
): Promise<{ work: VisitWorkDto; isRepeat: boolean }> {
  const { zone } = await companyOf();
  const { isRepeat } = await takeOnce(ctx, action.key, { visitId, ...action }, async (tx) => {
    const visit = await lockVisit(tx, visitId);
    const [row] = await readWorkRows({ visitId }, tx);
    if (!visit || !row) throw notFound('That visit');
    const times = stamp(action.deviceAt, action.offsetMs, ctx.now());
    authorizeVisit(ctx, 'mark', row.visit, zone, times.occurredAt);
    return perform(tx, ctx, visit, row, action, times);
  });
  return { work: await readVisitWork(ctx, visitId), isRepeat };
}

async function perform(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  row: WorkRow,
  action: WorkAction,
  times: StampedTimes,
): Promise<Outcome<{ visitId: string }>> {
  const sentence = worded[action.kind];
  if (sentence && action.words === '') throw unprocessable('words', sentence, { fields: { words: sentence } });
  if (action.kind === 'tick' || action.kind === 'untick') {
    const hasStarted = visit.progress === 'working' || isEnded(visit.progress);
    if (!hasStarted) return { refused: new AppError(409, 'clash', 'Steps come after Start work. Press that first.') };
    refuseSteps(row, action);
    await fixChecklists(tx, visit.id);
  }
  if (action.kind === 'start_line' || action.kind === 'stop_line') refuseLine(row, action.lineId);
  await WorkEventRow.create(
    {
      ...{ id: uuid(), visitId: visit.id, kind: action.kind, steps: action.steps, lineId: action.lineId },
      ...{ keys: action.keys, words: action.words, userId: ctx.actor.userId, personId: ctx.actor.personId },
      ...stampOf(afterKnown(times, row.extras.events.at(-1)?.at ?? null)),
    },
    { transaction: tx },
  );
  const entity = shownOnBoard.includes(action.kind) ? 'visit' : 'work';
  const personIds = row.visit.crew.map((person) => person.personId);
  hintAfterCommit(tx, ['desk', { personIds }], entity, visit.id, visit.version);
  return { answer: { visitId: visit.id } };
}

/** A tick names steps of the visit's own list; one that wants a press of its own stands alone in it. */
function refuseSteps(row: WorkRow, { steps, kind }: WorkAction): void {
  if (steps.length === 0) throw unprocessable('no_steps', 'Choose a step.', { fields: { steps: 'Choose a step.' } });
  const lines = linesOf(row);
  const known = steps.map((ref) =>
    lines.find((line) => line.lineId === ref.lineId)?.steps.find((step) => step.id === ref.stepId),
  );
  if (known.some((step) => !step))
    throw unprocessable('unknown_step', 'That step is not on this visit’s list. Look at the list again.');
  const alone = known.find((step) => step?.isAlone);
  if (kind === 'tick' && alone && known.some((step) => step?.words !== alone.words))
    throw unprocessable('alone', `“${alone.words}” is ticked by itself.`);
}

function refuseLine(row: WorkRow, lineId: string | null): void {
  if (!row.visit.lines.some((line) => line.id === lineId)) {
    const message = 'That service is not on this visit. Look at the list again.';
    throw unprocessable('unknown_line', message, { fields: { lineId: message } });
  }
}
