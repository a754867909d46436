import fc from 'fast-check';
import { expect, test } from 'vitest';
import { computePayWeek } from '../compute-pay-week.ts';
import type { PersonWeek } from '../pay-week.types.ts';
import { naivePlanWeek } from '../testing/naive-plan.ts';
import { randomBase } from '../testing/random-plans.ts';
import { randomWeek } from '../testing/random-weeks.ts';
import { NO_EXTRAS } from './pay-plan.ts';
import type { PlanBase, PlanExtras } from './pay-plan.ts';

/** Milliseconds for a whole property on a busy machine; nothing is measured. */
const PATIENCE = 240_000;

/** Plans that stand alone in a week, without agreements. */
const alone = randomBase
  .filter((base) => base.kind !== 'tiered_percent' && base.kind !== 'rates')
  .map((base): PlanBase => ('other' in base ? { ...base, other: { ...base.other, agreement: null } } : base));
const extras = fc.record({
  percentOfTotal: fc.option(
    fc.integer({ min: 1, max: 2000 }).map((hundredths) => (hundredths / 100).toFixed(2)),
    { nil: null },
  ),
  flats: fc.constantFrom<PlanExtras['flats']>([], [{ serviceId: 'wash', sizeClass: null, amount: '33.33' }]),
});

const sum = (person: PersonWeek, pick: (line: PersonWeek['lines'][number]) => boolean): bigint =>
  person.lines.filter(pick).reduce((total, line) => total + BigInt(line.amountCents), 0n);

test(
  'weeks under every plan agree with a second calculation by hand, to the cent',
  () => {
    fc.assert(
      fc.property(randomWeek, alone, extras, (week, base, added) => {
        const plan = { base, extras: { ...NO_EXTRAS, ...added } };
        const plans = week.people.map(({ id }) => ({ id: `plan-${id}`, personId: id, startsOn: '2026-01-05', plan }));
        for (const person of computePayWeek({ ...week, adjustments: [], plans }).people) {
          const naive = naivePlanWeek(week, person.personId, base, added);
          expect({
            included: sum(person, (line) => line.inRegularRate && line.kind !== 'minimum_wage_make_up'),
            makeUp: sum(person, (line) => line.kind === 'minimum_wage_make_up'),
            premium: sum(person, (line) => line.kind === 'overtime_premium'),
            beside: sum(person, (line) => line.kind === 'percentage_bonus'),
          }).toEqual(naive);
        }
      }),
      { numRuns: 1000 },
    );
  },
  PATIENCE,
);
