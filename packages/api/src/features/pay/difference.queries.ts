import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { getPayDifference } from '@driprail/shared/contracts/pay-difference.contract';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import { weekDifference } from '@driprail/shared/domain/pay/week-difference';
import type { PersonFigures } from '@driprail/shared/domain/pay/week-difference';
import { addDays, weekNumberOf } from '@driprail/shared/domain/time/zone';
import type { Transaction } from 'sequelize';
import type { PayWeek } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { readFrozen } from './frozen.queries.ts';
import { payInputOf } from './pay-input.queries.ts';
import { weekAt } from './weeks.service.ts';

/** A week's figures as they stand, locked or computed. */
async function figuresOf(week: PayWeek, now: Date, tx: Transaction): Promise<PersonFigures[]> {
  if (week.state === 'locked') return (await readFrozen(week.id, null, tx)).people;
  return computePayWeek(await payInputOf(week, now, tx)).people;
}

/** What differs in a week against the week before, or against what was last checked. */
export function readDifference(
  day: string,
  against: 'week_before' | 'last_checked',
  now: Date,
): Promise<OutputOf<typeof getPayDifference>> {
  return inTransaction(async (tx) => {
    const week = await weekAt(day, tx);
    const other = against === 'week_before' ? await weekAt(addDays(week.startsOn, -1), tx) : week;
    const checked = week.lastChecked;
    const before = against === 'week_before' ? await figuresOf(other, now, tx) : (checked?.people ?? null);
    const after = await figuresOf(week, now, tx);
    const people = before === null ? null : weekDifference(before, after);
    return {
      against: {
        startsOn: other.startsOn,
        number: weekNumberOf(other.startsOn),
        checkedAt: against === 'last_checked' ? (checked?.at ?? null) : null,
      },
      people,
      unchanged: after.filter((person) => !people?.some((one) => one.personId === person.personId)).length,
    };
  });
}
