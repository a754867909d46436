import { z } from 'zod';
import { dollars, type Exact } from '../../money/exact.ts';
import { toCents } from '../../money/rounding.ts';
import { amountField, flagField, hoursField, positiveField, signedField } from './fields.ts';
import { ScenarioError } from './kind-rule.ts';

/** Pay that is in the regular rate whatever it is called (29 CFR 778.108, .117, .207, .208, .223). */
const INCLUDED = [
  ...[
    'hourly',
    'piece',
    'piece_rate',
    'waiting_time',
    'travel_time',
    'on_call',
    'guarantee_makeup',
    'job_flat',
    'flat',
    'task',
    'day_rate',
  ],
  ...[
    'salary',
    'shift_differential',
    'differential',
    'commission',
    'commission_debit',
    'bonus',
    'bonus_nondiscretionary',
    'service_charge',
  ],
  ...['hourly_overtime', 'piece_overtime', 'minimum_wage_makeup', 'training', 'meeting'],
];

/** Pay the statute leaves out (29 USC 207(e)). */
const EXCLUDED = [
  ...[
    'bonus_discretionary',
    'gift',
    'tips',
    'tip',
    'reimbursement',
    'expense_reimbursement',
    'mileage',
    'vacation',
    'holiday',
    'sick',
  ],
  ...['paid_time_off', 'pto', 'holiday_pay', 'sick_pay', 'vacation_pay', 'benefit', 'show_up_pay', 'deduction'],
];

/** True premiums: left out, and counted toward overtime (29 USC 207(e)(5)-(7), 207(h)). */
const CREDITABLE = [
  'overtime_premium',
  'daily_overtime_premium',
  'daily_premium',
  'premium',
  'weekend_premium',
  'holiday_premium',
];

const SIGNED = ['commission_debit', 'deduction', 'debit', 'chargeback', 'correction'];

export const lineField = z
  .object({
    type: z.string({ error: 'needs the kind of pay' }),
    label: z.string().optional(),
    hours: hoursField.optional(),
    rate: amountField.optional(),
    quantity: amountField.optional(),
    amount: signedField.optional(),
    in_regular_rate: flagField.optional(),
    creditable: flagField.optional(),
    hours_salary_covers: positiveField.optional(),
  })
  .transform((line, ctx) => {
    const known = [...INCLUDED, ...EXCLUDED, ...CREDITABLE, ...SIGNED].includes(line.type);
    if (!known && line.in_regular_rate === undefined) {
      ctx.addIssue({ code: 'custom', message: `"${line.type}" is no kind of pay known here: say in_regular_rate` });
    }
    if (line.amount?.lt(0) && !SIGNED.includes(line.type))
      ctx.addIssue({ code: 'custom', message: `may not be negative for "${line.type}"`, path: ['amount'] });
    if (line.amount === undefined && (line.rate === undefined || (line.hours ?? line.quantity) === undefined)) {
      ctx.addIssue({ code: 'custom', message: 'has neither an amount nor a rate with hours or a quantity' });
    }
    return line;
  });

export type Line = z.output<typeof lineField>;

export function lineIsIncluded(line: Line): boolean {
  return line.in_regular_rate ?? !(EXCLUDED.includes(line.type) || CREDITABLE.includes(line.type));
}

export function lineIsCreditable(line: Line): boolean {
  return line.creditable ?? (CREDITABLE.includes(line.type) && !lineIsIncluded(line));
}

export function isHourly(line: Line): boolean {
  return ['hourly', 'hourly_overtime', 'waiting_time', 'travel_time'].includes(line.type);
}

/** Whole cents, as an earning line is rounded; the amount given, else the rate times hours or quantity. */
export function lineAmount(line: Line): Exact {
  if (line.amount !== undefined) return dollars(toCents(line.amount));
  const count = line.quantity ?? line.hours;
  if (line.rate === undefined || count === undefined) throw new ScenarioError(`The line "${line.type}" has no amount.`);
  return dollars(toCents(line.rate.mul(count)));
}
