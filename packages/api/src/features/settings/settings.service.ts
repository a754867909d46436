import type { SettingsDto } from '@driprail/shared/contracts/settings.contract';
import { audit } from '../../db/audit.ts';
import { CompanySettings } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** Changes the settings; the version seen must be the one stored. */
export function updateSettings({ actor, now }: Ctx, next: SettingsDto): Promise<SettingsDto> {
  return inTransaction(async (tx) => {
    const settings = await CompanySettings.findByPk(1, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    if (settings.version !== next.version) {
      throw conflict(
        'stale',
        'Somebody changed the settings meanwhile. Look at the newer ones and save again.',
        toSettingsDto(settings),
      );
    }
    const before = toSettingsDto(settings);
    await settings.update({ ...next, version: next.version + 1, updatedAt: now() }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'settings', '1', 'changed', { before, after: next });
    hintAfterCommit(tx, ['everyone'], 'settings', '1', settings.version);
    return toSettingsDto(settings);
  });
}

export function toSettingsDto(s: CompanySettings): SettingsDto {
  return {
    name: s.name,
    phone: s.phone,
    email: s.email,
    zone: s.zone,
    clock: s.clock,
    units: s.units,
    dayStartsAt: s.dayStartsAt,
    dayEndsAt: s.dayEndsAt,
    undoSeconds: s.undoSeconds,
    reasonKinds: s.reasonKinds as SettingsDto['reasonKinds'],
    statementMailShowsFigures: s.statementMailShowsFigures,
    emergencyNumber: s.emergencyNumber,
    mealReminderMinutes: s.mealReminderMinutes,
    restReminderMinutes: s.restReminderMinutes,
    deskDiscountPercent: s.deskDiscountPercent,
    invoiceDueDays: s.invoiceDueDays,
    version: s.version,
  };
}
