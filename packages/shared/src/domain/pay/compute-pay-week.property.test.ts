import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact, fractionText } from '../money/exact.ts';
import { computePayWeek } from './compute-pay-week.ts';
import { OVERTIME_RULE_SETS } from './overtime-rule-sets.ts';
import type { PayWeekInput, PersonWeek } from './pay-week.types.ts';
import { naiveWeek } from './testing/naive-week.ts';
import { randomWeek } from './testing/random-weeks.ts';

const RUNS = { numRuns: 250 };
/** Milliseconds for a whole property on a busy machine; nothing is measured. */
const PATIENCE = 120_000;

function figures({ hoursByDay, hoursWorked, overtimeHours, regularRate, totals, lines }: PersonWeek) {
  return {
    hoursByDay,
    hoursWorked,
    overtimeHours,
    regularRate,
    totals,
    lines: lines.map(({ key, amountCents }) => [key, amountCents]),
  };
}

/** Cents inside the regular rate, without the make-up. */
function included({ totals, lines }: PersonWeek): number {
  const bonus = lines.filter((line) => line.kind === 'bonus').reduce((sum, line) => sum + line.amountCents, 0);
  return totals.hourly + totals.flat + totals.commission + bonus;
}

const gross = (input: PayWeekInput): number[] => computePayWeek(input).people.map(({ totals }) => totals.gross);

