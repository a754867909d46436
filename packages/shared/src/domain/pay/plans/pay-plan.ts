import { z } from 'zod';
import { clockTime, day, decimal, id, shortText, sizeClass } from '../../../contracts/fields.ts';

/** How one person is paid from a date on. Amounts are decimal dollars, percents decimal (6 is 6 %), hours decimal. */
const amount = decimal.refine((value) => Number(value) > 0, 'Give an amount above zero.');
const percent = decimal.refine((value) => Number(value) <= 100, 'A percent is at most 100.');

/** Kinds of worked time a premium may be for. */
export const planClockKinds = ['job', 'travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break'] as const;

/**
 * Travel, waiting and other time beside the jobs: paid by the hour, unless a recorded, dated agreement says that the
 * flat amounts or the commission cover it (29 CFR 778.318(c)) and the place allows that.
 */
const otherTime = z.strictObject({
  hourly: amount,
  agreement: z
    .strictObject({ signedOn: day, note: shortText.min(1, 'Say what was agreed and where it is kept.') })
    .nullable(),
});

const tier = z.strictObject({ over: decimal, percent });
const tiers = z
  .array(tier)
  .min(1, 'Give at least one tier.')
  .max(8, 'At most 8 tiers.')
  .refine((list) => Number(list[0]?.over) === 0, 'The first tier starts at 0.')
  .refine(
    (list) =>
      list.every((item, index) => {
        const before = list[index - 1];
        return !before || (Number(item.over) > Number(before.over) && Number(item.percent) >= Number(before.percent));
      }),
    'Each tier starts higher than the one before, and its percent is not lower.',
  );

export const salaryPeriods = ['weekly', 'biweekly', 'semimonthly', 'monthly', 'annual'] as const;

const planBase = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('hourly'), hourly: amount }),
  z.strictObject({ kind: z.literal('hourly_plus_percent'), hourly: amount, percent }),
  z.strictObject({ kind: z.literal('flat_with_floor'), floor: amount, other: otherTime }),
  z.strictObject({ kind: z.literal('percent_with_floor'), percent, floor: amount, other: otherTime }),
  z.strictObject({
    kind: z.literal('salary'),
    amount,
    period: z.enum(salaryPeriods),
    coversHours: amount.refine((value) => Number(value) <= 60, 'At most 60 hours a week.'),
  }),
  z.strictObject({ kind: z.literal('weekly_guarantee'), hourly: amount, percent, weekly: amount }),
  z.strictObject({ kind: z.literal('better_of'), hourly: amount, percent, other: otherTime }),
  z.strictObject({ kind: z.literal('draw'), percent, weekly: amount, other: otherTime }),
  z.strictObject({
    kind: z.literal('tiered_percent'),
    tiers,
    mode: z.enum(['marginal', 'whole']),
    period: z.enum(['week', 'month']),
    other: otherTime,
  }),
  z.strictObject({ kind: z.literal('day_rate'), daily: amount }),
  z.strictObject({ kind: z.literal('job_rate'), perJob: amount, other: otherTime }),
  /** Back to the dated rates of everybody. */
  z.strictObject({ kind: z.literal('rates') }),
]);

const premium = z
  .strictObject({
    label: shortText.min(1, 'Name the premium.'),
    perHour: amount,
    /** Empty: for every kind of worked time. */
    kinds: z.array(z.enum(planClockKinds)),
    /** Clock times of the company's zone within one day; null for the whole day. */
    between: z
      .strictObject({ from: clockTime, to: clockTime })
      .refine(({ from, to }) => from < to, 'The window ends after it starts, on the same day.')
      .nullable(),
  })
  .describe('Role or shift premium');

const planExtras = z.strictObject({
  premiums: z.array(premium).max(6, 'At most 6 premiums.'),
  trainingHourly: amount.nullable(),
  /** Job time on a visit on which the person has no share, as a trainee. */
  helperHourly: amount.nullable(),
  hourlyByService: z.array(z.strictObject({ serviceId: id, hourly: amount })).max(60),
  flats: z.array(z.strictObject({ serviceId: id, sizeClass: sizeClass.nullable(), amount })).max(200),
  perAddOn: amount.nullable(),
  attendance: z.strictObject({ amount, days: z.int().min(1).max(7) }).nullable(),
  percentOfTotal: percent.nullable(),
});

export const payPlan = z
  .strictObject({ base: planBase, extras: planExtras })
  .refine(({ base, extras }) => base.kind !== 'flat_with_floor' || extras.flats.length > 0, {
    path: ['extras', 'flats'],
    message: 'Give the flat amount of at least one service.',
  });

export type PayPlan = z.infer<typeof payPlan>;
export type PlanBase = PayPlan['base'];
export type PlanKind = PlanBase['kind'];
export type PlanExtras = PayPlan['extras'];
export type OtherTime = z.infer<typeof otherTime>;
export type PlanOf<K extends PlanKind> = Extract<PlanBase, { kind: K }>;

/** Nothing beside the base. */
export const NO_EXTRAS: PlanExtras = {
  premiums: [],
  trainingHourly: null,
  helperHourly: null,
  hourlyByService: [],
  flats: [],
  perAddOn: null,
  attendance: null,
  percentOfTotal: null,
};

export interface DatedPlan {
  id: string;
  personId: string;
  /** First day of a workweek: a plan holds for whole workweeks. */
  startsOn: string;
  plan: PayPlan;
}

/** The plan of a person for the workweek that starts on a day: the latest that had started; null for none. */
export function planInForce(plans: readonly DatedPlan[], weekStartsOn: string): DatedPlan | null {
  let best: DatedPlan | null = null;
  for (const plan of plans) {
    if (plan.startsOn > weekStartsOn) continue;
    if (best === null || plan.startsOn > best.startsOn || (plan.startsOn === best.startsOn && plan.id > best.id))
      best = plan;
  }
  return best?.plan.base.kind === 'rates' ? null : best;
}
