import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { Role } from '@driprail/shared/authz/actor';
import { audit } from '../../db/audit.ts';
import { User } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { sendLink } from './links.service.ts';
import { forgetSubscriptions } from './push.service.ts';
import { endSessionsOf } from './sessions.service.ts';

export interface Invitation {
  email: string;
  role: Role;
  personId: string | null;
  name: string;
}

/** Invites a person: a login without a password, and a link by mail. */
export function inviteLogin({ actor, now }: Ctx, invitation: Invitation, baseUrl: string): Promise<User> {
  return inTransaction(async (tx) => {
    await refuseTaken(tx, invitation);
    const user = await User.create({ id: uuid(), ...invitation }, { transaction: tx });
    await sendLink(tx, user, 'invitation', now(), baseUrl);
    await audit(tx, { userId: actor.userId, at: now() }, 'login', user.id, 'invited', { role: user.role });
    hintAfterCommit(tx, ['owners'], 'login', user.id);
    return user;
  });
}

async function refuseTaken(tx: Transaction, { email, personId }: Invitation): Promise<void> {
  if (await User.findOne({ where: { email }, transaction: tx })) {
    throw unprocessable('email_taken', 'Another login has this e-mail.', {
      fields: { email: 'Another login has this e-mail.' },
    });
  }
  if (personId && (await User.findOne({ where: { personId }, transaction: tx }))) {
    throw conflict('has_login', 'That person has a login already.');
  }
}

export interface LoginChange {
  email?: string | undefined;
  role?: Role | undefined;
  isActive?: boolean | undefined;
}

/** Changes a login. Switching off or another role ends its sessions and open screens at once. */
export function updateLogin({ actor, now }: Ctx, id: string, change: LoginChange): Promise<User> {
  return inTransaction(async (tx) => {
    const user = await User.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!user) throw notFound('That login');
    const before = { email: user.email, role: user.role, isActive: user.isActive };
    const losesOwner =
      user.role === 'owner' && user.isActive && (change.isActive === false || (change.role && change.role !== 'owner'));
    if (losesOwner) await keepOneOwner(tx, id);
    if (
      change.email &&
      change.email !== user.email &&
      (await User.findOne({ where: { email: change.email }, transaction: tx }))
    ) {
      throw unprocessable('email_taken', 'Another login has this e-mail.', {
        fields: { email: 'Another login has this e-mail.' },
      });
    }
    await user.update(definedOf(change), { transaction: tx });
    const isOff = change.isActive === false;
    if (isOff || (change.role && change.role !== before.role)) await endSessionsOf(tx, id, { forgets: isOff });
    await audit(tx, { userId: actor.userId, at: now() }, 'login', id, 'changed', { before, after: change });
    hintAfterCommit(tx, ['owners'], 'login', id);
    return user;
  });
}

/** Locks the owners, so that two who switch each other off at once leave one. */
async function keepOneOwner(tx: Transaction, leavingId: string): Promise<void> {
  const owners = await User.findAll({
    where: { role: 'owner', isActive: true },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    order: [['id', 'ASC']],
  });
  if (!owners.some((owner) => owner.id !== leavingId)) {
    throw unprocessable('last_owner', 'This is the last owner. Give somebody else the role first.');
  }
}

export function sendResetTo({ actor, now }: Ctx, id: string, baseUrl: string): Promise<void> {
  return inTransaction(async (tx) => {
    const user = await User.findByPk(id, { transaction: tx });
    if (!user?.isActive) throw notFound('That login');
    await sendLink(tx, user, user.passwordHash ? 'reset' : 'invitation', now(), baseUrl);
    await audit(tx, { userId: actor.userId, at: now() }, 'login', id, 'link sent');
  });
}

export function endLoginSessions({ actor, now }: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    await endSessionsOf(tx, id, { forgets: true });
    await forgetSubscriptions(tx, id);
    await audit(tx, { userId: actor.userId, at: now() }, 'login', id, 'sessions ended');
  });
}

function definedOf<T extends object>(change: T): Partial<T> {
  return Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined)) as Partial<T>;
}
