import type { BillDto, BillState } from '@driprail/shared/contracts/bill.dto';

export const billStateNames: Record<BillState, string> = {
  draft: 'Not billed yet',
  open: 'Open',
  overdue: 'Overdue',
  paid: 'Paid',
  owes_back: 'Owed back',
};

export function billTitle({ invoice, jobNumber }: Pick<BillDto, 'invoice' | 'jobNumber'>): string {
  return invoice ? `Invoice ${invoice.number}` : `Job ${jobNumber}`;
}

export const refundKindNames: Record<BillDto['refunds'][number]['kind'], string> = {
  refund: 'Given back',
  mistake: 'Taken back, recorded by mistake',
  dispute: 'Disputed with the card holder’s bank',
};

/** What became of money that goes back. */
export function refundStateWords({ state, fault }: Pick<BillDto['refunds'][number], 'state' | 'fault'>): string {
  if (state === 'asked') return 'Asked for, the payments service has not answered yet';
  return state === 'failed' ? `Failed: ${fault}` : '';
}
