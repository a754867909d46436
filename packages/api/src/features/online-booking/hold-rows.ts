import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { run, select } from '../../db/sequelize.ts';
import { conflict } from '../../http/errors.ts';
import type { AskedWork } from './ask.ts';

export const HOLD_MINUTES = 10;

/** What a stranger said of themselves, until it is booked or let go. */
export interface Contact {
  name: string;
  phone: string;
  vehicle: string;
  notes: string;
  policyVersion: number;
  acceptedAt: string;
}

export interface HoldRow {
  id: string;
  from: string;
  to: string;
  asked: AskedWork;
  email: string | null;
  contact: Contact | null;
  codeHash: string | null;
  tries: number;
  codesSent: number;
}

/** One at a time reckons which places are left; whoever comes second sees what the first took. */
export function takeTurn(tx: Transaction): Promise<void> {
  return run("SELECT pg_advisory_xact_lock(hashtext('online-booking'))", {}, tx);
}

/** Holds whose time is over go, with what was typed. */
export function dropOverHolds(tx: Transaction, now: Date): Promise<void> {
  return run('DELETE FROM booking_holds WHERE expires_at <= :now', { now }, tx);
}

/** A hold that still stands, locked. @throws 409 when its time is over */
export async function lockHold(tx: Transaction, id: string, now: Date): Promise<HoldRow> {
  const [row] = await select<HoldRow>(
    `SELECT id, to_json(window_from) #>> '{}' AS "from", to_json(window_to) #>> '{}' AS "to", asked, email, contact,
            code_hash AS "codeHash", tries, codes_sent AS "codesSent"
       FROM booking_holds WHERE id = :id AND expires_at > :now FOR UPDATE`,
    { id, now },
    tx,
  );
  if (!row)
    throw conflict(
      'hold_over',
      'The time was kept for ten minutes and is let go now. Choose a time again; what you filled in is still here.',
    );
  return row;
}

export function codeHash(holdId: string, code: string): string {
  return createHash('sha256').update(`${holdId}:${code}`).digest('hex');
}
