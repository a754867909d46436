import { abilityFor } from '@driprail/shared/authz/ability';
import type { Actor } from '@driprail/shared/authz/actor';
import { addDays } from '@driprail/shared/domain/time/zone';
import { setWeekState } from '@driprail/api/features/pay/index';
import { PAST_WEEKS, instant, minuteOf } from './calendar.ts';
import type { Demo } from './build-demo.ts';

/** Checks and locks all past weeks but the last as the owner did, each on the Monday after, through the pay service. */
export async function lockWeeks({ calendar, ownerUserId }: Demo): Promise<void> {
  const actor: Actor = { userId: ownerUserId, personId: null, role: 'owner' };
  for (let weeksAgo = PAST_WEEKS; weeksAgo > 1; weeksAgo -= 1) {
    const week = addDays(calendar.thisWeek, -7 * weeksAgo);
    const monday = instant(addDays(week, 7), minuteOf('09:10'));
    const ctx = { actor, name: 'Rowan Tern', ability: abilityFor(actor), now: () => monday };
    const checked = await setWeekState(ctx, week, 'checked', 0);
    await setWeekState(ctx, week, 'locked', checked.week.version);
  }
}
