import { exact } from '@driprail/shared/domain/money/exact';
import { decimalText, shortText } from '@driprail/shared/domain/money/rounding';
import type { PayLine, PayLineKind, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { hoursMinutes } from '../../../lib/format.ts';

export interface LedgerGroup {
  key: string;
  title: string;
  lines: PayLine[];
  /** Sum of the group's lines, cents; of what was received already it is what is shown, not what is paid. */
  cents: number;
  isPayable: boolean;
}

const GROUPS: { key: string; title: string; kinds: PayLineKind[] }[] = [
  {
    key: 'hours',
    title: 'Hours',
    kinds: [
      'hourly',
      'salary',
      'day_rate',
      'premium_pay',
      'rest_pay',
      'plan_floor',
      'overtime_premium',
      'settlement_premium',
      'minimum_wage_make_up',
      'show_up_pay',
    ],
  },
  { key: 'flat', title: 'Flat per service', kinds: ['flat', 'job_rate', 'no_show_trip'] },
  { key: 'commission', title: 'Commission', kinds: ['commission', 'commission_settlement', 'refund'] },
  { key: 'tips', title: 'Tips', kinds: ['tip'] },
  { key: 'received', title: 'Tips already received', kinds: ['tip_already_received'] },
  {
    key: 'adjustments',
    title: 'Adjustments',
    kinds: ['bonus', 'percentage_bonus', 'discretionary_bonus', 'reimbursement', 'paid_time_off', 'deduction'],
  },
  { key: 'corrections', title: 'Corrections of earlier weeks', kinds: ['correction'] },
];

/** A person's lines as a statement lists them; the payable groups add up to the gross. */
export function ledgerGroups({ lines }: Pick<PersonWeek, 'lines'>): LedgerGroup[] {
  return GROUPS.map(({ key, title, kinds }) => {
    const own = lines.filter((line) => kinds.includes(line.kind)).sort(byDate);
    const cents = own.reduce((sum, line) => sum + line.amountCents, 0);
    return { key, title: titleOf(key, title, own), lines: own, cents, isPayable: key !== 'received' };
  }).filter((group) => group.lines.length > 0);
}

/** Lines without a date of their own keep their place at the front. */
function byDate(a: PayLine, b: PayLine): number {
  return (a.workedOn ?? '').localeCompare(b.workedOn ?? '');
}

/** "Commission, 6% of the line", where all lines have the one rate. */
function titleOf(key: string, title: string, lines: PayLine[]): string {
  const rates = new Set(lines.map((line) => line.rate));
  const [rate] = rates;
  if (key !== 'commission' || rates.size !== 1 || !rate) return title;
  return `${title}, ${shortText(exact(rate))}% of the line`;
}

/** Customers by job id: lines name them by job number only. */
export type Customers = Record<string, string>;

/** What a line is and for whom, without what its other columns say: "One-step polish, Galloway". */
export function lineWords(line: PayLine, customers: Customers): string {
  const words = line.jobNumber === null ? line.label : line.label.replace(`, job ${line.jobNumber}`, '');
  const customer = line.jobId === null ? undefined : customers[line.jobId];
  return customer === undefined ? words : `${words}, ${customer}`;
}

/** How a line came about, in one glance: "42:15 at 19.50", "6% of 240.00". */
export function howText(line: PayLine): string {
  const rate = line.rate === null ? null : exact(line.rate);
  if (line.kind === 'percentage_bonus' && rate) return `${shortText(rate)}% of ${line.working[0]?.result ?? ''}`;
  if (line.kind === 'salary' && line.hours) return `for ${hoursMinutes(line.hours)}`;
  if (line.kind === 'day_rate') return line.working[0]?.arithmetic.replace(' times ', ' at ') ?? '';
  if (line.kind === 'overtime_premium' && rate && line.hours)
    return `${hoursMinutes(line.hours)} at ${decimalText(rate.div(2), 4)}`;
  if (line.kind === 'minimum_wage_make_up' && rate) return `to ${decimalText(rate, 2)} an hour`;
  if (rate && line.hours) return `${hoursMinutes(line.hours)} at ${rateText(line.rate)}`;
  if (line.kind === 'commission' && rate) {
    const isShared = line.working.length > 2;
    return `${isShared ? 'share of ' : ''}${shortText(rate)}% of ${line.working[0]?.result ?? ''}`;
  }
  if ((line.kind === 'flat' || line.kind === 'no_show_trip') && rate)
    return line.working.length > 1 ? `share of ${rateText(line.rate)}` : 'flat';
  if (line.kind === 'tip' || line.kind === 'tip_already_received')
    return line.working.length > 1 ? `share of ${line.working[0]?.result ?? ''}` : '';
  return '';
}

/** A rate with at least two places, "19.50", and more where it has more. */
export function rateText(value: string | null): string {
  if (value === null) return '';
  const short = shortText(exact(value));
  const fixed = decimalText(exact(value), 2);
  return exact(short).equals(exact(fixed)) ? fixed : short;
}

/** What a line's page is called. */
export const kindTitles: Record<PayLineKind, string> = {
  hourly: 'Hours',
  salary: 'Salary',
  day_rate: 'Day rate',
  job_rate: 'Job rate',
  premium_pay: 'Premium',
  plan_floor: 'Guarantee',
  rest_pay: 'Rest breaks',
  percentage_bonus: 'Bonus',
  commission_settlement: 'Settlement',
  settlement_premium: 'Overtime',
  flat: 'Flat amount',
  commission: 'Commission',
  overtime_premium: 'Overtime',
  minimum_wage_make_up: 'Make-up',
  tip: 'Tip',
  tip_already_received: 'Tip received',
  bonus: 'Bonus',
  discretionary_bonus: 'Bonus',
  reimbursement: 'Paid back',
  paid_time_off: 'Time off',
  refund: 'Refund',
  no_show_trip: 'No-show trip',
  show_up_pay: 'Show-up pay',
  deduction: 'Deduction',
  correction: 'Correction',
};
