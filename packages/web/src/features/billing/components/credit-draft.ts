import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { creditAmounts } from '@driprail/shared/domain/billing/credit';
import type { CreditAmounts } from '@driprail/shared/domain/billing/credit';
import { parseMoney } from '../../../lib/format.ts';

export interface CreditDraft {
  picks: { id: string; netCents: number }[];
  /** By line, what keeps it from being credited. */
  faults: Record<string, string>;
  /** Null while nothing is picked or something is at fault. */
  amounts: CreditAmounts | null;
}

/** What is left to credit of a line, net cents. */
export function leftOf(line: BillDto['lines'][number]): number {
  return line.priceCents - line.discountCents - line.creditedCents;
}

/** Reads typed amounts by line into what a credit of them gives back, with its tax. @param texts by line id; empty for none */
export function readCredit(bill: BillDto, texts: Record<string, string>): CreditDraft {
  const faults: Record<string, string> = {};
  const picks = bill.lines.flatMap((line) => {
    const text = texts[line.id]?.trim() ?? '';
    if (text === '') return [];
    const netCents = parseMoney(text);
    if (netCents === null || netCents <= 0) faults[line.id] = 'Give an amount like 25.00, or leave it empty.';
    else if (netCents > leftOf(line)) faults[line.id] = 'More than is left of this line.';
    return [{ id: line.id, netCents: netCents ?? 0 }];
  });
  if (picks.length === 0 || Object.keys(faults).length > 0) return { picks, faults, amounts: null };
  const lines = bill.lines.map((line) => ({ ...line, netCents: line.priceCents - line.discountCents }));
  const taxes = bill.taxes.flatMap((tax) => (tax.id === null ? [] : [{ ...tax, id: tax.id }]));
  return { picks, faults, amounts: creditAmounts(lines, taxes, picks) };
}

/** What may go back of one payment: what is paid too much once the credit stands, and no more than is left of it. */
export function goesBack(
  { owedCents }: Pick<BillDto, 'owedCents'>,
  creditCents: number,
  payment: Pick<BillDto['payments'][number], 'amountCents' | 'refundedCents'> | null,
): number {
  if (!payment) return 0;
  return Math.max(0, Math.min(creditCents - owedCents, payment.amountCents - payment.refundedCents));
}
