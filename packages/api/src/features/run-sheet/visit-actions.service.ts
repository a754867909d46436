import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { RunVisitDto, VisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import type { Progress, ProgressAction } from '@driprail/shared/domain/board/progress';
import { takeStep } from '@driprail/shared/domain/board/progress';
import { stamp } from '@driprail/shared/domain/time/device';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { companyOf } from '../../db/company.ts';
import { stampOf } from '../../db/models/columns.ts';
import type { CompanySettings, Visit } from '../../db/models/index.ts';
import { VisitEvent } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, notFound, unprocessable } from '../../http/errors.ts';
import type { Outcome } from '../../http/once.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { authorizeVisit, lockVisit } from '../board/index.ts';
import { followProgress } from '../clock/index.ts';
import { fixChecklists, refuseUnconfirmed, refuseUnfinished } from '../job-work/index.ts';
import { queueMessage } from '../messages/index.ts';
import { isNews, movedAway, movedSince, tellDesk } from './clash.ts';
import { readRunRows, toRunVisit } from './run-visits.queries.ts';
import type { RunRow } from './run-visits.queries.ts';
import { undoLast } from './undo.ts';
import { clearCrew, finishLines, openLineIds, recordCrew, recordPresser, splitRest } from './visit-steps.ts';

/**
 * One press on a visit, taken once: progress, undo, or a report of trouble.
 * @throws 404 for what one may not know, 403 by row, 409 with the newer state when the step can't follow, 422 for a missing reason
 */
export async function actOnVisit(
  ctx: Ctx,
  visitId: string,
  action: VisitAction,
): Promise<{ visit: RunVisitDto; isRepeat: boolean }> {
  const company = await companyOf();
  refuseUnreasoned(action);
  const { answer, isRepeat } = await takeOnce<{ visit: RunVisitDto }>(
    ctx,
    action.key,
    { visitId, ...action },
    async (tx) => {
      const visit = await lockVisit(tx, visitId);
      const row = (await readRunRows({ visitId }, tx))[0];
      if (!visit || !row) throw notFound('That visit');
      const times = stamp(action.deviceAt, action.offsetMs, ctx.now());
      const isOwn = row.visit.crew.some((member) => member.personId === ctx.actor.personId);
      if (ctx.actor.role === 'technician' && !isOwn && (await movedSince(tx, visitId, times))) {
        await tellDesk(tx, ctx, visit, action, times, company);
        return { refused: movedAway() };
      }
      authorizeVisit(ctx, 'mark', row.visit, company.zone, times.occurredAt);
      return perform(tx, ctx, company, visit, row, action, times);
    },
  );
  return { visit: answer.visit, isRepeat };
}

function refuseUnreasoned(action: VisitAction): void {
  const needs = action.kind === 'part_done' || action.kind === 'call_off';
  if (needs && action.reason === '') {
    const message = action.kind === 'part_done' ? 'Say why the rest is left.' : 'Say why it is called off.';
    throw unprocessable('reason_needed', message, { fields: { reason: message } });
  }
  if (action.kind === 'trouble' && !action.trouble)
    throw unprocessable('trouble_needed', 'Say what is wrong.', { fields: { trouble: 'Say what is wrong.' } });
}

/** Nobody touches a car whose marks were not put down, unless it is said why. */
function refuseUnseen({ visit }: RunRow, { reason }: VisitAction): void {
  if (visit.walkRound.made >= visit.walkRound.cars || reason !== '') return;
  const message = 'Make the walk-round first, or say why work starts without it.';
  throw unprocessable('walk_round_needed', message, { fields: { reason: message } });
}

