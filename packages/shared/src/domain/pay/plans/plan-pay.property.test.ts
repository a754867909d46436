import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact } from '../../money/exact.ts';
import { computePayWeek } from '../compute-pay-week.ts';
import type { PayWeekInput, PersonWeek } from '../pay-week.types.ts';
import { plannedWeek } from '../testing/random-plans.ts';
import { tieredCommission } from './tiered-commission.ts';
import type { PlanBase } from './pay-plan.ts';

const RUNS = { numRuns: 300 };
/** Milliseconds for a whole property on a busy machine; nothing is measured. */
const PATIENCE = 120_000;
const people = (input: PayWeekInput): PersonWeek[] => computePayWeek(input).people;
const cents = (person: PersonWeek, pick: (line: PersonWeek['lines'][number]) => boolean): number =>
  person.lines.filter(pick).reduce((sum, line) => sum + line.amountCents, 0);

describe('random weeks with plans and places', { timeout: PATIENCE }, () => {
  it('have lines of one key each that add up to the gross, and groups that do too', () => {
    fc.assert(
      fc.property(plannedWeek, (input) => {
        for (const person of people(input)) {
          const { totals, lines } = person;
          expect(cents(person, (line) => line.isPayable)).toBe(totals.gross);
          const { hourly, flat, commission, overtimePremium, makeUp, tips, adjustments } = totals;
          expect(hourly + flat + commission + overtimePremium + makeUp + tips + adjustments).toBe(totals.gross);
          expect(new Set(lines.map((line) => line.key)).size).toBe(lines.length);
        }
      }),
      RUNS,
    );
  });

  it('meet the higher minimum wage for every hour, whatever the plan', () => {
    fc.assert(
      fc.property(plannedWeek, (input) => {
        for (const person of people(input)) {
          const place = input.places.find((item) => item.personId === person.personId);
          const wage = Math.max(725, Math.round(Number(place?.minimumWages[0]?.amount ?? 0) * 100));
          const paid = cents(person, (line) => line.inRegularRate);
          expect(exact(paid).gte(exact(person.hoursWorked).mul(wage))).toBe(true);
        }
      }),
      RUNS,
    );
  });

  it('owe at least half the regular rate for each hour over 40, and nothing without hours', () => {
    fc.assert(
      fc.property(plannedWeek, (input) => {
        for (const person of people(input)) {
          const premium = cents(person, (line) => line.kind === 'overtime_premium');
          const over = exact(person.hoursWorked).sub(40);
          if (exact(person.overtimeHours).equals(0)) expect(premium).toBe(0);
          if (over.gt(0) && person.regularRate !== null)
            expect(exact(premium).add(exact('1/2')).gte(exact(person.regularRate).mul(50).mul(over))).toBe(true);
        }
      }),
      RUNS,
    );
  });

  it('do not depend on the order of what was recorded, nor on an entry being split', () => {
    fc.assert(
      fc.property(plannedWeek, fc.nat(), (input, pick) => {
        const turned = {
          ...input,
          entries: input.entries.toReversed(),
          doneLines: input.doneLines.toReversed(),
          plans: input.plans.toReversed(),
          places: input.places.toReversed(),
        };
        expect(computePayWeek(turned)).toEqual(computePayWeek(input));
        const entry = input.entries[pick % Math.max(1, input.entries.length)];
        if (!entry?.endedAt) return;
        const from = Date.parse(entry.startedAt);
        const cut = new Date(from + Math.floor((Date.parse(entry.endedAt) - from) / 2000) * 1000).toISOString();
        const others = input.entries.filter((item) => item !== entry);
        const halves = [...others, { ...entry, endedAt: cut }, { ...entry, id: 'second half', startedAt: cut }];
        const figures = (week: PayWeekInput) =>
          people(week).map(({ totals, hoursByDay, regularRate }) => ({ totals, hoursByDay, regularRate }));
        expect(figures({ ...input, entries: halves })).toEqual(figures(input));
      }),
      RUNS,
    );
  });

  it('never pay less when the plan’s pay is raised, but across a rule’s own rate gate', () => {
    fc.assert(
      fc.property(plannedWeek, fc.integer({ min: 1, max: 400 }), (input, more) => {
        const raised = { ...input, plans: input.plans.map((dated) => ({ ...dated, plan: raise(dated.plan, more) })) };
        const before = people(input);
        people(raised).forEach((person, at) => {
          const place = input.places.find((item) => item.personId === person.personId);
          if (place?.ruleSet.dailyGateMultiple) return;
          const was = before[at];
          // What a draw takes back is limited by commission, so a raise may bring more of it back, never below the draw.
          if (!was || input.plans[at]?.plan.base.kind === 'draw') return;
          // Shares by largest remainder: a larger whole may move the odd cent of a shared line to another of the crew.
          const shared = input.doneLines.filter((line) => line.crew.length > 1).length;
          // Rest breaks paid apart are a line of their own, less what the hour already pays for them: cents of rounding.
          const apart = place?.ruleSet.paysPieceRest ? 3 : 0;
          expect(person.totals.gross).toBeGreaterThanOrEqual(was.totals.gross - 2 * shared - apart);
        });
      }),
      RUNS,
    );
  });

  it('never pay less under a draw than the draw, and never take back more than was carried', () => {
    fc.assert(
      fc.property(plannedWeek, (input) => {
        for (const person of people(input)) {
          const base = input.plans.find((dated) => dated.personId === person.personId)?.plan.base;
          if (base?.kind !== 'draw') continue;
          const pay = cents(person, (line) => line.kind === 'commission' || line.key === 'draw');
          const isPaid = pay > 0 || exact(person.hoursWorked).gt(0);
          if (isPaid) expect(pay).toBeGreaterThanOrEqual(Math.round(Number(base.weekly) * 100));
          const carried = input.carried.find((item) => item.personId === person.personId)?.drawDeficitCents ?? 0;
          expect(cents(person, (line) => line.key === 'draw' && line.amountCents < 0)).toBeGreaterThanOrEqual(-carried);
        }
      }),
      RUNS,
    );
  });

  it('tiers never pay less for more sold', () => {
    const tiers = [
      { over: '0', percent: '5' },
      { over: '100', percent: '7.5' },
      { over: '400', percent: '7.5' },
    ];
    fc.assert(
      fc.property(
        fc.nat(60_000),
        fc.nat(60_000),
        fc.constantFrom('marginal' as const, 'whole' as const),
        (a, b, mode) => {
          const [less, more] = [Math.min(a, b), Math.max(a, b)].map((sold) =>
            tieredCommission(exact(sold).div(100), { tiers, mode }),
          );
          expect(less && more?.gte(less)).toBe(true);
        },
      ),
      RUNS,
    );
  });
});

/** Every amount and percentage of the base that pays, a little higher. */
function raise(plan: PayWeekInput['plans'][number]['plan'], more: number): typeof plan {
  const up = (value: string): string => (Number(value) + more / 100).toFixed(2);
  const base: PlanBase = { ...plan.base };
  if ('hourly' in base) base.hourly = up(base.hourly);
  if ('percent' in base) base.percent = up(base.percent);
  if ('floor' in base) base.floor = up(base.floor);
  if ('daily' in base) base.daily = up(base.daily);
  if ('perJob' in base) base.perJob = up(base.perJob);
  if (base.kind === 'salary') base.amount = up(base.amount);
  if (base.kind === 'weekly_guarantee') base.weekly = up(base.weekly);
  return { ...plan, base };
}
