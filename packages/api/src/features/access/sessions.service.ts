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

/** Ends a session named by its reference, and the screens it has open. */
export async function endSessionByRef(userId: string, ref: string): Promise<void> {
  const row = (await sessionsOf(userId)).find((session) => refOf(session.sid) === ref);
  if (!row) throw notFound('That session');
  await inTransaction((tx) => run('DELETE FROM session WHERE sid = :sid', { sid: row.sid }, tx));
  hub.signOut(`session:${row.sid}`);
}

/** Ends all of a user's sessions but, where given, the present one. Screens go once it has committed. */
export async function endSessionsOf(tx: Transaction, userId: string, exceptSid = ''): Promise<void> {
  const others = (await sessionsOf(userId, tx)).filter((session) => session.sid !== exceptSid);
  await run('DELETE FROM session WHERE user_id = :userId AND sid <> :exceptSid', { userId, exceptSid }, tx);
  afterCommit(
    tx,
    () => others.forEach((session) => hub.signOut(`session:${session.sid}`)),
    () => undefined,
  );
}
