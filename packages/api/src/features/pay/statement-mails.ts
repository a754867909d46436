import type { Transaction } from 'sequelize';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { companyOf } from '../../db/company.ts';
import type { PayWeek } from '../../db/models/index.ts';
import { User } from '../../db/models/index.ts';
import { queueMail } from '../../outbox/mails.ts';

/** Tells those paid in a locked week who have a login where their statement is. A link; the figures stay behind the sign-in. */
export async function mailStatements(
  tx: Transaction,
  now: Date,
  week: PayWeek,
  personIds: string[],
  baseUrl: string,
): Promise<void> {
  const { name } = await companyOf(tx);
  const users = await User.findAll({ where: { personId: personIds, isActive: true }, transaction: tx });
  const span = `${formatDay(week.startsOn)} to ${formatDate(week.endsOn)}`;
  for (const user of users) {
    if (!user.passwordHash || !user.personId) continue;
    await queueMail(tx, now, {
      to: user.email,
      subject: `${name}: your pay statement, ${span}`,
      body: `Hello ${user.name},\n\nYour pay statement of ${span} is ready. Sign in to read it:\n\n${baseUrl}/statements/${week.startsOn}/${user.personId}\n\nIf something is not right, tell the owner.`,
    });
  }
}
