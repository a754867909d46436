import type { Transaction } from 'sequelize';
import { formatDate } from '@driprail/shared/domain/time/format';
import { workweekOf } from '@driprail/shared/domain/time/workweek';
import { PayWeek } from '../../db/models/index.ts';
import { unprocessable } from '../../http/errors.ts';
import { workweekRuleOn } from './weeks.service.ts';

/** Before a locked week's end only corrections change what was paid. @throws 422 at the field that gave the day */
export async function refuseLockedDay(startsOn: string, tx: Transaction, field = 'startsOn'): Promise<void> {
  const last = await PayWeek.findOne({ where: { state: 'locked' }, order: [['startsOn', 'DESC']], transaction: tx });
  if (!last || startsOn > last.endsOn) return;
  const message = `Weeks are locked to ${formatDate(last.endsOn)}. Start later, or add a correction to an open week.`;
  throw unprocessable('locked_week', message, { fields: { [field]: message } });
}

/** Plans and places hold for whole workweeks. @throws 422 at the field `startsOn` */
export async function refuseInsideWeek(startsOn: string, tx: Transaction): Promise<void> {
  const week = workweekOf(startsOn, await workweekRuleOn(startsOn, tx));
  if (week.startsOn === startsOn) return;
  const message = `Start with a workweek: ${formatDate(week.startsOn)} is the first day of the one that holds this day.`;
  throw unprocessable('inside_week', message, { fields: { startsOn: message } });
}
