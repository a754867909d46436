import { NO_EXTRAS, type DatedPlan, type OtherTime, type PlanBase, type PlanExtras } from '../plans/pay-plan.ts';

/** Ada's plan since the year's first workweek, with nothing beside its base. */
export function aPlan(base: PlanBase, extras: Partial<PlanExtras> = {}, parts: Partial<DatedPlan> = {}): DatedPlan {
  return {
    id: 'plan',
    personId: 'ada',
    startsOn: '2026-01-05',
    plan: { base, extras: { ...NO_EXTRAS, ...extras } },
    ...parts,
  };
}

/** Time beside the jobs by the hour, or covered by an agreement. */
export function otherTime(hourly: string, signedOn: string | null = null): OtherTime {
  return { hourly, agreement: signedOn === null ? null : { signedOn, note: 'Signed sheet in the office' } };
}
