import { tag } from '@driprail/shared/authz/ability';
import type { WeekSoFar } from '@driprail/shared/contracts/pay.contract';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { workweekAt } from '@driprail/shared/domain/time/workweek';
import { authorize } from '../../authz/authorize.ts';
import { todayOf } from '../../db/company.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { payInputOf } from './pay-input.queries.ts';
import { weekAt, workweekRuleOn } from './weeks.service.ts';

/** One's own running week as its records stand now. @throws 403 for a login without a person */
export function readWeekSoFar({ actor, ability, now }: Ctx): Promise<WeekSoFar> {
  return inTransaction(async (tx) => {
    const personId = actor.personId ?? '';
    authorize(ability, 'read', tag('Estimate', { personId }));
    const at = now();
    const { startsOn } = workweekAt(at.toISOString(), await workweekRuleOn(await todayOf(at, tx), tx));
    const week = await weekAt(startsOn, tx);
    const input = await payInputOf(week, at, tx);
    const own = { ...input, people: input.people.filter((person) => person.id === personId) };
    const [person] = computePayWeek(own).people;
    return {
      ...{ startsOn: week.startsOn, endsOn: week.endsOn, number: weekNumberOf(week.startsOn) },
      ...{ asOf: at.toISOString(), isEstimate: true },
      hoursWorked: person?.hoursWorked ?? '0',
      overtimeHours: person?.overtimeHours ?? '0',
      grossCents: person?.totals.gross ?? 0,
      tipCents: person?.totals.tips ?? 0,
      warnings: person?.warnings.filter((one) => one.code !== 'open_entry').map((one) => one.message) ?? [],
    };
  });
}
