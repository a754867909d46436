import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listLateWeeks } from '@driprail/shared/contracts/pay-difference.contract';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { PayWeek } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { readPayWeek } from './pay-week.queries.ts';

/** As far back as marks still arrive late (two weeks), and the owner's corrections of hours mostly reach. */
const LOOK_BACK_WEEKS = 4;

/** Locked weeks, newest first, for which something came in later that no correction has made up. */
export function lateWeeks(now: Date): Promise<OutputOf<typeof listLateWeeks>['weeks']> {
  return inTransaction(async (tx) => {
    const where = { state: 'locked' as const };
    const locked = await PayWeek.findAll({
      ...{ where, order: [['startsOn', 'DESC']], limit: LOOK_BACK_WEEKS },
      transaction: tx,
    });
    const late: OutputOf<typeof listLateWeeks>['weeks'] = [];
    for (const week of locked) {
      const { lateDifferences } = await readPayWeek(week, now, tx);
      const people = lateDifferences.map(({ name, nowCents, lockedCents, correctedCents }) => ({
        name,
        missingCents: nowCents - lockedCents - correctedCents,
      }));
      if (people.length > 0) late.push({ startsOn: week.startsOn, number: weekNumberOf(week.startsOn), people });
    }
    return late;
  });
}
