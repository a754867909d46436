import type { Transaction } from 'sequelize';
import type { OnlineSettingsDto } from '@driprail/shared/contracts/online-booking.contract';
import { select } from '../../db/sequelize.ts';

/** Where, when and on which terms strangers book; the policy is the latest version. */
export async function readOnlineSettings(tx?: Transaction): Promise<OnlineSettingsDto> {
  const [row] = await select<OnlineSettingsDto>(
    `SELECT s.is_on AS "isOn", s.places, s.notice_hours AS "noticeHours", s.farthest_days AS "farthestDays", s.starts,
            s.window_minutes AS "windowMinutes", s.version, p.version AS "policyVersion", p.words AS "policyWords",
            p.free_until_hours AS "freeUntilHours", p.late_fee_cents AS "lateFeeCents",
            coalesce((SELECT json_agg(o.service_id ORDER BY m.position, m.name) FROM online_services o JOIN services m ON m.id = o.service_id), '[]') AS "serviceIds"
       FROM online_booking_settings s CROSS JOIN LATERAL (SELECT * FROM online_policies ORDER BY version DESC LIMIT 1) p`,
    {},
    tx,
  );
  if (!row) throw new Error('the settings of online booking come with the schema');
  return row;
}
