import { abilityFor } from '@driprail/shared/authz/ability';
import type { Actor } from '@driprail/shared/authz/actor';
import { addDays } from '@driprail/shared/domain/time/zone';
import { handOverPayday, makePayday } from '@driprail/api/features/pay/index';
import { PAST_WEEKS, instant, minuteOf } from './calendar.ts';
import type { Demo } from './build-demo.ts';

/** Locked weeks, from the last past week on, that still wait for their payday; the last one is not locked yet. */
const WAITING_TO = 3;

/** Hands over the older locked weeks as the owner did: every other Friday two weeks, the first one alone. */
export async function handOverWeeks({ calendar, ownerUserId }: Demo): Promise<void> {
  const actor: Actor = { userId: ownerUserId, personId: null, role: 'owner' };
  const weekOf = (weeksAgo: number) => addDays(calendar.thisWeek, -7 * weeksAgo);
  for (let newest = PAST_WEEKS; newest > WAITING_TO; newest -= 2) {
    const weeks = [newest + 1, newest].filter((weeksAgo) => weeksAgo <= PAST_WEEKS).map(weekOf);
    const wednesday = instant(addDays(weekOf(newest), 9), minuteOf('16:20'));
    const ctx = { actor, name: 'Rowan Tern', ability: abilityFor(actor), now: () => wednesday };
    const payday = await makePayday(ctx, { paysOn: addDays(weekOf(newest), 11), note: '', weeks });
    await handOverPayday(ctx, payday.id, payday.version);
  }
}
