import { v7 as uuid } from 'uuid';
import { tag } from '@driprail/shared/authz/ability';
import type { ClockEntryDto, ClockKindName, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
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
import { clockOfPerson, findEntry } from './clock.queries.ts';
import { switchClock } from './switch-clock.ts';

export interface ClockPress {
  key: string;
  action: 'start' | 'stop';
  kind?: ClockKindName | undefined;
  deviceAt: string;
  offsetMs: number;
}

/** One press on one's own clock, taken once. @throws 422 without a person behind the login */
export async function pressClock(ctx: Ctx, press: ClockPress): Promise<{ clock: ClockStateDto; isRepeat: boolean }> {
  const personId = ctx.actor.personId;
  if (!personId) throw unprocessable('no_person', 'This login belongs to nobody on the crew, so it has no clock.');
  authorize(ctx.ability, 'create', tag('ClockEntry', { id: '', personId }));
  const times = stamp(press.deviceAt, press.offsetMs, ctx.now());
  const { answer, isRepeat } = await takeOnce<ClockStateDto>(ctx, press.key, press, async (tx) => {
    const running = await ClockEntry.findOne({ where: { personId, endedAt: null }, transaction: tx });
    if (press.action === 'stop' && !running) {
      return {
        refused: new AppError(409, 'clash', 'You are not on the clock.', {
          hint: { current: await clockOfPerson(personId, ctx.now(), tx) },
        }),
      };
    }
    const kind = press.action === 'stop' ? null : (press.kind ?? 'shop');
    const visitId = kind === 'job' || kind === 'travel' ? (running?.visitId ?? null) : null;
    await switchClock(tx, personId, { kind, visitId, at: new Date(times.occurredAt), isCorrected: times.isCorrected });
    return { answer: await clockOfPerson(personId, ctx.now(), tx) };
  });
  return { clock: answer, isRepeat };
}

export interface EntryFields {
  kind: ClockKindName;
  startedAt: string;
  endedAt: string | null;
  isInterrupted: boolean;
  reason: string;
}

/** Corrects an entry with a reason; both versions stay on record. Locked weeks are paid by a correction, never changed. */
export function correctEntry(
  { actor, ability, now }: Ctx,
  id: string,
  { version, reason, ...fields }: EntryFields & { version: number },
): Promise<ClockEntryDto> {
  return inTransaction(async (tx) => {
    const entry = await ClockEntry.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!entry) throw notFound('That entry');
    authorize(ability, 'update', tag('ClockEntry', { id, personId: entry.personId }));
    if (entry.version !== version)
      throw conflict('stale', 'Somebody changed this entry meanwhile. Look at the newer one.');
    refuseBackwards(fields, now());
    const before = {
      kind: entry.kind,
      startedAt: entry.startedAt,
      endedAt: entry.endedAt,
      isInterrupted: entry.isInterrupted,
    };
    await entry.update(
      {
        ...fields,
        startedAt: new Date(fields.startedAt),
        endedAt: fields.endedAt ? new Date(fields.endedAt) : null,
        isCorrected: true,
        version: version + 1,
      },
      { transaction: tx },
    );
    await ClockCorrection.create(
      { id: uuid(), entryId: id, userId: actor.userId, at: now(), before, after: fields, reason },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'clock_entry', id, 'corrected', {
      before,
      after: fields,
      reason,
    });
    hintAfterCommit(tx, ['desk', { personIds: [entry.personId] }], 'clock', entry.personId);
    return found(await findEntry(id, now(), tx));
  });
}

export function addEntry(
  { actor, ability, now }: Ctx,
  { personId, visitId, reason, ...fields }: EntryFields & { personId: string; visitId: string | null },
): Promise<ClockEntryDto> {
  return inTransaction(async (tx) => {
    authorize(ability, 'update', tag('ClockEntry', { id: '', personId }));
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    refuseBackwards(fields, now());
    const id = uuid();
    await ClockEntry.create(
      {
        id,
        personId,
        visitId,
        kind: fields.kind,
        startedAt: new Date(fields.startedAt),
        endedAt: fields.endedAt ? new Date(fields.endedAt) : null,
        isInterrupted: fields.isInterrupted,
        isCorrected: true,
      },
      { transaction: tx },
    );
    await ClockCorrection.create(
      { id: uuid(), entryId: id, userId: actor.userId, at: now(), before: null, after: fields, reason },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'clock_entry', id, 'added', { ...fields, reason });
    hintAfterCommit(tx, ['desk', { personIds: [personId] }], 'clock', personId);
    return found(await findEntry(id, now(), tx));
  });
}

function refuseBackwards({ startedAt, endedAt }: { startedAt: string; endedAt: string | null }, now: Date): void {
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
