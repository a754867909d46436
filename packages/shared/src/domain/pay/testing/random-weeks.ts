import fc from 'fast-check';
import type { ClockKind, PayWeekInput } from '../pay-week.types.ts';
import { aDoneLine, anAdjustment, anEntry, aRate, aTip, aWeek } from './pay-week.factory.ts';

const MINUTE = 60_000;
const KINDS: ClockKind[] = ['job', 'travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break'];

/** Ordinary weeks and both weeks in which the clocks change, by the start of the week in New York. */
const WEEKS = [
  ['2026-05-04T04:00:00.000Z', '2026-05-11T04:00:00.000Z'],
  ['2026-03-02T05:00:00.000Z', '2026-03-09T04:00:00.000Z'],
  ['2026-10-26T04:00:00.000Z', '2026-11-02T05:00:00.000Z'],
  ['2026-05-04T10:30:00.000Z', '2026-05-11T10:30:00.000Z'],
] as const;

const money = (most: number) => fc.integer({ min: 0, max: most });
const decimal = (most: number) => fc.integer({ min: 1, max: most }).map((cents) => (cents / 100).toFixed(2));

/** Clock entries to the minute that neither overlap nor touch, from a day before the week to a day after it. */
const shifts = fc.array(
  fc.record({
    gap: fc.integer({ min: 1, max: 900 }),
    length: fc.integer({ min: 1, max: 700 }),
    kind: fc.constantFrom(...KINDS),
    interrupted: fc.boolean(),
  }),
  { maxLength: 25 },
);

const crew = fc.uniqueArray(fc.constantFrom('ada', 'bo', 'cy'), { minLength: 1 }).chain((ids) =>
  fc.tuple(
    ...ids.map((personId, position) =>
      fc.record({
        personId: fc.constant(personId),
        position: fc.constant(position),
        weight: fc.integer({ min: 0, max: 5 }),
        isTrainee: fc.boolean(),
        minutes: fc.integer({ min: 0, max: 300 }),
      }),
    ),
  ),
);

/** Weeks of three people under the federal rules, with all that a week can hold. */
export const randomWeek: fc.Arbitrary<PayWeekInput> = fc
  .record({
    week: fc.constantFrom(...WEEKS),
    shifts,
    hourly: fc.option(decimal(4000), { nil: null }),
    percent: fc.option(decimal(4000), { nil: null }),
    flat: fc.option(decimal(9000), { nil: null }),
    split: fc.constantFrom('equal', 'weights', 'minutes'),
    jobs: fc.array(fc.record({ sold: money(90_000), crew }), { maxLength: 6 }),
    tips: fc.array(fc.record({ amount: money(9000), crew, kept: fc.boolean() }), { maxLength: 3 }),
    bonus: money(20_000),
    refunded: money(5000),
    deduction: money(20_000),
  })
  .map((parts) => {
    const [startsAt, endsAt] = parts.week;
    let at = Date.parse(startsAt) - 24 * 60 * MINUTE;
    const entries = parts.shifts.map(({ gap, length, kind, interrupted }) => {
      const from = at + gap * MINUTE;
      at = from + length * MINUTE;
      return anEntry(new Date(from).toISOString(), new Date(at).toISOString(), { kind, interrupted });
    });
    const rate = (kind: 'hourly' | 'commission_percent' | 'flat_service', value: string | null) =>
      value === null ? [] : [aRate(kind, value)];
    return aWeek({
      startsAt,
      endsAt,
      asOf: endsAt,
      rules: { ...aWeek().rules, crewSplit: parts.split },
      people: ['ada', 'bo', 'cy'].map((id) => ({ id, name: id })),
      entries,
      rates: [
        ...rate('hourly', parts.hourly),
        ...rate('commission_percent', parts.percent),
        ...rate('flat_service', parts.flat),
      ],
      doneLines: parts.jobs.map((job, index) => aDoneLine(index, job.sold, { doneAt: startsAt, crew: job.crew })),
      tips: parts.tips.map((tip, index) =>
        aTip(`tip-${index}`, tip.amount, { crew: tip.crew, alreadyReceived: tip.kept }),
      ),
      adjustments: [
        anAdjustment('bonus', parts.bonus),
        anAdjustment('reimbursement', parts.refunded),
        anAdjustment('deduction', -parts.deduction),
      ],
    });
  });
