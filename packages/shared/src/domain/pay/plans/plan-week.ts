import type { Exact } from '../../money/exact.ts';
import type { ClockStyle } from '../../time/format.ts';
import type { CarriedPay, CrewSplit, DoneLine, PayLine, PayPerson, SourceRef } from '../pay-week.types.ts';
import type { WorkSpan } from '../work-spans.ts';
import type { DatedPlan } from './pay-plan.ts';

/** One person's week as a plan looks at it. */
export interface PlanWeek {
  person: PayPerson;
  plan: DatedPlan;
  spans: readonly WorkSpan[];
  doneLines: readonly DoneLine[];
  hours: Exact;
  split: CrewSplit;
  zone: string;
  clock: ClockStyle;
  /** Whether this is the last workweek that ends in its month. */
  settles: boolean;
  carried: CarriedPay | null;
  /** False where the place wants other time paid apart whatever was agreed. */
  mayCoverOtherTime: boolean;
  /** The most hours that a salary may be divided by in this place; null without such a rule. */
  salaryHoursAtMost: Exact | null;
}

/** What a plan or the dated rates come to before promised bonuses, minimum wage and overtime. */
export interface BasePay {
  /** Lines inside the regular rate. */
  lines: PayLine[];
  /** Exact hours for which no pay had been set. */
  unpaidHours: Exact;
  /** Exact dollars that the lines hold for rest breaks. */
  restPaid: Exact;
  /** Exact dollars that the lines hold for hours that were not worked: no part of the regular rate. */
  notWorked: Exact;
  /** What of the settlement goes on to the next week, cents. */
  carries: { drawDeficitCents: number; tierBaseCents: number; tierPaidCents: number } | null;
}

export function planSource({ id, startsOn }: DatedPlan): SourceRef {
  return { kind: 'plan', id, label: `Plan since ${startsOn}` };
}
