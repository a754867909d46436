import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { tag } from '@driprail/shared/authz/ability';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import type { EntrySpan } from '@driprail/shared/contracts/hours.contract';
import { stamp } from '@driprail/shared/domain/time/device';
import { isBefore } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { ClockCorrection, ClockEntry, Person } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, conflict, notFound, unprocessable } from '../../http/errors.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { clockOfPerson, crewOf, findEntry } from './clock.queries.ts';
import { isOfLaterDay, switchClock } from './switch-clock.ts';

export interface ClockPress {
  key: string;
  action: 'start' | 'stop';
  kind?: ClockKindName | undefined;
  forPersonId?: string | undefined;
  deviceAt: string;
  offsetMs: number;
}

/**
 * One press on one's own clock, or on that of somebody who rides along, taken once; the latter is marked and audited.
 * @throws 422 without a person behind the login, or for somebody who does not ride along
 */
export async function pressClock(ctx: Ctx, press: ClockPress): Promise<{ clock: ClockStateDto; isRepeat: boolean }> {
  const ownId = ctx.actor.personId;
  if (!ownId) throw unprocessable('no_person', 'This login belongs to nobody on the crew, so it has no clock.');
  authorize(ctx.ability, 'create', tag('ClockEntry', { id: '', personId: ownId }));
  const times = stamp(press.deviceAt, press.offsetMs, ctx.now());
  const personId = press.forPersonId ?? ownId;
  const isOther = personId !== ownId;
  const { answer, isRepeat } = await takeOnce<ClockStateDto>(ctx, press.key, press, async (tx) => {
    if (isOther) await refuseStranger(tx, ownId, personId, new Date(times.occurredAt));
    const running = await ClockEntry.findOne({ where: { personId, endedAt: null }, transaction: tx });
    const clash = clashOf(press.action, running, new Date(times.occurredAt), isOther);
    if (clash) {
      const current = await clockOfPerson(ownId, ctx.now(), tx);
      return { refused: new AppError(409, 'clash', clash, { hint: { current } }) };
    }
    const kind = press.action === 'stop' ? null : (press.kind ?? 'shop');
    const visitId = kind === 'job' || kind === 'travel' ? (running?.visitId ?? null) : null;
    await switchClock(tx, personId, {
      ...{ kind, visitId, at: new Date(times.occurredAt), isCorrected: times.isCorrected },
      ...(isOther && { note: `Pressed by ${ctx.name}` }),
    });
    if (isOther) {
      await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'clock_entry', personId, 'pressed for another', {
        kind: kind ?? 'clock out',
        at: times.occurredAt,
      });
      hintAfterCommit(tx, [{ personIds: [ownId] }], 'clock', ownId);
    }
    return { answer: await clockOfPerson(ownId, ctx.now(), tx) };
  });
  return { clock: answer, isRepeat };
}

/** Why a press can't be taken as it is: what it says stays on the phone until a person decides. */
function clashOf(action: ClockPress['action'], running: ClockEntry | null, at: Date, isOther: boolean): string | null {
  if (running && isOfLaterDay(running, at))
    return 'This press came days late, and the clock runs for another day by now. Ask dispatch to write down that time.';
  if (action === 'start' || running) return null;
  return isOther ? 'That person is not on the clock.' : 'You are not on the clock.';
}

async function refuseStranger(tx: Transaction, ownId: string, personId: string, at: Date): Promise<void> {
  const crew = await crewOf(ownId, at, tx);
  if (crew.some((member) => member.personId === personId)) return;
  throw unprocessable('not_riding', 'Only somebody who rides with you now. The shop can set other clocks.');
}

export type Span = EntrySpan;
export interface EntryFields extends Span {
  reason: string;
}

