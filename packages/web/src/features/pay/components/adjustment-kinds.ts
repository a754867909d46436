import type { adjustmentKinds } from '@driprail/shared/contracts/pay.contract';

export type AdjustmentKindName = (typeof adjustmentKinds)[number];

interface KindWords {
  label: string;
  /** What the law makes of it, in short; the owner asks a licensed adviser for more. */
  caution: string;
  picks: string[];
}

export const adjustmentWords: Record<AdjustmentKindName, KindWords> = {
  bonus: {
    label: 'Bonus, promised or measured',
    caution: 'Counts in the regular rate, so it raises overtime (29 CFR 778.208 to 778.211).',
    picks: ['Add-ons sold', 'Good reviews', 'Full attendance'],
  },
  discretionary_bonus: {
    label: 'Bonus, never promised',
    caution:
      'Stays out of the regular rate only if both that it is paid and how much were decided at the end and never promised (29 CFR 778.211). In doubt ask a licensed adviser.',
    picks: ['Thanks for a hard week', 'Holiday gift'],
  },
  reimbursement: {
    label: 'Reimbursement',
    caution: 'Pays back what was spent for the company; not wages (29 CFR 778.217).',
    picks: ['Fuel', 'Supplies', 'Parking', 'Own car'],
  },
  paid_time_off: {
    label: 'Paid time off',
    caution: 'Not hours worked, so it stays out of the regular rate (29 CFR 778.218).',
    picks: ['Sick day', 'Vacation day', 'Holiday'],
  },
  refund: {
    label: 'Refund to a customer',
    caution:
      'Lowers this week’s commission alone, never hourly pay, floors or paid overtime, and only by a plan the person signed (29 CFR 778.121). Some states forbid it: ask a licensed adviser.',
    picks: ['Job refunded', 'Part of the job refunded'],
  },
  deduction: {
    label: 'Deduction',
    caution:
      'Only as far as it leaves the minimum wage and overtime whole (29 CFR 531.35, 531.37). States ask for more, often a signed agreement: ask a licensed adviser.',
    picks: ['Work boots', 'Advance paid back', 'Uniform'],
  },
  correction: {
    label: 'Correction of a locked week',
    caution:
      'Names the locked line and stays out of this week’s regular rate. Late hours may have made overtime in their own week: the difference shown on the locked week counts that.',
    picks: ['Time written down late', 'Wrong rate', 'Line left out', 'Price changed'],
  },
};

/** Kinds whose amount is typed without a sign and taken off. */
export function takesOff(kind: AdjustmentKindName): boolean {
  return kind === 'deduction' || kind === 'refund';
}

export function addWords(kind: AdjustmentKindName): string {
  if (kind === 'correction') return 'Add correction';
  if (kind === 'refund') return 'Add refund';
  return kind === 'deduction' ? 'Add deduction' : 'Add amount';
}

export interface CountedUnit {
  unit: 'mile' | 'review';
  label: string;
  quantity: string;
}

/** Kinds whose amount may be a count times a dated rate. */
export const countedUnits: Partial<Record<AdjustmentKindName, CountedUnit>> = {
  bonus: { unit: 'review', label: 'Count reviews, by the dated rate', quantity: 'Reviews' },
  reimbursement: { unit: 'mile', label: 'Count miles, by the dated rate', quantity: 'Miles' },
};
