import type { Transaction } from 'sequelize';
import { computePayWeek, monthOfWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { CarriedPay, PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { DatedPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import { addDays } from '@driprail/shared/domain/time/zone';
import type { PayWeek } from '../../db/models/index.ts';
import { frozenInput, readFrozen } from './frozen.queries.ts';
import { weekAt } from './weeks.service.ts';

/**
 * What earlier workweeks of the same month leave to this one, for people whose plan settles by the month. Locked weeks
 * count as they were locked, open ones as their records stand.
 */
export async function carriedInto(
  week: PayWeek,
  plans: readonly DatedPlan[],
  inputOf: (prior: PayWeek) => Promise<PayWeekInput>,
  tx?: Transaction,
): Promise<CarriedPay[]> {
  const monthly = new Set(plans.filter(settlesByMonth).map((plan) => plan.personId));
  const before = addDays(week.startsOn, -7);
  if (monthly.size === 0 || monthOfWeek(before) !== monthOfWeek(week.startsOn)) return [];
  const prior = await weekAt(before, tx);
  if (prior.startsOn !== before) return [];
  const frozen = frozenInput(prior);
  const input = frozen ?? (await inputOf(prior));
  const people = frozen ? (await readFrozen(prior.id, null, tx)).people : computePayWeek(input).people;
  return [...monthly].flatMap((personId) =>
    carryOn(
      personId,
      prior.startsOn,
      input.carried.find((carried) => carried.personId === personId),
      people.find((person) => person.personId === personId),
    ),
  );
}

function settlesByMonth({ plan: { base } }: DatedPlan): boolean {
  return base.kind === 'draw' || (base.kind === 'tiered_percent' && base.period === 'month');
}

/** What a person's workweek leaves to the next one of the month, on top of what came into it. */
export function carryOn(
  personId: string,
  startsOn: string,
  earlier: CarriedPay | undefined,
  person: PersonWeek | undefined,
): CarriedPay[] {
  if (!person?.carries) return earlier ? [earlier] : [];
  const { drawDeficitCents, ...parts } = person.carries;
  const weeks = [...(earlier?.weeks ?? []), { startsOn, hours: person.hoursWorked, ...parts }];
  return [{ personId, drawDeficitCents, weeks }];
}
