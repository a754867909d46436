import type { SizeClass } from '../../contracts/fields.ts';
import type { ClockStyle } from '../time/format.ts';
import type { OvertimeRuleSet } from './overtime-rule-sets.ts';
import type { DatedPlan } from './plans/pay-plan.ts';
import type { NoShowTrip } from './time-off/no-show-trip.ts';
import type { DatedShowUpRule } from './time-off/show-up-rule.ts';
import type { TimeOffTaken } from './time-off/time-off-pay.ts';

/**
 * What the pay engine takes and gives. Amounts are integer US cents, rates and percents decimal strings,
 * hours exact fractions written as "n/d" or "n", instants ISO 8601 UTC strings, dates "YYYY-MM-DD" in the company's zone.
 */

/** All kinds are worked time but a meal break that is long enough and free of duty. */
export type ClockKind = 'job' | 'travel' | 'waiting' | 'shop' | 'training' | 'rest_break' | 'meal_break';

export interface PayEntry {
  id: string;
  kind: ClockKind;
  visitId: string | null;
  startedAt: string;
  /** null while the person is still on the clock: an error to settle before "checked". */
  endedAt: string | null;
  /** A meal break during which the person had to work counts as worked. */
  interrupted: boolean;
}

export type RateKind =
  | 'hourly'
  | 'commission_percent'
  | 'flat_service'
  | 'product_cost' // dollars a finished line, off what commission is a percentage of
  | 'mileage' // dollars a mile, paid back
  | 'per_review'; // dollars a review, a promised bonus

/** One dated rate. The most exact one that has started applies: person and service, person, company and service, company. */
export interface DatedRate {
  id: string;
  kind: RateKind;
  personId: string | null;
  serviceId: string | null;
  /** Only for hourly rates: a kind of work, or a service, paid at its own rate. */
  clockKind: ClockKind | null;
  /** Dollars an hour, percent (6 is 6 %), or dollars a finished line; a decimal string. */
  value: string;
  startsOn: string;
}

export type CrewSplit = 'equal' | 'weights' | 'minutes';

export interface CrewShare {
  personId: string;
  /** Crew order settles ties of a cent. */
  position: number;
  weight: number;
  isTrainee: boolean;
  /** Whole minutes on this visit, for the split by minutes. */
  minutes: number;
}

/** A finished job line on a done or part-done visit. Customers are named by the job's number only: lines and snapshots outlive a customer's erasure. */
export interface DoneLine {
  lineId: string;
  jobId: string;
  jobNumber: number;
  visitId: string;
  serviceId: string;
  serviceName: string;
  sizeClass: SizeClass;
  /** Sold beside a package: counts for a bonus by add-ons. */
  isAddOn: boolean;
  /** After discounts, before tax, tips and deposits. */
  commissionableCents: number;
  doneAt: string;
  crew: CrewShare[];
  /** What its products cost by the dated rates, cents: off the commission's base. */
  productCostCents?: number;
  /** Commission by the rule "when paid", and the customer had not paid when the week ended. */
  commissionWaits?: true;
}

/** Commission of a past week that became known in this one, because customers paid (29 CFR 778.119). */
export interface SettledCommission {
  personId: string;
  /** The week in which the work was done. */
  startsOn: string;
  number: number;
  /** That week as the person was paid for it, with what was settled into it since. */
  input: PayWeekInput;
  /** Its lines of which the customers have paid now. */
  lineIds: string[];
}

export interface PayTip {
  id: string;
  jobId: string;
  jobNumber: number;
  amountCents: number;
  method: 'card' | 'cash' | 'invoice';
  receivedAt: string;
  /** Cash kept on the spot: shown, adds nothing to what is to be paid. */
  alreadyReceived: boolean;
  /** Meant for one of the crew by the customer; counts where the rule says so. */
  forPersonId?: string | null;
  /** Only people who may share tips, in crew order. */
  crew: CrewShare[];
}

export type AdjustmentKind =
  | 'bonus' // promised or measured: inside the regular rate (29 CFR 778.208-.211)
  | 'discretionary_bonus' // 29 CFR 778.211: outside
  | 'reimbursement' // 29 CFR 778.217: outside
  | 'paid_time_off' // 29 CFR 778.218: outside
  | 'refund' // negative; a customer's refund, off this week's commission alone (29 CFR 778.121)
  | 'deduction' // negative; never below the minimum wage or into overtime (29 CFR 531.35, .37)
  | 'correction'; // names a line of a locked week: outside this week's regular rate

