import { randomInt, timingSafeEqual } from 'node:crypto';
import { v7 as uuid } from 'uuid';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { audit } from '../../db/audit.ts';
import { CompanySettings, PayRuleSet, User } from '../../db/models/index.ts';
import { inTransaction, run } from '../../db/sequelize.ts';
import type { Clock } from '../../clock.ts';
import { AppError, conflict, unprocessable } from '../../http/errors.ts';
import { hashPassword } from '../access/index.ts';

/** The one-time code that the terminal shows while the company waits to be set up. */
export class SetUpCode {
  private code: string | null = null;

  make(): string {
    this.code = Array.from({ length: 8 }, () => 'ABCDEFGHJKMNPQRSTVWXYZ23456789'[randomInt(30)]).join('');
    return this.code;
  }

  matches(given: string): boolean {
    const wanted = Buffer.from(this.code ?? '');
    const got = Buffer.from(given.trim().toUpperCase());
    return this.code !== null && wanted.length === got.length && timingSafeEqual(wanted, got);
  }

  spend(): void {
    this.code = null;
  }
}

export async function isSetUpNeeded(): Promise<boolean> {
  return (await CompanySettings.count()) === 0;
}

/** Whether this is the demo company, whose sign-ins are no secret. */
export async function hasDemoLogins(): Promise<boolean> {
  return (await User.count({ where: { email: 'owner@ternandtide.example' } })) > 0;
}

export interface CompanyStart {
  companyName: string;
  zone: string;
  ownerName: string;
  email: string;
  password: string;
}

/** Makes the company, its first pay rules (federal) and its owner. Two at the same moment succeed once. */
export async function setUpCompany(start: CompanyStart, now: Clock): Promise<User> {
  const passwordHash = await hashPassword(start.password);
  return inTransaction(async (tx) => {
    await run('SELECT pg_advisory_xact_lock(4600)', {}, tx);
    if ((await CompanySettings.count({ transaction: tx })) > 0)
      throw conflict('set_up', 'This company is set up already. Sign in.');
    await CompanySettings.create(
      { id: 1, name: start.companyName, zone: start.zone, billsFrom: now() },
      { transaction: tx },
    );
    const user = await User.create(
      { id: uuid(), name: start.ownerName, email: start.email, passwordHash, role: 'owner' },
      { transaction: tx },
    );
    await PayRuleSet.create(
      {
        id: uuid(),
        startsOn: `${dayOf(now().toISOString(), start.zone).slice(0, 4)}-01-01`,
        overtimeRuleSet: 'us_federal',
        minimumWage: '7.25',
        crewSplit: 'equal',
        workweekStartsOn: 1,
        setBy: user.id,
      },
      { transaction: tx },
    );
    await audit(tx, { userId: user.id, at: now() }, 'settings', '1', 'company set up');
    return user;
  });
}

export function refuseWrongCode(code: SetUpCode, given: string): void {
  if (code.matches(given)) return;
  throw unprocessable('wrong_code', 'That is not the code in the terminal.', {
    fields: { code: 'That is not the code in the terminal.' },
  });
}

export const tooManyCodes = () => new AppError(429, 'slow_down', 'Too many tries. Wait ten minutes and try again.');
