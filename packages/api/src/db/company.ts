import type { Transaction } from 'sequelize';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { CompanySettings } from './models/index.ts';

/** The company's settings. @throws when the company is not set up yet */
export function companyOf(tx?: Transaction): Promise<CompanySettings> {
  return CompanySettings.findByPk(1, { rejectOnEmpty: true, transaction: tx ?? null });
}

/** Today's date in the company's zone. */
export async function todayOf(now: Date, tx?: Transaction): Promise<string> {
  return dayOf(now.toISOString(), (await companyOf(tx)).zone);
}
