import type { PayLine, PayLineKind, PersonWeek } from './pay-week.types.ts';
import { totalCents } from './pay-line.ts';

const ADJUSTMENTS: readonly PayLineKind[] = [
  'bonus',
  'discretionary_bonus',
  'reimbursement',
  'paid_time_off',
  'deduction',
  'correction',
  'percentage_bonus',
];

/** Integer cents by group. Payable lines add up to the gross, always. */
export function weekTotals(lines: readonly PayLine[]): PersonWeek['totals'] {
  const of = (...kinds: PayLineKind[]): number => totalCents(lines.filter((line) => kinds.includes(line.kind)));
  return {
    hourly: of('hourly', 'salary', 'day_rate', 'premium_pay', 'rest_pay', 'show_up_pay'),
    flat: of('flat', 'job_rate', 'no_show_trip'),
    commission: of('commission', 'commission_settlement', 'refund'),
    overtimePremium: of('overtime_premium', 'settlement_premium'),
    makeUp: of('minimum_wage_make_up', 'plan_floor'),
    tips: of('tip'),
    tipsAlreadyReceived: of('tip_already_received'),
    adjustments: of(...ADJUSTMENTS),
    gross: totalCents(lines.filter((line) => line.isPayable)),
  };
}
