import { inTransaction, run } from '@driprail/api/db/sequelize';
import type { DemoRows } from './rows.ts';

/** Singles that a stranger may book without being asked first; packages and add-ons go online as they are. */
const singles = new Set(['Clay lube decontamination', 'One-step polish']);

const policy = `We arrive within the window that you choose and call when we are on the way.
Somebody hands us the key, or the car stands open. Take out what is dear to you.
Heavy dog hair, sand or mold takes longer: we tell you the price before we begin.`;

/** The demo takes bookings online. */
export function openOnlineBooking({ services }: DemoRows, since: Date): Promise<void> {
  const offered = services.filter(({ kind, name }) => kind !== 'single' || singles.has(name));
  return inTransaction(async (tx) => {
    await run(
      `UPDATE online_booking_settings SET is_on = true, places = '{Ternmouth}', notice_hours = 18, farthest_days = 14`,
      {},
      tx,
    );
    await run(
      'INSERT INTO online_services SELECT json_array_elements_text(:ids)::uuid',
      { ids: JSON.stringify(offered.map(({ id }) => id)) },
      tx,
    );
    await run('INSERT INTO online_policies VALUES (2, :policy, 24, 4000, :since)', { policy, since }, tx);
  });
}
