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
