import type { OnlineSettingsBody, OnlineSettingsDto } from '@driprail/shared/contracts/online-booking.contract';
import { tag } from '@driprail/shared/authz/ability';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { Service } from '../../db/models/index.ts';
import { inTransaction, run } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import { readOnlineSettings } from './settings.queries.ts';

/**
 * Changes online booking; other terms become a new version.
 * @throws 403, 409 when somebody changed it meanwhile, 422 for a service that is not on the menu
 */
export function updateOnlineSettings(ctx: Ctx, next: OnlineSettingsBody): Promise<OnlineSettingsDto> {
  return inTransaction(async (tx) => {
    authorize(ctx.ability, 'update', tag('Settings', { id: 1 }));
    await run('SELECT 1 FROM online_booking_settings FOR UPDATE', {}, tx);
    const before = await readOnlineSettings(tx);
    if (before.version !== next.version)
      throw conflict('stale', 'Somebody changed online booking meanwhile. Reload and look at the newer settings.');
    const serviceIds = [...new Set(next.serviceIds)];
    const known = await Service.count({ where: { id: serviceIds, isActive: true }, transaction: tx });
    if (known !== serviceIds.length) {
      const message = 'Choose services that are on the menu.';
      throw unprocessable('no_such_service', message, { fields: { serviceIds: message } });
    }
    const at = ctx.now();
    const { isOn, noticeHours, farthestDays, windowMinutes, policyWords, freeUntilHours, lateFeeCents } = next;
    const starts = [...new Set(next.starts)].sort();
    await run(
      `UPDATE online_booking_settings SET is_on = :isOn, places = ARRAY(SELECT json_array_elements_text(:places)), notice_hours = :noticeHours,
              farthest_days = :farthestDays, starts = ARRAY(SELECT json_array_elements_text(:starts)), window_minutes = :windowMinutes, version = version + 1`,
      {
        ...{ isOn, noticeHours, farthestDays, windowMinutes },
        ...{ places: JSON.stringify(next.places), starts: JSON.stringify(starts) },
      },
      tx,
    );
    await run('DELETE FROM online_services', {}, tx);
    await run(
      'INSERT INTO online_services SELECT json_array_elements_text(:ids)::uuid',
      { ids: JSON.stringify(serviceIds) },
      tx,
    );
    const isSamePolicy =
      policyWords === before.policyWords &&
      freeUntilHours === before.freeUntilHours &&
      lateFeeCents === before.lateFeeCents;
    if (!isSamePolicy)
      await run(
        'INSERT INTO online_policies VALUES (:version, :policyWords, :freeUntilHours, :lateFeeCents, :at)',
        { version: before.policyVersion + 1, policyWords, freeUntilHours, lateFeeCents, at },
        tx,
      );
    const after = await readOnlineSettings(tx);
    await audit(tx, { userId: ctx.actor.userId, at }, 'online_booking', '1', 'changed', { before, after });
    return after;
  });
}
