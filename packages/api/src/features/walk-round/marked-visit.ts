import type { Transaction } from 'sequelize';
import type { Progress } from '@driprail/shared/domain/board/progress';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { WalkCarDto, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { stamp } from '@driprail/shared/domain/time/device';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { authorizeVisit, lockVisit, readVisits } from '../board/index.ts';
import { readWalkSheet } from './walk-sheet.queries.ts';

export interface MarkedVisit {
  visit: VisitDto;
  sheet: WalkSheetDto;
  car: WalkCarDto;
  hasBegun: boolean;
  /** When the press was made. */
  times: StampedTimes;
}

export const hasBegun = (progress: Progress) =>
  progress === 'working' || progress === 'part_done' || progress === 'done';

/**
 * The visit of a press, locked against Start work, and the car it names.
 * @throws 404 for what one may not know, 403 by row, 422 for a car that the visit does not have
 */
export async function markedVisit(
  tx: Transaction,
  ctx: Ctx,
  visitId: string,
  { vehicleId, deviceAt, offsetMs }: { vehicleId: string | null; deviceAt: string; offsetMs: number },
): Promise<MarkedVisit> {
  const locked = await lockVisit(tx, visitId);
  const [visit] = await readVisits({ ids: [visitId] }, tx);
  const sheet = await readWalkSheet(visitId, tx);
  if (!locked || !visit || !sheet) throw notFound('That visit');
  const times = stamp(deviceAt, offsetMs, ctx.now());
  authorizeVisit(ctx, 'mark', visit, (await companyOf(tx)).zone, times.occurredAt);
  const car = sheet.cars.find((other) => other.vehicleId === vehicleId);
  if (!car) throw unprocessable('no_such_car', 'That car is not on this visit any more. Ask dispatch.');
  return { visit, sheet, car, hasBegun: hasBegun(visit.progress), times };
}

/** Leaves the trail, tells open screens, and answers the sheet as it is now. */
export async function answered(
  tx: Transaction,
  { actor, now }: Ctx,
  { visit }: MarkedVisit,
  action: string,
  details: Record<string, unknown>,
): Promise<{ sheet: WalkSheetDto }> {
  await audit(tx, { userId: actor.userId, at: now() }, 'visit', visit.id, action, details);
  hintAfterCommit(tx, ['desk', { personIds: visit.crew.map((p) => p.personId) }], 'visit', visit.id, visit.version);
  const sheet = await readWalkSheet(visit.id, tx);
  if (!sheet) throw notFound('That visit');
  return { sheet };
}
