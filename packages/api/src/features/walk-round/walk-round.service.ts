import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { WalkRoundBody, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { lackingIn } from '@driprail/shared/domain/walk-round/lacking';
import type { Mark } from '@driprail/shared/domain/walk-round/marks';
import { withCarried } from '@driprail/shared/domain/walk-round/marks';
import { stampOf } from '../../db/models/columns.ts';
import { WalkMark, WalkRound } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, unprocessable } from '../../http/errors.ts';
import type { Outcome } from '../../http/once.ts';
import { takeOnce } from '../../http/once.ts';
import type { MarkedVisit } from './marked-visit.ts';
import { answered, markedVisit } from './marked-visit.ts';

/**
 * Finishes one car's walk-round, taken once; it may be finished anew until work starts. One that was finished on a phone
 * before anybody knew that work had begun is kept as late.
 * @throws 404, 403, 409 when the visit is over or the walk-round is frozen, 422 for what it lacks
 */
export async function finishWalkRound(
  ctx: Ctx,
  visitId: string,
  body: WalkRoundBody,
): Promise<{ sheet: WalkSheetDto; isRepeat: boolean }> {
  const { answer, isRepeat } = await takeOnce<{ sheet: WalkSheetDto }>(ctx, body.key, { visitId, ...body }, (tx) =>
    finish(tx, ctx, visitId, body),
  );
  return { sheet: answer.sheet, isRepeat };
}

async function finish(
  tx: Transaction,
  ctx: Ctx,
  visitId: string,
  body: WalkRoundBody,
): Promise<Outcome<{ sheet: WalkSheetDto }>> {
  const marked = await markedVisit(tx, ctx, visitId, body);
  const { visit, sheet, car } = marked;
  const clash = (message: string) => ({ refused: new AppError(409, 'clash', message, { hint: { current: sheet } }) });
  if (visit.progress === 'unplaced' || visit.progress === 'called_off')
    return clash('The visit was called off or taken back to Unplaced meanwhile. Ask dispatch.');
  if (marked.hasBegun && car.walkRound)
    return clash('Work has begun, so the walk-round stays as it is. Add what you see now instead.');
  const fields = lackingIn(body, car.photoSet);
  const [lacking] = Object.values(fields);
  if (lacking) throw unprocessable('walk_round_lacking', lacking, { fields });
  await writeRound(tx, ctx, marked, body);
  await writeMarks(tx, ctx, marked, body.marks);
  const details = { vehicleId: body.vehicleId, marks: body.marks.length, isLate: marked.hasBegun };
  return { answer: await answered(tx, ctx, marked, 'walk-round finished', details) };
}

async function writeRound(
  tx: Transaction,
  { actor }: Ctx,
  { visit, car, hasBegun, times }: MarkedVisit,
  body: WalkRoundBody,
): Promise<void> {
  const { key: _key, deviceAt: _device, offsetMs: _offset, marks: _marks, ...facts } = body;
  const row = {
    ...facts,
    isLate: hasBegun,
    userId: actor.userId,
    ...stampOf(times),
  };
  if (car.walkRound) await WalkRound.update(row, { where: { id: car.walkRound.id }, transaction: tx });
  else await WalkRound.create({ id: uuid(), visitId: visit.id, ...row }, { transaction: tx });
}

async function writeMarks(
  tx: Transaction,
  ctx: Ctx,
  { visit, car, hasBegun, times }: MarkedVisit,
  marks: Mark[],
): Promise<void> {
  const where = { visitId: visit.id, vehicleId: car.vehicleId };
  await WalkMark.destroy({ where: { ...where, isAddition: false }, transaction: tx });
  // A mark may only answer one of this car's last walk-round.
  const own = marks.map((mark) =>
    car.lastMarks.some((last) => last.id === mark.carriedFrom) ? mark : { ...mark, carriedFrom: null, answer: null },
  );
  const rows = withCarried(car.lastMarks, own, uuid).map((mark, position) => ({
    ...markRow(mark, ctx, times),
    ...where,
    position,
    isAddition: hasBegun,
  }));
  await WalkMark.bulkCreate(rows, { transaction: tx });
}

/** A mark's own columns; whose and where among the others is added by the caller. */
export function markRow(
  { id, x, y, place, kind, size, note, carriedFrom, answer }: Mark,
  { actor }: Ctx,
  times: StampedTimes,
) {
  return {
    ...{ id, x, y, place, kind, size, note, carriedFrom, answer },
    userId: actor.userId,
    receivedAt: new Date(times.receivedAt),
    occurredAt: new Date(times.occurredAt),
  };
}
