import { createHash, randomBytes } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { CompanySettings, LoginLink, User } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { audit } from '../../db/audit.ts';
import { notFound } from '../../http/errors.ts';
import type { Clock } from '../../clock.ts';
import { queueMail } from '../../outbox/mails.ts';
import { announceLink } from './announce.ts';
import { hashPassword } from './passwords.ts';

const GOOD_FOR_HOURS = { invitation: 7 * 24, reset: 2 };

/** Makes a single-use link, keeps its hash, and queues the mail in the same transaction. */
export async function sendLink(
  tx: Transaction,
  user: User,
  kind: 'invitation' | 'reset',
  now: Date,
  baseUrl: string,
): Promise<void> {
  const token = randomBytes(32).toString('base64url');
  const expiresAt = new Date(now.getTime() + GOOD_FOR_HOURS[kind] * 3_600_000);
  await LoginLink.destroy({ where: { userId: user.id, usedAt: null }, transaction: tx });
  await LoginLink.create(
    { id: uuid(), userId: user.id, kind, tokenHash: hashOf(token), expiresAt },
    { transaction: tx },
  );
  const company = await CompanySettings.findByPk(1, { transaction: tx });
  const url = `${baseUrl}/link/${token}`;
  const words = kind === 'invitation' ? invitation(company?.name ?? 'Driprail', user.name, url) : reset(user.name, url);
  await queueMail(tx, now, { to: user.email, ...words });
  announceLink(tx, kind, user.email, url);
}

function invitation(companyName: string, name: string, url: string) {
  return {
    subject: `${companyName}: your Driprail login`,
    body: `Hello ${name},\n\n${companyName} gives you a login to Driprail. Choose a password here, within seven days:\n\n${url}\n\nThe link works once.`,
  };
}

function reset(name: string, url: string) {
  return {
    subject: 'Set a new Driprail password',
    body: `Hello ${name},\n\nSet a new password here, within two hours:\n\n${url}\n\nThe link works once. If you did not ask for it, leave it; your password stays as it is.`,
  };
}

/** What a link is for. @throws 404 when it is unknown, used or too old */
export async function readLink(
  token: string,
  now: Clock,
): Promise<{ link: LoginLink; user: User; companyName: string }> {
  const link = await LoginLink.findOne({ where: { tokenHash: hashOf(token), usedAt: null } });
  const user = link && link.expiresAt > now() ? await User.findByPk(link.userId) : null;
  if (!link || !user?.isActive) throw notFound('This link has been used or is too old. Ask for a new one; the old one');
  const company = await CompanySettings.findByPk(1);
  return { link, user, companyName: company?.name ?? '' };
}

/** Sets the password by a link, once; two at the same moment succeed once. */
export async function usePasswordLink(token: string, password: string, now: Clock): Promise<User> {
  const { link, user } = await readLink(token, now);
  const passwordHash = await hashPassword(password);
  return inTransaction(async (tx) => {
    const [used] = await LoginLink.update({ usedAt: now() }, { where: { id: link.id, usedAt: null }, transaction: tx });
    if (used === 0) throw notFound('This link has been used; it');
    await user.update({ passwordHash }, { transaction: tx });
    await audit(tx, { userId: user.id, at: now() }, 'login', user.id, `password set by ${link.kind} link`);
    return user;
  });
}

function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
