import { v7 as uuid } from 'uuid';
import { addMinutes } from '@driprail/shared/domain/time/zone';
import { inTransaction, run } from '../../db/sequelize.ts';
import { conflict } from '../../http/errors.ts';
import type { AskedWork } from './ask.ts';
import { HOLD_MINUTES, dropOverHolds, takeTurn } from './hold-rows.ts';
import { findOpenPlace } from './windows.queries.ts';

export interface Hold {
  id: string;
  from: string;
  to: string;
  expiresAt: string;
}

/**
 * Keeps a place on a van for the window that starts at `from`.
 * @throws 409 when it has just been taken
 */
export function holdWindow(
  asked: AskedWork,
  { from, insteadOf }: { from: string; insteadOf: string | null },
  now: Date,
): Promise<Hold> {
  return inTransaction(async (tx) => {
    await takeTurn(tx);
    await dropOverHolds(tx, now);
    if (insteadOf) await run('DELETE FROM booking_holds WHERE id = :insteadOf', { insteadOf }, tx);
    const found = await findOpenPlace(tx, asked.work, from, now);
    if (!found) throw conflict('window_gone', 'That time has just been taken. Choose another one.');
    const { window, place } = found;
    const id = uuid();
    const expiresAt = addMinutes(now.toISOString(), HOLD_MINUTES);
    await run(
      `INSERT INTO booking_holds (id, van_id, during, window_from, window_to, asked, lat, lng, expires_at, created_at)
       VALUES (:id, :vanId, tstzrange(:placeFrom, :placeTo), :from, :to, :asked, :lat, :lng, :expiresAt, :now)`,
      {
        ...{ id, vanId: place.vanId, placeFrom: place.from, placeTo: place.to, from: window.from, to: window.to },
        ...{ asked: JSON.stringify(asked), lat: asked.work.place?.lat ?? null, lng: asked.work.place?.lng ?? null },
        ...{ expiresAt, now },
      },
      tx,
    );
    return { id, ...window, expiresAt };
  });
}

/** What nobody finished goes, with what was typed. */
export function removeOverHolds(now: Date): Promise<void> {
  return inTransaction((tx) => dropOverHolds(tx, now));
}
