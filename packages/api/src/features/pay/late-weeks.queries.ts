import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listLateWeeks } from '@driprail/shared/contracts/pay-difference.contract';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import { missingCents } from '@driprail/shared/domain/pay/late-difference';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { PayWeek } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { correctionsOfWeek, differences } from './corrections.queries.ts';
import { readFrozen } from './frozen.queries.ts';
import { payInputOf } from './pay-input.queries.ts';

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
    const weeks: OutputOf<typeof listLateWeeks>['weeks'] = [];
    for (const week of locked) {
      const frozen = await readFrozen(week.id, null, tx);
      const computed = computePayWeek(await payInputOf(week, now, tx));
      const late = differences(frozen.people, computed.people, await correctionsOfWeek(week.id, tx));
      const people = late.map((person) => ({ name: person.name, missingCents: missingCents(person) }));
      if (people.length > 0) weeks.push({ startsOn: week.startsOn, number: weekNumberOf(week.startsOn), people });
    }
    return weeks;
  });
}
