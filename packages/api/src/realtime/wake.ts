import type { Transaction } from 'sequelize';
import { afterCommit } from '../db/sequelize.ts';

type Waker = (personIds: string[], times: string[]) => Promise<void>;
let waker: Waker | null = null;

/** Says who wakes phones; null stops it. */
export function wakeWith(next: Waker | null): void {
  waker = next;
}

/**
 * Wakes the phones of people whose plan changed, once it has committed and if their app is closed. Like a hint it may
 * be lost: the run sheet has the change anyway.
 * @param times when the work was and is planned; a change of a far day wakes nobody
 */
export function wakeAfterCommit(
  tx: Transaction,
  personIds: readonly string[],
  times: readonly (string | null)[],
): void {
  const ids = [...new Set(personIds)];
  if (ids.length === 0) return;
  const known = times.filter((time) => time !== null);
  afterCommit(
    tx,
    () => void waker?.(ids, known).catch(() => undefined),
    () => undefined,
  );
}
