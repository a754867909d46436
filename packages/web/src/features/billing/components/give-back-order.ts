import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { money } from '../../../lib/format.ts';
import type { GiveBack } from '../api/money.queries.ts';
import type { CreditDraft } from './credit-draft.ts';

export type BackMode = 'lines' | 'over' | 'mistake';
type Payment = BillDto['payments'][number];

export interface BackDraft {
  mode: BackMode;
  bill: BillDto;
  /** Out of which it goes back; null where nothing is left of any. */
  payment: Payment | null;
  credit: CreditDraft;
  /** How much of it goes back now. */
  backCents: number;
}

/** What can be given back of a bill as it stands. */
export function backModes(bill: BillDto): BackMode[] {
  const isLeft = (payment: Payment) => payment.amountCents > payment.refundedCents;
  return [
    ...(bill.owedCents < 0 && bill.payments.some(isLeft) ? ['over' as const] : []),
    ...(bill.invoice ? ['lines' as const] : []),
    ...(bill.payments.some(({ method, refundedCents }) => method !== 'card' && refundedCents === 0)
      ? ['mistake' as const]
      : []),
  ];
}

/** What will happen, before it is pressed. */
export function backWords({ mode, bill, payment, credit, backCents }: BackDraft): string {
  const how = payment ? paymentMethodNames[payment.method].toLowerCase() : '';
  if (mode === 'mistake') return `${money(backCents)} counts as never received, and is owed again.`;
  if (mode === 'over') return `${money(backCents)} goes back by ${how}. Tips stay with the crew.`;
  if (!credit.amounts) return 'Give an amount at one line or more; its tax goes back with it.';
  const { netCents, taxCents, totalCents } = credit.amounts;
  const credited = `${money(netCents)} and ${money(taxCents)} tax are credited, ${money(totalCents)} in all.`;
  if (backCents > 0) return `${credited} ${money(backCents)} goes back by ${how}. Tips stay with the crew.`;
  return `${credited} No money goes back: ${money(bill.owedCents - totalCents)} is owed then.`;
}

export function backButton({ mode, credit, backCents }: BackDraft): string {
  if (mode === 'mistake') return `Take back ${money(backCents)}`;
  if (backCents > 0) return `Give back ${money(backCents)}`;
  return mode === 'lines' && credit.amounts ? `Credit ${money(credit.amounts.totalCents)}` : 'Give back';
}

export function orderOf(
  { mode, bill, payment, credit, backCents }: BackDraft,
  { key, reasonId, note }: { key: string; reasonId: string | null; note: string },
): GiveBack {
  const lines = mode === 'lines' ? credit.picks : [];
  if (!payment || backCents === 0) return { jobId: bill.jobId, body: { key, lines, reasonId, note } };
  const kind = mode === 'mistake' ? 'mistake' : 'refund';
  const fields = { key, kind, lines, note, amountCents: backCents } as const;
  return { paymentId: payment.id, body: { ...fields, reasonId: mode === 'lines' ? reasonId : null } };
}