describe('random weeks', { timeout: PATIENCE }, () => {
  it('come to the same cents as an independent calculation', () => {
    fc.assert(
      fc.property(randomWeek, (input) => {
        for (const person of computePayWeek(input).people) {
          const naive = naiveWeek(input, person.personId);
          const { totals } = person;
          expect({
            minutes: fractionText(exact(person.hoursWorked).mul(60)),
            included: included(person),
            makeUp: totals.makeUp,
            premium: totals.overtimePremium,
            tips: totals.tips,
            gross: totals.gross,
          }).toEqual({ ...mapToNumbers(naive), minutes: naive.minutes.toString() });
        }
      }),
      { numRuns: 1500 },
    );
  });

  it('have lines that add up to the gross, and groups that do too', () => {
    fc.assert(
      fc.property(randomWeek, (input) => {
        for (const { lines, totals } of computePayWeek(input).people) {
          expect(lines.filter((line) => line.isPayable).reduce((sum, line) => sum + line.amountCents, 0)).toBe(
            totals.gross,
          );
          const { hourly, flat, commission, overtimePremium, makeUp, tips, adjustments } = totals;
          expect(hourly + flat + commission + overtimePremium + makeUp + tips + adjustments).toBe(totals.gross);
          expect(new Set(lines.map((line) => line.key)).size).toBe(lines.length);
        }
      }),
      RUNS,
    );
  });

  it('share every job line and tip to the whole cent', () => {
    fc.assert(
      fc.property(randomWeek, (input) => {
        const lines = computePayWeek(input).people.flatMap((person) => person.lines);
        const cents = (key: string) =>
          lines.filter((line) => line.key === key).reduce((sum, line) => sum + line.amountCents, 0);
        for (const tip of input.tips) expect(cents(`tip:${tip.id}`)).toBe(tip.amountCents);
        const flat = input.rates.find((rate) => rate.kind === 'flat_service');
        for (const line of input.doneLines) {
          const isPaid = flat !== undefined && line.crew.some((member) => !member.isTrainee);
          expect(cents(`flat:${line.lineId}`)).toBe(isPaid ? Math.round(Number(flat.value) * 100) : 0);
        }
      }),
      RUNS,
    );
  });

  it('do not depend on the order of what was recorded', () => {
    fc.assert(
      fc.property(randomWeek, (input) => {
        const turned = {
          ...input,
          entries: input.entries.toReversed(),
          doneLines: input.doneLines.toReversed(),
          tips: input.tips.toReversed(),
          adjustments: input.adjustments.toReversed(),
          rates: input.rates.toReversed(),
        };
        expect(computePayWeek(turned)).toEqual(computePayWeek(input));
      }),
      RUNS,
    );
  });

  it('stay the same when an entry is split in two', () => {
    fc.assert(
      fc.property(randomWeek, fc.nat(), fc.integer({ min: 1, max: 99 }), (input, pick, percent) => {
        const entry = input.entries[pick % Math.max(1, input.entries.length)];
        if (!entry?.endedAt) return;
        const from = Date.parse(entry.startedAt);
        const cut = new Date(
          from + Math.floor(((Date.parse(entry.endedAt) - from) * percent) / 100_000) * 1000,
        ).toISOString();
        const others = input.entries.filter((item) => item !== entry);
        const split = {
          ...input,
          entries: [...others, { ...entry, endedAt: cut }, { ...entry, id: 'second half', startedAt: cut }],
        };
        expect(computePayWeek(split).people.map(figures)).toEqual(computePayWeek(input).people.map(figures));
      }),
      RUNS,
    );
  });

  it('never pay less when a rate is raised', () => {
    fc.assert(
      fc.property(randomWeek, fc.integer({ min: 1, max: 500 }), (input, more) => {
        const raised = {
          ...input,
          rates: input.rates.map((rate) => ({ ...rate, value: (Number(rate.value) + more / 100).toFixed(2) })),
        };
        const before = gross(input);
        gross(raised).forEach((cents, index) => {
          // Shares by largest remainder: a larger whole may move the odd cent of a shared line to another of the crew.
          const shared = input.doneLines.filter((line) => line.crew.length > 1).length;
          expect(cents).toBeGreaterThanOrEqual((before[index] ?? 0) - 2 * shared);
        });
      }),
      RUNS,
    );
  });

  it('have no overtime without hours over 40, and no less premium for a longer week', () => {
    fc.assert(
      fc.property(randomWeek, fc.integer({ min: 1, max: 300 }), (input, minutes) => {
        const [person] = computePayWeek(input).people;
        const last = input.entries.filter((entry) => entry.kind !== 'meal_break').at(-1);
        if (!person) return;
        if (exact(person.hoursWorked).lte(40))
          expect([person.overtimeHours, person.totals.overtimePremium]).toEqual(['0', 0]);
        if (!last?.endedAt || last !== input.entries.at(-1)) return;
        const endedAt = new Date(Date.parse(last.endedAt) + minutes * 60_000).toISOString();
        const longer = { ...input, entries: [...input.entries.slice(0, -1), { ...last, endedAt }] };
        expect(computePayWeek(longer).people[0]?.totals.overtimePremium).toBeGreaterThanOrEqual(
          person.totals.overtimePremium,
        );
      }),
      RUNS,
    );
  });

  it('pay no less under any place’s rules than under the federal ones, which always run beside them', () => {
    fc.assert(
      fc.property(randomWeek, fc.constantFrom(...OVERTIME_RULE_SETS), (input, rules) => {
        const federal = gross(input);
        gross({ ...input, rules: { ...input.rules, overtimeRuleSet: rules.key } }).forEach((cents, index) =>
          expect(cents).toBeGreaterThanOrEqual(federal[index] ?? 0),
        );
      }),
      RUNS,
    );
  });

  it('meet the minimum wage for every hour before tips and reimbursements', () => {
    fc.assert(
      fc.property(randomWeek, (input) => {
        for (const person of computePayWeek(input).people) {
          const paid = included(person) + person.totals.makeUp;
          expect(exact(paid).gte(exact(person.hoursWorked).mul(725))).toBe(true);
        }
      }),
      RUNS,
    );
  });
});

function mapToNumbers(week: ReturnType<typeof naiveWeek>): Record<string, number> {
  return Object.fromEntries(Object.entries(week).map(([name, value]) => [name, Number(value)]));
}
