import { exact, fractionText, type Exact } from '../../money/exact.ts';
import { formatDate } from '../../time/format.ts';
import { rateInForce } from '../dated-rates.ts';
import type { DatedRate, SourceRef } from '../pay-week.types.ts';
import { planInForce, type DatedPlan, type PlanBase } from '../plans/pay-plan.ts';
import { planSource } from '../plans/plan-week.ts';
import { weeklySalary } from '../salary.ts';
import { rateSource } from '../working-words.ts';

export interface HourlyRate {
  /** Exact dollars an hour, decimal or "n/d". */
  value: string;
  /** Where it comes from, in words. */
  note: string;
  source: SourceRef;
  /** A salary or a day rate goes on whatever the hours, so an hour not worked may be paid by it already. */
  isPaidWhole: boolean;
}

interface Question {
  personId: string;
  /** First day of the workweek, by which plans go. */
  weekStartsOn: string;
  /** Company-zone date of the hours. */
  on: string;
  rates: readonly DatedRate[];
  plans: readonly DatedPlan[];
}

/**
 * What an ordinary hour of a person is paid on a day: by the plan in force, else by the dated rate for every kind of
 * work. A salary is divided by the hours it covers (29 CFR 778.113).
 * @returns null where neither the plan nor a rate says what an hour is worth
 */
export function hourlyRateInForce({ personId, weekStartsOn, on, rates, plans }: Question): HourlyRate | null {
  const plan = planInForce(
    plans.filter((own) => own.personId === personId),
    weekStartsOn,
  );
  const byPlan = plan === null ? null : hourOf(plan.plan.base);
  const isPaidWhole = plan?.plan.base.kind === 'salary' || plan?.plan.base.kind === 'day_rate';
  if (plan !== null && byPlan !== null) {
    const note = isPaidWhole ? 'The salary over the hours it covers' : 'The hourly amount of the plan';
    const since = `${note} since ${formatDate(plan.startsOn)}`;
    return { value: fractionText(byPlan), note: since, source: planSource(plan), isPaidWhole };
  }
  const rate = rateInForce(
    rates.filter((one) => one.clockKind === null),
    { kind: 'hourly', personId, serviceId: null, clockKind: null, date: on },
  );
  if (rate === null) return null;
  const note = `The hourly rate since ${formatDate(rate.startsOn)}`;
  return { value: rate.value, note, source: rateSource(rate), isPaidWhole };
}

function hourOf(base: PlanBase): Exact | null {
  if (base.kind === 'salary') return weeklySalary(exact(base.amount), base.period).div(exact(base.coversHours));
  if ('hourly' in base) return exact(base.hourly);
  if ('other' in base) return exact(base.other.hourly);
  return null;
}
