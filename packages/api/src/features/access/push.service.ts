import { isIP } from 'node:net';
import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { NEAR_DAYS } from '@driprail/shared/authz/ability';
import { PushSubscription } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';
import { sendPush } from '../../integrations/push/index.ts';
import type { PushKeys, PushTarget } from '../../integrations/push/index.ts';
import { hub } from '../../realtime/hub.ts';

const DAY_MS = 86_400_000;

export interface PushRules {
  keys: PushKeys;
  /** A push service on this machine; for tests only. */
  mayBeLocal: boolean;
}

/** Keeps a browser's address; the same browser of another login changes hands. @throws 422 for an address of no push service */
export function addSubscription({ actor, now }: Ctx, target: PushTarget, { mayBeLocal }: PushRules): Promise<void> {
  if (!mayBeLocal && !isPushService(target.endpoint)) {
    throw unprocessable('no_push_service', 'This is no address of a push service.');
  }
  return inTransaction(async (tx) => {
    await PushSubscription.destroy({ where: { endpoint: target.endpoint }, transaction: tx });
    await PushSubscription.create(
      { id: uuid(), userId: actor.userId, ...target, createdAt: now() },
      { transaction: tx },
    );
  });
}

/** The server calls this address itself, so it must not lead into its own network. */
function isPushService(endpoint: string): boolean {
  const { protocol, hostname, port } = new URL(endpoint);
  const isName =
    isIP(hostname.replace(/^\[|\]$/g, '')) === 0 && hostname.includes('.') && !/\.(local|internal)$/.test(hostname);
  return protocol === 'https:' && port === '' && isName;
}

export async function removeSubscription({ actor }: Ctx, endpoint: string): Promise<void> {
  await PushSubscription.destroy({ where: { endpoint, userId: actor.userId } });
}

/** A login whose sessions were ended is told nothing more. */
export async function forgetSubscriptions(tx: Transaction, userId: string): Promise<void> {
  await PushSubscription.destroy({ where: { userId }, transaction: tx });
}

/**
 * Tells closed phones that their run sheet changed: no name, no address, no time, since a locked screen shows it to
 * anybody. Somebody on the way is left in peace until Arrived.
 */
export async function wakePhones(
  personIds: string[],
  times: readonly string[],
  { keys }: PushRules,
  now: Date,
): Promise<void> {
  if (!times.some((time) => isNear(time, now))) return;
  const closed = personIds.filter((personId) => !hub.isOpen(personId));
  if (closed.length === 0) return;
  const targets = await select<PushTarget & { id: string }>(
    `SELECT s.id, s.endpoint, s.p256dh, s.auth FROM push_subscriptions s JOIN users u ON u.id = s.user_id
      WHERE u.person_id IN (:closed) AND u.is_active
        AND NOT EXISTS (SELECT 1 FROM visits v JOIN van_crew c ON c.van_id = v.van_id AND c.span && v.planned
              WHERE c.person_id = u.person_id AND v.progress = 'on_the_way')`,
    { closed },
  );
  await Promise.all(
    targets.map(async ({ id, ...target }) => {
      if ((await sendPush(keys, target, { kind: 'run_sheet' })) === 'gone')
        await PushSubscription.destroy({ where: { id } });
    }),
  );
}

/** The run sheets that a technician sees. */
function isNear(time: string, now: Date): boolean {
  const days = (Date.parse(time) - now.getTime()) / DAY_MS;
  return days >= -NEAR_DAYS.back && days <= NEAR_DAYS.ahead;
}
