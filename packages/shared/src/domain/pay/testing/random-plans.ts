import fc from 'fast-check';
import { OVERTIME_RULE_SETS } from '../overtime-rule-sets.ts';
import type { PayWeekInput, PersonPlace } from '../pay-week.types.ts';
import type { DatedPlan, PlanBase, PlanExtras } from '../plans/pay-plan.ts';
import { NO_EXTRAS } from '../plans/pay-plan.ts';
import { randomWeek } from './random-weeks.ts';

const amount = (most: number) => fc.integer({ min: 1, max: most }).map((cents) => (cents / 100).toFixed(2));
const percent = fc.integer({ min: 0, max: 6000 }).map((hundredths) => (hundredths / 100).toFixed(2));
const other = fc.record({
  hourly: amount(3000),
  agreement: fc.constantFrom(null, { signedOn: '2026-01-01', note: 'Signed' }),
});
const tiers = fc
  .tuple(fc.integer({ min: 0, max: 30 }), fc.integer({ min: 0, max: 30 }), fc.integer({ min: 1, max: 900 }))
  .map(([low, more, over]) => [
    { over: '0', percent: String(low) },
    { over: String(over), percent: String(low + more) },
  ]);

export const randomBase: fc.Arbitrary<PlanBase> = fc.oneof(
  fc.record({ kind: fc.constant('hourly' as const), hourly: amount(4000) }),
  fc.record({ kind: fc.constant('hourly_plus_percent' as const), hourly: amount(4000), percent }),
  fc.record({ kind: fc.constant('flat_with_floor' as const), floor: amount(3000), other }),
  fc.record({ kind: fc.constant('percent_with_floor' as const), percent, floor: amount(3000), other }),
  fc.record({
    kind: fc.constant('salary' as const),
    amount: amount(200_000),
    period: fc.constantFrom('weekly' as const, 'monthly' as const),
    coversHours: fc.integer({ min: 20, max: 60 }).map(String),
  }),
  fc.record({ kind: fc.constant('weekly_guarantee' as const), hourly: amount(3000), percent, weekly: amount(90_000) }),
  fc.record({ kind: fc.constant('better_of' as const), hourly: amount(3000), percent, other }),
  fc.record({ kind: fc.constant('draw' as const), percent, weekly: amount(90_000), other }),
  fc.record({
    kind: fc.constant('tiered_percent' as const),
    tiers,
    mode: fc.constantFrom('marginal' as const, 'whole' as const),
    period: fc.constantFrom('week' as const, 'month' as const),
    other,
  }),
  fc.record({ kind: fc.constant('day_rate' as const), daily: amount(30_000) }),
  fc.record({ kind: fc.constant('job_rate' as const), perJob: amount(9000), other }),
);

const extras: fc.Arbitrary<PlanExtras> = fc.record({
  premiums: fc.constantFrom(
    [],
    [{ label: 'Late', perHour: '1.35', kinds: [], between: { from: '17:00', to: '23:00' } }],
    [{ label: 'Lead', perHour: '0.95', kinds: ['job' as const], between: null }],
  ),
  trainingHourly: fc.option(amount(3000), { nil: null }),
  helperHourly: fc.option(amount(3000), { nil: null }),
  hourlyByService: fc.constantFrom([], [{ serviceId: 'wash', hourly: '21.15' }]),
  flats: fc.constantFrom([], [{ serviceId: 'wash', sizeClass: null, amount: '33.33' }]),
  perAddOn: fc.option(amount(1000), { nil: null }),
  attendance: fc.option(fc.record({ amount: amount(9000), days: fc.integer({ min: 1, max: 7 }) }), { nil: null }),
  percentOfTotal: fc.option(percent, { nil: null }),
});

/** Weeks in which everybody has a plan and most work in a place of their own. */
export const plannedWeek: fc.Arbitrary<PayWeekInput> = fc
  .record({
    week: randomWeek,
    bases: fc.array(randomBase, { minLength: 3, maxLength: 3 }),
    extras: fc.oneof(fc.constant(NO_EXTRAS), extras),
    ruleSets: fc.array(fc.constantFrom(...OVERTIME_RULE_SETS), { minLength: 2, maxLength: 2 }),
    wage: amount(2000),
    deficit: fc.integer({ min: 0, max: 50_000 }),
    rounding: fc.constantFrom('half_up' as const, 'up' as const),
  })
  .map(({ week, bases, extras: added, ruleSets, wage, deficit, rounding }) => ({
    ...week,
    rules: { ...week.rules, premiumRounding: rounding },
    plans: week.people.map(({ id }, at): DatedPlan => ({
      ...{ id: `plan-${id}`, personId: id, startsOn: '2026-01-05' },
      plan: { base: bases[at] ?? { kind: 'hourly', hourly: '10' }, extras: added },
    })),
    places: ruleSets.map((ruleSet, at): PersonPlace => ({
      ...{ personId: week.people[at]?.id ?? '', placeId: `place-${at}`, name: ruleSet.name, ruleSet },
      minimumWages: [{ startsOn: '2026-01-01', amount: wage }],
    })),
    carried: [{ personId: 'ada', drawDeficitCents: deficit, weeks: [] }],
  }));
