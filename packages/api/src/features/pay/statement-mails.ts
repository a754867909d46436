import type { Transaction } from 'sequelize';
import { exact } from '@driprail/shared/domain/money/exact';
import { centsText, decimalText } from '@driprail/shared/domain/money/rounding';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { companyOf } from '../../db/company.ts';
import type { PayWeek } from '../../db/models/index.ts';
import { PayStatement, User } from '../../db/models/index.ts';
import { queueMail } from '../../outbox/mails.ts';

/**
 * Tells those paid in a locked week who have a login where their statement is. A link; the figures stay behind the
 * sign-in, unless the owner chose that the mail names gross and hours.
 */
export async function mailStatements(
  tx: Transaction,
  now: Date,
  week: PayWeek,
  personIds: string[],
  baseUrl: string,
): Promise<void> {
  const { name, statementMailShowsFigures } = await companyOf(tx);
  const users = await User.findAll({ where: { personId: personIds, isActive: true }, transaction: tx });
  const statements = statementMailShowsFigures
    ? await PayStatement.findAll({ where: { payWeekId: week.id }, transaction: tx })
    : [];
  const span = `${formatDay(week.startsOn)} to ${formatDate(week.endsOn)}`;
  for (const user of users) {
    if (!user.passwordHash || !user.personId) continue;
    const statement = statements.find((one) => one.personId === user.personId);
    const figures = statement ? figureWords(statement) : '';
    await queueMail(tx, now, {
      to: user.email,
      subject: `${name}: your pay statement, ${span}`,
      body: `Hello ${user.name},\n\nYour pay statement of ${span} is ready.${figures} Sign in to read it:\n\n${baseUrl}/statements/${week.startsOn}/${user.personId}\n\nIf something is not right, tell the owner.`,
    });
  }
}

function figureWords({ grossCents, summary }: PayStatement): string {
  const hours = decimalText(exact((summary as PersonWeek).hoursWorked), 2);
  return ` Gross ${centsText(grossCents)} for ${hours} h, before any withholding.`;
}
