import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { afterCommit, inTransaction, run } from '../../db/sequelize.ts';
import { notFound } from '../../http/errors.ts';
import { hub } from '../../realtime/hub.ts';
import { sessionsOf } from './session.queries.ts';

/** People see a reference, never the secret session id. */
export function refOf(sid: string): string {
  return createHash('sha256').update(sid).digest('base64url').slice(0, 22);
}

/**
 * What is left of a session that somebody ended on purpose, until it would have expired: nobody is signed in by it, and
 * the device that still holds it is told to forget what it kept.
 */
const ended = `UPDATE session SET sess = json_build_object('cookie', sess -> 'cookie', 'endedFor', sess -> 'passport' ->> 'user')`;

/** Ends a session named by its reference, and the screens it has open; its device forgets what it kept. */
export async function endSessionByRef(userId: string, ref: string): Promise<void> {
  const row = (await sessionsOf(userId)).find((session) => refOf(session.sid) === ref);
  if (!row) throw notFound('That session');
  await inTransaction((tx) => run(`${ended} WHERE sid = :sid`, { sid: row.sid }, tx));
  hub.signOut(`session:${row.sid}`);
}

/**
 * Ends all of a user's sessions but, where given, the present one. Screens go once it has committed.
 * @param options.forgets the devices are to forget what they kept, as lost ones
 */
export async function endSessionsOf(
  tx: Transaction,
  userId: string,
  { exceptSid = '', forgets = false }: { exceptSid?: string; forgets?: boolean } = {},
): Promise<void> {
  const others = (await sessionsOf(userId, tx)).filter((session) => session.sid !== exceptSid);
  await run(
    `${forgets ? ended : 'DELETE FROM session'} WHERE user_id = :userId AND sid <> :exceptSid`,
    { userId, exceptSid },
    tx,
  );
  afterCommit(
    tx,
    () => others.forEach((session) => hub.signOut(`session:${session.sid}`)),
    () => undefined,
  );
}
