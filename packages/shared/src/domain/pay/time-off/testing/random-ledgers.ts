import fc from 'fast-check';
import { addDays } from '../../../time/zone.ts';
import type { LedgerInput } from '../time-off-ledger.ts';
import type { DatedTimeOffRule, TimeOffRule } from '../time-off-rule.ts';

const FIRST = '2026-11-02';
const WEEKS = 20;

const decimal = (most: number) => fc.integer({ min: 1, max: most * 4 }).map((quarters) => String(quarters / 4));
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: null });
const dayIn = fc.integer({ min: 0, max: WEEKS * 7 - 1 }).map((n) => addDays(FIRST, n));

const earning: fc.Arbitrary<TimeOffRule['earning']> = fc.oneof(
  fc.record({ by: fc.constant('hours_worked' as const), perHours: decimal(60) }),
  fc.record({ by: fc.constant('year' as const), hours: decimal(120) }),
  fc.record({
    by: fc.constant('holidays' as const),
    hours: decimal(10),
    dates: fc.uniqueArray(dayIn, { minLength: 1, maxLength: 4 }).map((days) => days.map((on) => ({ on, name: on }))),
  }),
  fc.constant({ by: 'none' as const }),
);

const rule: fc.Arbitrary<TimeOffRule> = fc.record({
  earning,
  capHours: maybe(decimal(60)),
  yearStartsOn: fc.constantFrom('01-01', '12-09', '02-28'),
  carryHours: maybe(decimal(40)),
  pays: fc.constant({ by: 'hourly' as const }),
});

const dated: fc.Arbitrary<DatedTimeOffRule[]> = fc
  .array(fc.record({ rule, week: fc.integer({ min: -4, max: WEEKS }), isOwn: fc.boolean() }), { maxLength: 4 })
  .map((list) =>
    list.map(({ rule: one, week, isOwn }, index) => ({
      ...{ id: `rule-${index}`, kind: 'sick', personId: isOwn ? 'ada' : null, rule: one },
      startsOn: addDays(FIRST, week * 7),
    })),
  );

const moves = (hours: fc.Arbitrary<string>, name: string) =>
  fc
    .array(fc.record({ on: dayIn, hours }), { maxLength: 6 })
    .map((list) => list.map((move, index) => ({ ...move, id: `${name}-${index}`, reason: name })));

/** Twenty weeks over a new year, under up to four rules of the company and the person. */
export const randomLedger: fc.Arbitrary<LedgerInput> = fc.record({
  kind: fc.constant('sick' as const),
  personId: fc.constant('ada'),
  rules: dated,
  weeks: fc.array(fc.integer({ min: 0, max: 60 * 60 }), { minLength: WEEKS, maxLength: WEEKS }).map((minutes) =>
    minutes.map((worked, index) => ({
      startsOn: addDays(FIRST, index * 7),
      endsOn: addDays(FIRST, index * 7 + 6),
      hoursWorked: `${worked}/60`,
    })),
  ),
  taken: moves(decimal(12), 'taken'),
  adjustments: moves(
    fc.tuple(decimal(30), fc.boolean()).map(([hours, isLess]) => (isLess ? `-${hours}` : hours)),
    'adjusted',
  ),
});
