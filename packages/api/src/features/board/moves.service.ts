import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { tag } from '@driprail/shared/authz/ability';
import { boardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { factsOf, plannedOf } from '@driprail/shared/domain/board/facts';
import { judgeMoves } from '@driprail/shared/domain/board/fit';
import type { Judgement } from '@driprail/shared/domain/board/fit';
import type { PlannedVisit } from '@driprail/shared/domain/board/plan';
import { dayOf, minutesBetween } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { rangeOf } from '../../db/models/columns.ts';
import { Visit, VisitEvent } from '../../db/models/index.ts';
import { inTransaction, run } from '../../db/sequelize.ts';
import { authorize } from '../../authz/authorize.ts';
import type { Ctx, Doer } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { wakeAfterCommit } from '../../realtime/wake.ts';
import { readBoard, readVisits } from './board.queries.ts';
import { wordsOfPlan } from './plan-words.ts';
import { ownStop } from './visits.service.ts';

export interface MoveRequest {
  visitId: string;
  planVersion: number;
  vanId: string | null;
  from: string | null;
  to: string | null;
  stopId?: string | undefined;
}
export interface Acceptance {
  visitId: string;
  key: string;
  reason: string;
}

/**
 * Places, moves, resizes or unplaces visits: all of the list or nothing.
 * @throws 409 with the newer state when a plan changed meanwhile, 422 for refusals and for warnings that need a reason
 */
export function moveVisits(ctx: Ctx, moves: MoveRequest[], accept: Acceptance[]): Promise<VisitDto[]> {
  return inTransaction(async (tx) => {
    const ids = moves.map((move) => move.visitId);
    const rows = await Visit.findAll({
      where: { id: ids },
      order: [['id', 'ASC']],
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    });
    const before = new Map((await readVisits({ ids }, tx)).map((visit) => [visit.id, visit]));
    for (const move of moves) refuseStale(ctx, move, before.get(move.visitId));

    const judgement = await judge(tx, ctx, moves, before);
    if (judgement.refusals[0])
      throw unprocessable('refused', judgement.refusals[0].message, { hint: { refusals: judgement.refusals } });
    const { reasonKinds, zone } = await companyOf(tx);
    const unexplained = judgement.warnings.filter(
      (w) =>
        reasonKinds.includes(w.code) &&
        !before.get(w.visitId)?.accepted.some((a) => a.key === w.key) &&
        !accept.some((a) => a.visitId === w.visitId && a.key === w.key),
    );
    if (unexplained[0])
      throw unprocessable('needs_reason', unexplained[0].message, { hint: { warnings: unexplained } });

    await run('SET CONSTRAINTS visits_van_at_one_stop DEFERRED', {}, tx);
    for (const move of moves) {
      const visit = rows.find((row) => row.id === move.visitId);
      const was = before.get(move.visitId);
      if (visit && was) await savePlan(tx, ctx, visit, was, move, { accept, judgement, zone });
    }
    await run('SET CONSTRAINTS visits_van_at_one_stop IMMEDIATE', {}, tx);
    return tell(tx, ids, before);
  });
}

function refuseStale({ ability }: Ctx, move: MoveRequest, visit: VisitDto | undefined): asserts visit is VisitDto {
  if (!visit) throw notFound('That visit');
  authorize(
    ability,
    'plan',
    tag('Visit', { id: visit.id, crewPersonIds: visit.crew.map((p) => p.personId), day: null, daysFromToday: 0 }),
  );
  if (visit.planVersion !== move.planVersion) {
    throw conflict(
      'stale_plan',
      `${visit.customerName} was moved meanwhile. The board shows the newer plan; move it again if it still should.`,
      visit,
    );
  }
}

/** Judges each target day's moves on that day's board; what leaves the board is judged on the day it leaves. */
export async function judge(
  tx: Transaction,
  { now }: Doer,
  moves: MoveRequest[],
  before: Map<string, VisitDto>,
): Promise<Judgement> {
  const { zone } = await companyOf(tx);
  const byDay = new Map<string, MoveRequest[]>();
  for (const move of moves) {
    const from = move.vanId && move.from ? move.from : before.get(move.visitId)?.from;
    if (!from) continue;
    const day = dayOf(from, zone);
    byDay.set(day, [...(byDay.get(day) ?? []), move]);
  }
  const all: Judgement = { refusals: [], warnings: [], after: new Map() };
  const planned = new Map([...before].map(([id, visit]) => [id, plannedOf(visit)] as const));
  for (const [day, list] of byDay) {
    const facts = factsOf(boardDto.parse(await readBoard(day, now(), tx)));
    const found = judgeMoves(facts, subset(planned, list), list);
    all.refusals.push(...found.refusals);
    all.warnings.push(...found.warnings);
    for (const { visitId } of list) {
      const visit = found.after.get(visitId);
      if (visit) all.after.set(visitId, visit);
    }
  }
  return all;
}

function subset(planned: Map<string, PlannedVisit>, moves: MoveRequest[]): Map<string, PlannedVisit> {
  return new Map([...planned].filter(([id]) => moves.some((move) => move.visitId === id)));
}

interface Around {
  accept: Acceptance[];
  judgement: Judgement;
  zone: string;
}

export async function savePlan(
  tx: Transaction,
  ctx: Doer,
  visit: Visit,
  was: VisitDto,
  move: MoveRequest,
  around: Around,
): Promise<void> {
  const at = ctx.now();
  const isPlaced = move.vanId !== null && move.from !== null && move.to !== null;
  const isNewStop = !isPlaced && (await Visit.count({ where: { stopId: visit.stopId }, transaction: tx })) > 1;
  const stopId = isNewStop
    ? await ownStop(tx, was.addressId)
    : (around.judgement.after.get(visit.id)?.stopId ?? visit.stopId);
  const progress = !isPlaced
    ? 'unplaced'
    : visit.progress === 'on_the_way' && move.vanId === visit.vanId
      ? 'on_the_way'
      : 'placed';
  const reasons = around.accept
    .filter((a) => a.visitId === visit.id)
    .flatMap((a) => {
      const code = around.judgement.warnings.find((w) => w.visitId === visit.id && w.key === a.key)?.code;
      return code ? [{ key: a.key, code, reason: a.reason, by: ctx.name, at: at.toISOString() }] : [];
    });
  const fromProgress = visit.progress;
  await visit.update(
    {
      vanId: isPlaced ? move.vanId : null,
      planned: isPlaced && move.from && move.to ? rangeOf(move.from, move.to) : null,
      minutes: isPlaced && move.from && move.to ? minutesBetween(move.from, move.to) : visit.minutes,
      stopId,
      progress,
      progressSince: progress === fromProgress ? visit.progressSince : at,
      accepted: [...visit.accepted.filter((a) => !reasons.some((r) => r.key === a.key)), ...reasons],
      planVersion: visit.planVersion + 1,
      version: visit.version + 1,
    },
    { transaction: tx },
  );
  await VisitEvent.create(
    {
      id: uuid(),
      visitId: visit.id,
      kind: 'plan',
      fromProgress,
      toProgress: progress,
      userId: ctx.actor.userId,
      deviceAt: at,
      receivedAt: at,
      occurredAt: at,
      reason: await wordsOfPlan(tx, move, around.zone),
    },
    { transaction: tx },
  );
}

/** Every open board and the phones of the crews before and after hear of it. */
export async function tell(tx: Transaction, ids: string[], before: Map<string, VisitDto>): Promise<VisitDto[]> {
  const after = await readVisits({ ids }, tx);
  for (const visit of after) {
    const personIds = [...(before.get(visit.id)?.crew ?? []), ...visit.crew].map((p) => p.personId);
    hintAfterCommit(tx, ['desk', { personIds: [...new Set(personIds)] }], 'visit', visit.id, visit.version);
    wakeAfterCommit(tx, personIds, [visit.from, before.get(visit.id)?.from ?? null]);
  }
  return after;
}