export interface PayAdjustment {
  id: string;
  personId: string;
  kind: AdjustmentKind;
  /** Signed. */
  amountCents: number;
  reason: string;
  correctsLineId: string | null;
  /** Where the amount is a count times a dated rate. */
  counted?: CountedAmount | null;
  /** Only for paid time off that was given in hours. */
  timeOff?: TimeOffTaken | null;
}

/** Miles driven or reviews received, times the rate of their day. */
export interface CountedAmount {
  unit: 'mile' | 'review';
  /** Decimal. */
  quantity: string;
  rateId: string;
  /** Decimal dollars each. */
  value: string;
  startsOn: string;
}

export interface PayPerson {
  id: string;
  name: string;
}

export interface PayRules {
  /** Key into the overtime rule sets, `us_federal` to begin with. */
  overtimeRuleSet: string;
  /** Dollars an hour. */
  minimumWage: string;
  crewSplit: CrewSplit;
  /** A meal break at least this long, free of duty, is not worked (29 CFR 785.19). */
  mealBreakMinutes: number;
  /** Punches count to the nearest so many minutes; null for the exact time (29 CFR 785.48(b)). */
  punchRoundingMinutes: 5 | 6 | 15 | null;
  premiumRounding: PremiumRounding;
  /** Absent: tips are shared by the crew and card tips are paid whole. */
  tips?: TipRules;
}

export interface TipRules {
  /** A tip meant for one of the crew goes to that person, or is shared like the rest. */
  goTo: 'crew' | 'person';
  /** The card fee that really comes off, percent; only where the place allows it. */
  cardFeePercent: string;
}

/** The week that commission belongs to by the written plan: of Done, or only once the customer has paid. */
export type CommissionEarned = 'done' | 'paid';

/** Overtime premiums to the cent: half up like every line, or always up. */
export type PremiumRounding = 'half_up' | 'up';

/** Where a person works: rules that run beside the federal ones. Without one, the company's rules alone. */
export interface PersonPlace {
  personId: string;
  placeId: string;
  name: string;
  /** The whole rule set, so that a locked week needs no list to be worked out again. */
  ruleSet: OvertimeRuleSet;
  /** Dollars an hour from dates on, oldest first; the company's wage holds where it is higher. */
  minimumWages: { startsOn: string; amount: string }[];
}

/** What earlier workweeks of the same month leave to this one; a month is the workweeks that end in it. */
export interface CarriedPay {
  personId: string;
  /** Draw paid beyond the commission earned so far, cents. */
  drawDeficitCents: number;
  /** The earlier workweeks of the month, oldest first. */
  weeks: CarriedWeek[];
}

export interface CarriedWeek {
  startsOn: string;
  hours: string;
  /** Hours times the part of the regular rate they carry on top: half for overtime, one for double time. */
  premiumHours: string;
  /** Commissionable cents and what was paid on them so far. */
  tierBaseCents: number;
  tierPaidCents: number;
}

export interface PayWeekInput {
  startsAt: string;
  endsAt: string;
  zone: string;
  /** How clock times are written in warnings. */
  clock: ClockStyle;
  rules: PayRules;
  people: PayPerson[];
  entries: (PayEntry & { personId: string })[];
  rates: DatedRate[];
  doneLines: DoneLine[];
  tips: PayTip[];
  adjustments: PayAdjustment[];
  /** Plans that may be in force; a person without one is paid by rates. */
  plans: DatedPlan[];
  places: PersonPlace[];
  carried: CarriedPay[];
  /** Absent in weeks locked before there were such rules. */
  showUpRules?: DatedShowUpRule[];
  noShowTrips?: NoShowTrip[];
  /** Days away that were written down: who left for one was not sent home. Both ends included. */
  daysAway?: { personId: string; startsOn: string; endsOn: string }[];
  /** Whose overtime goes by the rate in effect, by an agreement made before the work (29 USC 207(g)(2)). */
  ratesInEffect?: { personId: string; signedOn: string }[];
  /** Absent where commission is earned when the work is done. */
  settledCommissions?: SettledCommission[];
  /** The instant that open entries are measured to, for a draft of the running week. */
  asOf: string;
}

