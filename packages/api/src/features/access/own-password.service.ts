import { audit } from '../../db/audit.ts';
import { User } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';
import { hashPassword, isPassword } from './passwords.ts';
import { endSessionsOf } from './sessions.service.ts';

/** Changes one's own password and ends the other sessions. */
export async function changeOwnPassword(
  { actor, now }: Ctx,
  current: string,
  next: string,
  sid: string,
): Promise<void> {
  const user = await User.findByPk(actor.userId, { rejectOnEmpty: true });
  if (!(await isPassword(user.passwordHash, current))) {
    throw unprocessable('wrong_password', 'That is not the password you use now.', {
      fields: { current: 'That is not the password you use now.' },
    });
  }
  const passwordHash = await hashPassword(next);
  await inTransaction(async (tx) => {
    await user.update({ passwordHash }, { transaction: tx });
    await endSessionsOf(tx, user.id, { exceptSid: sid });
    await audit(tx, { userId: user.id, at: now() }, 'login', user.id, 'password changed');
  });
}
