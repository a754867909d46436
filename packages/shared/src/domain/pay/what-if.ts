import type { CrewSplit, PayWeekInput, PersonPlace } from './pay-week.types.ts';
import type { DatedPlan, PayPlan, PlanBase } from './plans/pay-plan.ts';

/** What to try on past weeks; null leaves a thing as it was. */
export interface Trial {
  /** Dollars an hour and percent, in place of every one that applied. */
  hourly: string | null;
  percent: string | null;
  plan: PayPlan | null;
  place: Omit<PersonPlace, 'personId'> | null;
  minimumWage: string | null;
  crewSplit: CrewSplit | null;
}

/**
 * A week's input as it would have been for one person under a trial. Only that person is worked out, so that a company
 * rate can be tried on one.
 */
export function trialInput(input: PayWeekInput, personId: string, trial: Trial): PayWeekInput {
  const { plan, place, minimumWage, crewSplit } = trial;
  const others = <T extends { personId: string }>(list: readonly T[]) =>
    list.filter((item) => item.personId !== personId);
  const own = input.plans.filter((item) => item.personId === personId);
  return {
    ...input,
    people: input.people.filter((person) => person.id === personId),
    settledCommissions: [],
    rates: trialRates(input, personId, trial),
    plans: plan === null ? own.map((item) => trialPlan(item, trial)) : [trialOf(personId, plan)],
    places: place === null ? input.places : [...others(input.places), { personId, ...place }],
    rules: {
      ...input.rules,
      ...(minimumWage === null ? {} : { minimumWage }),
      ...(crewSplit === null ? {} : { crewSplit }),
    },
  };
}

function trialOf(personId: string, plan: PayPlan): DatedPlan {
  return { id: 'trial', personId, startsOn: '0001-01-01', plan };
}

/** Rates of the person and the company at the tried values; where none applied, the person gets one. */
function trialRates({ rates }: PayWeekInput, personId: string, { hourly, percent }: Trial): PayWeekInput['rates'] {
  const tried = {
    hourly,
    commission_percent: percent,
    flat_service: null,
    product_cost: null,
    mileage: null,
    per_review: null,
  };
  const replaced = rates.map((rate) => {
    const value = tried[rate.kind];
    const isOwn = rate.personId === null || rate.personId === personId;
    return value === null || !isOwn || rate.clockKind !== null || Number(rate.value) === 0 ? rate : { ...rate, value };
  });
  const added = (['hourly', 'commission_percent'] as const).flatMap((kind) => {
    const value = tried[kind];
    const isKnown = rates.some(
      (rate) => rate.kind === kind && (rate.personId === null || rate.personId === personId) && Number(rate.value) > 0,
    );
    if (value === null || isKnown) return [];
    const trial = { id: `trial:${kind}`, kind, personId, serviceId: null, clockKind: null, value };
    return [{ ...trial, startsOn: '0001-01-01' }];
  });
  return [...replaced, ...added];
}

function trialPlan(dated: DatedPlan, trial: Trial): DatedPlan {
  return { ...dated, plan: { ...dated.plan, base: trialBase(dated.plan.base, trial) } };
}

function trialBase(base: PlanBase, { hourly, percent }: Trial): PlanBase {
  const byHour = hourly !== null && 'hourly' in base ? { ...base, hourly } : base;
  return percent !== null && 'percent' in byHour ? { ...byHour, percent } : byHour;
}
