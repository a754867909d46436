import { payPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import type { PayPlan, PlanKind } from '@driprail/shared/domain/pay/plans/pay-plan';

export interface PlanField {
  name: 'hourly' | 'percent' | 'floor' | 'amount' | 'coversHours' | 'weekly' | 'daily' | 'perJob';
  label: string;
}

interface KindWords {
  label: string;
  hint: string;
  fields: PlanField[];
  /** Whether travel, waiting and other time beside the jobs is asked for. */
  hasOther: boolean;
}

const HOUR: PlanField = { name: 'hourly', label: 'Dollars an hour' };
const PERCENT: PlanField = { name: 'percent', label: 'Percent of each line' };
const FLOOR: PlanField = { name: 'floor', label: 'Hourly floor, dollars' };

export const planKinds: Record<PlanKind, KindWords> = {
  hourly: { label: 'By the hour', hint: 'Every worked hour, whatever the work.', fields: [HOUR], hasOther: false },
  hourly_plus_percent: {
    label: 'By the hour, plus a percentage',
    hint: 'The hour pays the time, the percentage comes on top and counts in the regular rate.',
    fields: [HOUR, PERCENT],
    hasOther: false,
  },
  flat_with_floor: {
    label: 'Flat per line, with an hourly floor',
    hint: 'Flat amounts by service and size. Where they come to less than the floor for the hours on jobs, the floor is paid.',
    fields: [FLOOR],
    hasOther: true,
  },
  percent_with_floor: {
    label: 'Percentage, with an hourly floor',
    hint: 'Where the percentage comes to less than the floor for the hours on jobs, the floor is paid.',
    fields: [PERCENT, FLOOR],
    hasOther: true,
  },
  salary: {
    label: 'Salary for a fixed workweek',
    hint: 'Says the hours it covers; hours beyond them are owed on top (29 CFR 778.113). Paid in weeks with any work.',
    fields: [
      { name: 'amount', label: 'Salary, dollars' },
      { name: 'coversHours', label: 'Covers hours a week' },
    ],
    hasOther: false,
  },
  weekly_guarantee: {
    label: 'Guaranteed weekly amount',
    hint: 'By the hour and by a percentage, but never less than the guarantee in a week with any work.',
    fields: [HOUR, PERCENT, { name: 'weekly', label: 'Guaranteed a week' }],
    hasOther: false,
  },
  better_of: {
    label: 'The better of hour and percentage',
    hint: 'Both are worked out each week and the better is paid.',
    fields: [HOUR, PERCENT],
    hasOther: true,
  },
  draw: {
    label: 'Draw against commission',
    hint: 'Each week pays at least the draw. What commission lacks is paid back from later commission of the same month; the rest is forgiven.',
    fields: [PERCENT, { name: 'weekly', label: 'Draw a week' }],
    hasOther: true,
  },
  tiered_percent: {
    label: 'Percentage by tiers',
    hint: 'By the month, the first tier is paid each week and the rest at the month’s end, with the overtime it brings (29 CFR 778.120).',
    fields: [],
    hasOther: true,
  },
  day_rate: {
    label: 'Day rate',
    hint: 'A fixed amount for each day with any work (29 CFR 778.112).',
    fields: [{ name: 'daily', label: 'Dollars a day' }],
    hasOther: false,
  },
  job_rate: {
    label: 'Job rate',
    hint: 'A fixed amount for each visit on which something was finished, shared in the crew.',
    fields: [{ name: 'perJob', label: 'Dollars a job' }],
    hasOther: true,
  },
  rates: {
    label: 'Back to the dated rates',
    hint: 'Paid by the rates on this page again.',
    fields: [],
    hasOther: false,
  },
};

export const plainKinds: PlanKind[] = ['hourly', 'hourly_plus_percent', 'flat_with_floor', 'percent_with_floor'];
export const moreKinds = (Object.keys(planKinds) as PlanKind[]).filter((kind) => !plainKinds.includes(kind));

export interface ServiceRow {
  serviceId: string;
  sizeClass: string;
  amount: string;
}

export interface TierRow {
  over: string;
  percent: string;
}

export interface PremiumRow {
  label: string;
  perHour: string;
  /** A kind of worked time, or empty for all. */
  kind: string;
  from: string;
  to: string;
}

export const EMPTY_PREMIUM: PremiumRow = { label: '', perHour: '', kind: '', from: '', to: '' };

/** What is typed; numbers stay text until the plan is made. */
export interface PlanDraft {
  kind: PlanKind;
  values: Partial<Record<PlanField['name'], string>>;
  period: string;
  otherHourly: string;
  isAgreed: boolean;
  signedOn: string;
  agreement: string;
  tiers: TierRow[];
  tierMode: string;
  tierPeriod: string;
  flats: ServiceRow[];
  hourlyByService: ServiceRow[];
  premiums: PremiumRow[];
  trainingHourly: string;
  helperHourly: string;
  perAddOn: string;
  attendance: { amount: string; days: string };
  percentOfTotal: string;
}

export const EMPTY_PLAN: PlanDraft = {
  kind: 'hourly',
  values: {},
  period: 'weekly',
  otherHourly: '',
  isAgreed: false,
  signedOn: '',
  agreement: '',
  tiers: [
    { over: '0', percent: '6' },
    { over: '2000', percent: '8' },
  ],
  tierMode: 'marginal',
  tierPeriod: 'week',
  flats: [],
  hourlyByService: [],
  premiums: [],
  trainingHourly: '',
  helperHourly: '',
  perAddOn: '',
  attendance: { amount: '', days: '5' },
  percentOfTotal: '',
};

export type PlanResult = { plan: PayPlan; faults: null } | { plan: null; faults: Record<string, string> };

/** The plan that was typed, or what is wrong by the path of its field: "base.hourly". */
export function planOf(draft: PlanDraft): PlanResult {
  const parsed = payPlan.safeParse({ base: baseOf(draft), extras: extrasOf(draft) });
  if (parsed.success) return { plan: parsed.data, faults: null };
  return {
    plan: null,
    // The first fault of a field is the plainest, so it is written last.
    faults: Object.fromEntries(parsed.error.issues.toReversed().map((issue) => [issue.path.join('.'), issue.message])),
  };
}

function baseOf(draft: PlanDraft): object {
  const { kind } = draft;
  const { fields, hasOther } = planKinds[kind];
  return {
    kind,
    ...Object.fromEntries(fields.map(({ name }) => [name, figure(draft.values[name] ?? '')])),
    ...(hasOther ? { other: otherOf(draft) } : {}),
    ...(kind === 'salary' ? { period: draft.period } : {}),
    ...(kind === 'tiered_percent'
      ? { tiers: tiersOf(draft.tiers), mode: draft.tierMode, period: draft.tierPeriod }
      : {}),
  };
}

function otherOf({ otherHourly, isAgreed, signedOn, agreement }: PlanDraft): object {
  return { hourly: figure(otherHourly), agreement: isAgreed ? { signedOn, note: agreement } : null };
}

function tiersOf(rows: readonly TierRow[]): object[] {
  return rows.map(({ over, percent }) => ({ over: figure(over), percent: figure(percent) }));
}

function extrasOf(draft: PlanDraft): object {
  const { attendance } = draft;
  return {
    premiums: draft.premiums.map(({ label, perHour, kind, from, to }) => ({
      ...{ label, perHour: figure(perHour), kinds: kind === '' ? [] : [kind] },
      between: from === '' && to === '' ? null : { from, to },
    })),
    trainingHourly: maybe(draft.trainingHourly),
    helperHourly: maybe(draft.helperHourly),
    hourlyByService: draft.hourlyByService.map((row) => ({ serviceId: row.serviceId, hourly: figure(row.amount) })),
    flats: draft.flats.map((row) => ({
      serviceId: row.serviceId,
      sizeClass: row.sizeClass || null,
      amount: figure(row.amount),
    })),
    perAddOn: maybe(draft.perAddOn),
    attendance: attendance.amount === '' ? null : { amount: figure(attendance.amount), days: Number(attendance.days) },
    percentOfTotal: maybe(draft.percentOfTotal),
  };
}

function figure(text: string): string {
  return text.replace(/[$%,\s]/g, '');
}

function maybe(text: string): string | null {
  return text.trim() === '' ? null : figure(text);
}
