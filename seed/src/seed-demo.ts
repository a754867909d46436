import { hashPassword } from '@driprail/api/features/access/index';
import { isSetUpNeeded } from '@driprail/api/features/settings/index';
import { buildDemo } from './build-demo.ts';
import { handOverWeeks } from './hand-over.ts';
import { lockWeeks } from './lock-weeks.ts';
import { openOnlineBooking } from './store-online.ts';
import { storeRows } from './store.ts';

export const DEMO_PASSWORD = 'driprail-demo';

/**
 * Puts the demo company into an empty, migrated database; connect() has been called.
 * @param options.now any instant of the day that is to be the demo's today; its clock stands at 11:00 company time
 * @returns false when the database has a company already: it is left alone
 */
export async function seedDemo({ now }: { now: Date }): Promise<boolean> {
  if (!(await isSetUpNeeded())) return false;
  const demo = buildDemo(now);
  await storeRows(demo.rows, await hashPassword(DEMO_PASSWORD));
  await openOnlineBooking(demo.rows, now);
  await lockWeeks(demo);
  await handOverWeeks(demo);
  return true;
}