/** Corrects an entry with a reason; both versions stay on record. Locked weeks are paid by a correction, never changed. */
export function correctEntry(
  ctx: Ctx,
  id: string,
  { version, reason, ...span }: EntryFields & { version: number },
): Promise<ClockEntryDto> {
  return inTransaction(async (tx) => {
    const entry = await ClockEntry.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!entry) throw notFound('That entry');
    authorize(ctx.ability, 'update', tag('ClockEntry', { id, personId: entry.personId }));
    if (entry.version !== version)
      throw conflict('stale', 'Somebody changed this entry meanwhile. Look at the newer one.');
    return applyCorrection(tx, ctx, entry, span, reason);
  });
}

/** Writes a correction inside the caller's transaction; who may was settled before. */
export async function applyCorrection(
  tx: Transaction,
  { actor, now }: Ctx,
  entry: ClockEntry,
  span: Span,
  reason: string,
): Promise<ClockEntryDto> {
  refuseBackwards(span, now());
  const before = spanOf(entry);
  await entry.update({ ...columnsOf(span), isCorrected: true, version: entry.version + 1 }, { transaction: tx });
  await ClockCorrection.create(
    { id: uuid(), entryId: entry.id, userId: actor.userId, at: now(), before, after: span, reason },
    { transaction: tx },
  );
  await audit(tx, { userId: actor.userId, at: now() }, 'clock_entry', entry.id, 'corrected', {
    before,
    after: span,
    reason,
  });
  hintAfterCommit(tx, ['desk', { personIds: [entry.personId] }], 'clock', entry.personId);
  return found(await findEntry(entry.id, now(), tx));
}

export function addEntry(
  ctx: Ctx,
  { personId, visitId, reason, ...span }: EntryFields & { personId: string; visitId: string | null },
): Promise<ClockEntryDto> {
  return inTransaction(async (tx) => {
    authorize(ctx.ability, 'update', tag('ClockEntry', { id: '', personId }));
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    return writeEntry(tx, ctx, { personId, visitId }, span, reason);
  });
}

/** Writes down time that the clock missed, inside the caller's transaction. */
export async function writeEntry(
  tx: Transaction,
  { actor, now }: Ctx,
  whose: { personId: string; visitId: string | null },
  span: Span,
  reason: string,
): Promise<ClockEntryDto> {
  refuseBackwards(span, now());
  const id = uuid();
  await ClockEntry.create({ id, ...whose, ...columnsOf(span), isCorrected: true }, { transaction: tx });
  await ClockCorrection.create(
    { id: uuid(), entryId: id, userId: actor.userId, at: now(), before: null, after: span, reason },
    { transaction: tx },
  );
  await audit(tx, { userId: actor.userId, at: now() }, 'clock_entry', id, 'added', { ...span, reason });
  hintAfterCommit(tx, ['desk', { personIds: [whose.personId] }], 'clock', whose.personId);
  return found(await findEntry(id, now(), tx));
}

/** An entry's stretch of time as it stands. */
export function spanOf(entry: ClockEntry): Span {
  return {
    kind: entry.kind,
    startedAt: entry.startedAt.toISOString(),
    endedAt: entry.endedAt?.toISOString() ?? null,
    isInterrupted: entry.isInterrupted ?? false,
  };
}

function columnsOf({ kind, startedAt, endedAt, isInterrupted }: Span) {
  return { kind, startedAt: new Date(startedAt), endedAt: endedAt ? new Date(endedAt) : null, isInterrupted };
}

/** @throws 422 at the field when a stretch of time ends before it starts, or lies ahead */
export function refuseBackwards(
  { startedAt, endedAt }: { startedAt: string; endedAt: string | null },
  now: Date,
): void {
  if (endedAt && !isBefore(startedAt, endedAt)) {
    throw unprocessable('backwards', 'The end must be after the start.', {
      fields: { endedAt: 'The end must be after the start.' },
    });
  }
  if (isBefore(now.toISOString(), endedAt ?? startedAt)) {
    throw unprocessable('future', 'That time has not come yet.', {
      fields: { [endedAt ? 'endedAt' : 'startedAt']: 'That time has not come yet.' },
    });
  }
}

function found(entry: ClockEntryDto | null): ClockEntryDto {
  if (!entry) throw notFound('That entry');
  return entry;
}
