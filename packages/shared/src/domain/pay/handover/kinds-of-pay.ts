import type { PayLine, PayLineKind, PayTip, PersonWeek } from '../pay-week.types.ts';
import { premiumSplit, type PremiumFacts } from './premium-split.ts';

/** What a payroll processor is handed apart; cents but for `tips_already_received` all of it is in the gross. */
export const payKinds = [
  'straight_pay',
  'flat',
  'commission',
  'bonus',
  'percentage_bonus',
  'discretionary_bonus',
  'flsa_premium',
  'state_only_premium',
  'plan_top_up',
  'minimum_wage_make_up',
  'tips_card',
  'tips_invoice',
  'tips_cash',
  'tips_already_received',
  'reimbursement',
  'paid_time_off',
  'show_up_pay',
  'deductions',
  'corrections',
] as const;
export type PayKind = (typeof payKinds)[number];
export type KindSums = Record<PayKind, number>;

const KIND_OF_LINE: Record<PayLineKind, PayKind | 'premium' | 'tip'> = {
  hourly: 'straight_pay',
  salary: 'straight_pay',
  day_rate: 'straight_pay',
  premium_pay: 'straight_pay',
  rest_pay: 'straight_pay',
  flat: 'flat',
  job_rate: 'flat',
  no_show_trip: 'flat',
  commission: 'commission',
  refund: 'commission',
  commission_settlement: 'commission',
  bonus: 'bonus',
  percentage_bonus: 'percentage_bonus',
  discretionary_bonus: 'discretionary_bonus',
  overtime_premium: 'premium',
  settlement_premium: 'premium',
  plan_floor: 'plan_top_up',
  minimum_wage_make_up: 'minimum_wage_make_up',
  tip: 'tip',
  tip_already_received: 'tips_already_received',
  reimbursement: 'reimbursement',
  paid_time_off: 'paid_time_off',
  show_up_pay: 'show_up_pay',
  deduction: 'deductions',
  correction: 'corrections',
};

const TIP_KINDS: Record<PayTip['method'], PayKind> = {
  card: 'tips_card',
  invoice: 'tips_invoice',
  cash: 'tips_cash',
};

export interface KindFacts extends PremiumFacts {
  /** How the tip of a line came. */
  tipMethod: (line: PayLine) => PayTip['method'];
}

/** A person's week by kind of pay, cents. All but the tips already received add up to the gross, always. */
export function kindsOfPay(
  week: Pick<PersonWeek, 'hoursWorked' | 'regularRate' | 'lines'>,
  facts: KindFacts,
): KindSums {
  const sums = noPay();
  for (const line of week.lines) {
    const kind = KIND_OF_LINE[line.kind];
    if (kind === 'premium') continue;
    sums[kind === 'tip' ? TIP_KINDS[facts.tipMethod(line)] : kind] += line.amountCents;
  }
  const { flsaCents, stateOnlyCents } = premiumSplit(week, facts);
  return { ...sums, flsa_premium: flsaCents, state_only_premium: stateOnlyCents };
}

/** Sums of several weeks, kind by kind. */
export function addKinds(all: readonly KindSums[]): KindSums {
  const sums = noPay();
  for (const one of all) for (const kind of payKinds) sums[kind] += one[kind];
  return sums;
}

function noPay(): KindSums {
  return Object.fromEntries(payKinds.map((kind) => [kind, 0])) as KindSums;
}