export type PayLineKind =
  | 'hourly'
  | 'flat'
  | 'commission'
  | 'overtime_premium'
  | 'salary'
  | 'day_rate'
  | 'job_rate'
  | 'premium_pay' // by the hour, for a role or a shift
  | 'plan_floor' // up to an hourly floor, a weekly guarantee or a draw; a draw paid back is negative
  | 'rest_pay' // rest breaks of piece work, paid apart
  | 'percentage_bonus' // of straight and overtime pay alike (29 CFR 778.210): outside
  | 'commission_settlement' // of a month's tiers or of past weeks: outside this week's regular rate
  | 'settlement_premium' // the overtime that a settlement brings to the weeks it belongs to
  | 'minimum_wage_make_up'
  | 'show_up_pay' // for hours of a short day that were not worked (29 CFR 778.220): outside
  | 'no_show_trip' // for a trip on which nobody was home: work done, so inside
  | 'tip'
  | 'tip_already_received'
  | AdjustmentKind;

/** One step of how an amount was worked, in the order a person would do it by hand. */
export interface WorkingStep {
  label: string;
  /** Plain words for where it comes from: a rule, a dated rate, a list of days. */
  note: string;
  /** The arithmetic as read: "42.25 h × 19.50". */
  arithmetic: string;
  result: string;
  sources: SourceRef[];
}

export interface SourceRef {
  kind: 'clock_entry' | 'job' | 'visit' | 'rate' | 'rule' | 'tip' | 'adjustment' | 'pay_line' | 'plan';
  id: string;
  label: string;
}

export interface PayLine {
  /** Stable within a computation: "hourly:<rateId>:<kind>", "commission:<lineId>" ... */
  key: string;
  personId: string;
  kind: PayLineKind;
  label: string;
  /** Company-zone date of the work, where one line has one date. */
  workedOn: string | null;
  /** Exact hours as a fraction, where the line is paid by time. */
  hours: string | null;
  /** Dollars an hour or percent, decimal or "n/d" for the exact regular rate. */
  rate: string | null;
  amountCents: number;
  /** False for what is shown but not handed over again (cash tips already received). */
  isPayable: boolean;
  inRegularRate: boolean;
  jobId: string | null;
  jobNumber: number | null;
  visitId: string | null;
  correctsLineId: string | null;
  working: WorkingStep[];
  /** The law or house rule, in words: "29 CFR 778.110(b)". */
  rule: string;
}

export type PayWarningCode =
  | 'open_entry'
  | 'overlapping_entries'
  | 'short_meal_break'
  | 'done_without_clock'
  | 'no_hourly_rate'
  | 'under_minimum_wage'
  | 'deduction_refused';

export interface PayWarning {
  code: PayWarningCode;
  personId: string;
  /** Blocks "checked" until settled. */
  isBlocking: boolean;
  message: string;
  entryId: string | null;
  jobId: string | null;
}

export interface PersonWeek {
  personId: string;
  name: string;
  /** Exact worked hours per company-zone day, "YYYY-MM-DD" to fraction. */
  hoursByDay: Record<string, string>;
  hoursWorked: string;
  overtimeHours: string;
  /** Exact quotient in dollars an hour, null without hours. */
  regularRate: string | null;
  lines: PayLine[];
  warnings: PayWarning[];
  /** Commission of finished work that waits until the customer pays; absent where none does. */
  waiting?: { amountCents: number; jobs: { jobId: string; jobNumber: number }[] };
  /** Only under a plan that settles by the month: what goes on to the next workweek of the month. */
  carries?: Omit<CarriedWeek, 'startsOn' | 'hours'> & { drawDeficitCents: number };
  /** Sums of payable lines by group, cents. */
  totals: {
    hourly: number;
    flat: number;
    commission: number;
    overtimePremium: number;
    makeUp: number;
    tips: number;
    tipsAlreadyReceived: number;
    adjustments: number;
    gross: number;
  };
}

export interface PayWeekResult {
  engineVersion: string;
  people: PersonWeek[];
}
