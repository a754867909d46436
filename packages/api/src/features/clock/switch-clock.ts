import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { ClockEntry } from '../../db/models/index.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

export interface ClockSwitch {
  /** Null ends the time on the clock. */
  kind: ClockKindName | null;
  visitId: string | null;
  at: Date;
  isCorrected?: boolean;
  /** Who pressed, when it was not the person: stays with the entry. */
  note?: string;
}

/** Ends what runs on a person's clock and starts the next kind of time, to the second. */
export async function switchClock(
  tx: Transaction,
  personId: string,
  { kind, visitId, at, isCorrected = false, note }: ClockSwitch,
): Promise<void> {
  const open = await ClockEntry.findOne({ where: { personId, endedAt: null }, transaction: tx, lock: tx.LOCK.UPDATE });
  if (open && open.kind === kind && open.visitId === visitId) return;
  if (open) {
    // A press that arrives late may lie before the entry it ends: then that entry lasted no time.
    const endedAt = at < open.startedAt ? open.startedAt : at;
    const ending = note !== undefined && kind === null ? { note } : {};
    await open.update({ endedAt, version: open.version + 1, ...ending }, { transaction: tx });
  }
  if (kind) {
    const startedAt = open && at < open.startedAt ? open.startedAt : at;
    await ClockEntry.create(
      { id: uuid(), personId, kind, visitId, startedAt, isCorrected, note: note ?? '' },
      { transaction: tx },
    );
  }
  hintAfterCommit(tx, ['desk', { personIds: [personId] }], 'clock', personId);
}

const kindByProgress: Partial<Record<Progress, ClockKindName>> = {
  on_the_way: 'travel',
  on_site: 'job',
  working: 'job',
  done: 'waiting',
  part_done: 'waiting',
};

/** What began longer after a press than this is another day's time (common practice, no source). */
const OTHER_DAY_MS = 14 * 3_600_000;

/** Whether what runs is of another day than a press that arrives late. */
export function isOfLaterDay(running: { startedAt: Date }, at: Date): boolean {
  return running.startedAt.getTime() - at.getTime() >= OTHER_DAY_MS;
}

/**
 * Time follows a visit's progress for those on the clock; a meal break is theirs to end. A press that comes days late
 * changes nothing of what runs today.
 */
export async function followProgress(
  tx: Transaction,
  personIds: string[],
  progress: Progress,
  visitId: string,
  at: Date,
): Promise<void> {
  const kind = kindByProgress[progress];
  if (!kind) return;
  const open = await ClockEntry.findAll({ where: { personId: personIds, endedAt: null }, transaction: tx });
  const ofThatDay = open.filter((entry) => !isOfLaterDay(entry, at));
  for (const entry of ofThatDay.filter((e) => e.kind !== 'meal_break')) {
    await switchClock(tx, entry.personId, { kind, visitId: kind === 'waiting' ? null : visitId, at });
  }
}