async function perform(
  tx: Transaction,
  ctx: Ctx,
  company: CompanySettings,
  visit: Visit,
  row: RunRow,
  action: VisitAction,
  times: StampedTimes,
): Promise<Outcome<{ visit: RunVisitDto }>> {
  const shown = async () => {
    const after = (await readRunRows({ visitId: visit.id }, tx))[0] ?? row;
    return { visit: toRunVisit(after, { now: ctx.now(), zone: company.zone, undoSeconds: company.undoSeconds }) };
  };
  const clash = async (message: string) => {
    if (await isNews(tx, visit, action, times)) await tellDesk(tx, ctx, visit, action, times, company);
    return { refused: new AppError(409, 'clash', message, { hint: { current: (await shown()).visit } }) };
  };

  if (action.kind === 'undo') {
    const refusal = await undoLast(tx, ctx, visit, times, company.undoSeconds);
    if (refusal) return clash(refusal);
  } else if (action.kind === 'trouble') {
    await record(tx, ctx, visit, action, times, visit.progress);
  } else {
    const step = takeStep(visit.progress, action.kind);
    if (!step.ok) return clash(step.message);
    if (action.kind === 'start_work') refuseUnseen(row, action);
    await takeEffect(tx, ctx, visit, action.kind, action, times);
    const eventId = await record(tx, ctx, visit, action, times, step.to);
    await setProgress(tx, visit, step.to, times.occurredAt, action.reason);
    await tellCustomer(tx, ctx, visit, action.kind, eventId);
  }
  const answer = await shown();
  const personIds = answer.visit.crew.map((p) => p.personId);
  if (action.kind !== 'trouble')
    await followProgress(tx, personIds, answer.visit.progress, visit.id, new Date(times.occurredAt));
  hintAfterCommit(tx, ['desk', { personIds }, { jobId: visit.jobId }], 'visit', visit.id, visit.version);
  return { answer };
}

async function takeEffect(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  kind: ProgressAction,
  action: VisitAction,
  times: StampedTimes,
): Promise<void> {
  const { occurredAt } = times;
  if (kind === 'arrive') {
    await clearCrew(tx, visit);
    await recordCrew(tx, visit, occurredAt);
    await recordPresser(tx, visit, ctx.actor.personId);
  }
  if (kind === 'start_work') {
    await refuseUnconfirmed(tx, ctx, visit.id, times);
    await fixChecklists(tx, visit.id);
  }
  if (kind === 'finish') {
    await refuseUnfinished(tx, ctx, visit.id, times);
    await finishLines(tx, visit.id, await openLineIds(tx, visit.id), occurredAt);
  }
  if (kind === 'part_done') {
    const open = await openLineIds(tx, visit.id);
    const finished = open.filter((id) => action.finishedLineIds?.includes(id));
    const rest = open.filter((id) => !finished.includes(id));
    if (rest.length === 0) throw unprocessable('nothing_left', 'Nothing is left. Mark the visit as done instead.');
    await finishLines(tx, visit.id, finished, occurredAt);
    await splitRest(tx, visit, rest, action.remainingMinutes ?? visit.minutes);
  }
}

/** Waits out the undo time; overtaken by then, it is dropped. */
async function tellCustomer(
  tx: Transaction,
  ctx: Ctx,
  { id: visitId, jobId }: Visit,
  action: ProgressAction,
  eventId: string,
): Promise<void> {
  const kind = action === 'set_off' ? 'on_the_way' : action === 'call_off' ? 'called_off' : null;
  if (!kind) return;
  await queueMessage(tx, ctx.now(), { kind, jobId, visitId, causeId: eventId, eventKey: `event:${eventId}` });
}

async function setProgress(tx: Transaction, visit: Visit, to: Progress, at: string, reason: string): Promise<void> {
  await visit.update(
    { progress: to, progressSince: new Date(at), reason, version: visit.version + 1 },
    { transaction: tx },
  );
}

async function record(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  action: VisitAction,
  times: StampedTimes,
  to: Progress,
): Promise<string> {
  const id = uuid();
  await VisitEvent.create(
    {
      id,
      visitId: visit.id,
      kind: action.kind,
      fromProgress: visit.progress,
      toProgress: to,
      userId: ctx.actor.userId,
      personId: ctx.actor.personId,
      ...stampOf(times),
      trouble: action.trouble ?? null,
      reason: action.reason,
    },
    { transaction: tx },
  );
  return id;
}
