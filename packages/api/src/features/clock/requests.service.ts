import { v7 as uuid } from 'uuid';
import type { Transaction } from 'sequelize';
import { tag } from '@driprail/shared/authz/ability';
import type { ClockRequestDto, EntrySpan } from '@driprail/shared/contracts/hours.contract';
import { audit } from '../../db/audit.ts';
import { ClockEntry, ClockRequest, Person } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, forbidden, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { applyCorrection, refuseBackwards, spanOf, writeEntry } from './clock.service.ts';
import { listRequests } from './requests.queries.ts';

export interface Ask {
  personId: string;
  entryId: string | null;
  after: EntrySpan;
  reason: string;
}

/** One's own requests, or everybody's for the desk, each with whether the asker may decide it. */
export async function readRequests(ctx: Ctx): Promise<ClockRequestDto[]> {
  const isDesk = ctx.ability.can('update', 'ClockEntry');
  if (!isDesk && !ctx.actor.personId) return [];
  const rows = await listRequests({ personId: isDesk ? null : ctx.actor.personId });
  return rows.map((row) => ({ ...row, isMine: mayDecide(ctx, row) }));
}

/** Asks for a change of one's own hours, or proposes one to a person. Nothing changes before the other side agrees. */
export function askChange(ctx: Ctx, { personId, entryId, after, reason }: Ask): Promise<ClockRequestDto> {
  return inTransaction(async (tx) => {
    const isOwn = personId === ctx.actor.personId;
    if (!isOwn && ctx.ability.cannot('update', tag('ClockEntry', { id: '', personId }))) throw notFound('That person');
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    const entry = entryId ? await ClockEntry.findByPk(entryId, { transaction: tx }) : null;
    if (entryId && entry?.personId !== personId) throw notFound('That entry');
    refuseBackwards(after, ctx.now());
    if (entryId && (await ClockRequest.findOne({ where: { entryId, state: 'open' }, transaction: tx }))) {
      throw conflict('asked', 'A change of this entry waits already. Decide that one first.');
    }
    const row = await ClockRequest.create(
      {
        id: uuid(),
        personId,
        entryId,
        direction: isOwn ? 'asked' : 'proposed',
        userId: ctx.actor.userId,
        at: ctx.now(),
        before: entry ? spanOf(entry) : null,
        after,
        reason,
      },
      { transaction: tx },
    );
    await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'clock_request', row.id, row.direction, {
      entryId,
      after,
      reason,
    });
    return told(tx, ctx, row);
  });
}

/** The other side agrees or refuses, once; agreed, the entry is corrected in the same transaction. */
export function decideChange(ctx: Ctx, id: string, isAgreed: boolean, answer: string): Promise<ClockRequestDto> {
  return inTransaction(async (tx) => {
    const row = await ClockRequest.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    const isOwn = row?.personId === ctx.actor.personId;
    if (!row || (!isOwn && ctx.ability.cannot('update', 'ClockEntry'))) throw notFound('That request');
    if (row.state !== 'open') throw conflict('decided', 'Somebody decided this already.');
    if (!mayDecide(ctx, row)) throw forbidden('The other side decides this one.');
    if (isAgreed) await carryOut(tx, ctx, row);
    await row.update(
      { state: isAgreed ? 'agreed' : 'refused', decidedBy: ctx.actor.userId, decidedAt: ctx.now(), answer },
      { transaction: tx },
    );
    await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'clock_request', id, row.state ?? 'open', { answer });
    return told(tx, ctx, row);
  });
}

/** What a person asked is decided at the desk, by somebody else; what the desk proposed is that person's to decide. */
function mayDecide(
  { actor, ability }: Ctx,
  { personId, direction }: { personId: string; direction: 'asked' | 'proposed' },
): boolean {
  const isOwn = personId === actor.personId;
  if (direction === 'proposed') return isOwn;
  return ability.can('update', 'ClockEntry') && (!isOwn || actor.role === 'owner');
}

async function carryOut(tx: Transaction, ctx: Ctx, row: ClockRequest): Promise<void> {
  if (!row.entryId) {
    await writeEntry(tx, ctx, { personId: row.personId, visitId: null }, row.after, row.reason);
    return;
  }
  const entry = await ClockEntry.findByPk(row.entryId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
  if (JSON.stringify(spanOf(entry)) !== JSON.stringify(orderedSpan(row.before as EntrySpan))) {
    throw unprocessable('moved_on', 'This entry was changed since. Refuse this and ask again.');
  }
  await applyCorrection(tx, ctx, entry, row.after, row.reason);
}

/** JSON in the database has no order of keys. */
function orderedSpan({ kind, startedAt, endedAt, isInterrupted }: EntrySpan): EntrySpan {
  return { kind, startedAt, endedAt, isInterrupted };
}

async function told(tx: Transaction, ctx: Ctx, row: ClockRequest): Promise<ClockRequestDto> {
  hintAfterCommit(tx, ['desk', { personIds: [row.personId] }], 'clock', row.personId);
  const [dto] = await listRequests({ id: row.id }, tx);
  if (!dto) throw notFound('That request');
  return { ...dto, isMine: mayDecide(ctx, dto) };
}
