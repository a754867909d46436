import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { WalkAdditionBody, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { stampOf } from '../../db/models/columns.ts';
import { WalkLook, WalkMark } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError } from '../../http/errors.ts';
import type { Outcome } from '../../http/once.ts';
import { takeOnce } from '../../http/once.ts';
import { answered, markedVisit } from './marked-visit.ts';
import { markRow } from './walk-round.service.ts';

/**
 * A dated row beside a frozen walk-round: a mark that was seen later, or what the second look found. Taken once.
 * @throws 404, 403, 409 when nothing waits for a second look
 */
export async function addToWalkRound(
  ctx: Ctx,
  visitId: string,
  body: WalkAdditionBody,
): Promise<{ sheet: WalkSheetDto; isRepeat: boolean }> {
  const { answer, isRepeat } = await takeOnce<{ sheet: WalkSheetDto }>(ctx, body.key, { visitId, ...body }, (tx) =>
    add(tx, ctx, visitId, body),
  );
  return { sheet: answer.sheet, isRepeat };
}

async function add(
  tx: Transaction,
  ctx: Ctx,
  visitId: string,
  body: WalkAdditionBody,
): Promise<Outcome<{ sheet: WalkSheetDto }>> {
  const marked = await markedVisit(tx, ctx, visitId, body);
  const { sheet, car, times } = marked;
  const where = { visitId, vehicleId: body.vehicleId };
  if (body.kind === 'mark') {
    const mark = { ...body.mark, carriedFrom: null, answer: null };
    const row = { ...markRow(mark, ctx, times), ...where, position: 0, isAddition: true };
    await WalkMark.create(row, { transaction: tx });
    return { answer: await answered(tx, ctx, marked, 'mark added', { vehicleId: body.vehicleId, kind: mark.kind }) };
  }
  if (!car.walkRound?.isTooDirty) {
    const message = 'No second look waits for this car.';
    return { refused: new AppError(409, 'clash', message, { hint: { current: sheet } }) };
  }
  await WalkLook.create(
    {
      id: uuid(),
      ...where,
      outcome: body.outcome,
      note: body.note,
      userId: ctx.actor.userId,
      ...stampOf(times),
    },
    { transaction: tx },
  );
  const details = { vehicleId: body.vehicleId, outcome: body.outcome };
  return { answer: await answered(tx, ctx, marked, 'second look answered', details) };
}
