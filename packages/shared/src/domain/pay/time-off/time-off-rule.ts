import { z } from 'zod';
import { day, decimal, shortText } from '../../../contracts/fields.ts';

export const timeOffKinds = ['sick', 'vacation', 'holiday'] as const;
export type TimeOffKind = (typeof timeOffKinds)[number];
export const timeOffKindNames: Record<TimeOffKind, string> = { sick: 'Sick', vacation: 'Vacation', holiday: 'Holiday' };

const hours = decimal
  .refine((value) => Number(value) > 0, 'Give hours above zero.')
  .refine((value) => Number(value) <= 2000, 'At most 2,000 hours.');

/** A day of every year, "MM-DD". */
const dayOfYear = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, 'Give a month and day like 01-01.')
  .refine((value) => isDayOfEveryYear(value), 'Choose a day that every year has.');

const earning = z.discriminatedUnion('by', [
  /** One hour for every so many hours worked, exactly; the fraction is kept. */
  z.strictObject({ by: z.literal('hours_worked'), perHours: hours }),
  /** So many hours on the day the year begins. */
  z.strictObject({ by: z.literal('year'), hours }),
  z.strictObject({
    by: z.literal('holidays'),
    /** For each date. */
    hours,
    dates: z
      .array(z.strictObject({ on: day, name: shortText.min(1, 'Name the holiday.') }))
      .min(1, 'Give at least one date.')
      .max(60, 'At most 60 dates.'),
  }),
  /** Nothing more from this start on; what is there stays. */
  z.strictObject({ by: z.literal('none') }),
]);

/** How paid time off of one kind is earned, kept and paid. Hours and dollars are decimal text. */
export const timeOffRule = z.strictObject({
  earning,
  /** Earning stops here. Hours that are there already are never taken away by a cap. */
  capHours: hours.nullable(),
  yearStartsOn: dayOfYear,
  /** At most so many hours go on into a new year; null for all of them. */
  carryHours: decimal.nullable(),
  pays: z.discriminatedUnion('by', [
    z.strictObject({ by: z.literal('hourly') }),
    z.strictObject({
      by: z.literal('fixed'),
      dollars: decimal.refine((value) => Number(value) > 0, 'Give an amount above zero.'),
    }),
  ]),
});
export type TimeOffRule = z.infer<typeof timeOffRule>;

export interface DatedTimeOffRule {
  id: string;
  kind: TimeOffKind;
  /** Null for the company's. */
  personId: string | null;
  /** First day of a workweek. */
  startsOn: string;
  rule: TimeOffRule;
}

/** The rule for a person on a day: the person's own before the company's, then the latest that had started. */
export function timeOffRuleOn(
  rules: readonly DatedTimeOffRule[],
  { kind, personId }: { kind: TimeOffKind; personId: string },
  on: string,
): DatedTimeOffRule | null {
  let best: DatedTimeOffRule | null = null;
  for (const rule of rules) {
    const answers = rule.kind === kind && rule.startsOn <= on && (rule.personId === null || rule.personId === personId);
    if (answers && (best === null || isBefore(best, rule))) best = rule;
  }
  return best;
}

function isBefore(a: DatedTimeOffRule, b: DatedTimeOffRule): boolean {
  if ((a.personId === null) !== (b.personId === null)) return a.personId === null;
  return a.startsOn === b.startsOn ? a.id < b.id : a.startsOn < b.startsOn;
}

/** "1 h for every 30 h worked, at most 40 h": a rule as people read it. */
export function timeOffRuleWords({ earning, capHours, carryHours, pays }: TimeOffRule): string {
  const parts = [earningWords(earning)];
  if (capHours !== null) parts.push(`at most ${capHours} h`);
  if (carryHours !== null) parts.push(`${carryHours} h go on into a new year`);
  parts.push(pays.by === 'hourly' ? 'paid at the hourly rate' : `paid ${pays.dollars} an hour`);
  return parts.join(', ');
}

function earningWords(by: TimeOffRule['earning']): string {
  switch (by.by) {
    case 'hours_worked':
      return `1 h for every ${by.perHours} h worked`;
    case 'year':
      return `${by.hours} h a year`;
    case 'holidays':
      return `${by.hours} h for each of ${by.dates.length === 1 ? '1 date' : `${by.dates.length} dates`}`;
    case 'none':
      return 'Nothing more is earned';
  }
}

function isDayOfEveryYear(value: string): boolean {
  // 2025 is no leap year.
  return z.iso.date().safeParse(`2025-${value}`).success;
}
