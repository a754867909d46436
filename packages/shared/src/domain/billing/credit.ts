import { exact } from '../money/exact.ts';
import { toCents } from '../money/rounding.ts';
import type { TaxClass } from './tax-rates.ts';

export interface CreditableLine {
  id: string;
  taxClass: TaxClass;
  netCents: number;
  /** Net cents credited before. */
  creditedCents: number;
}
export interface CreditableTax {
  id: string;
  taxClass: TaxClass;
  baseCents: number;
  taxCents: number;
  /** Tax cents credited before. */
  creditedCents: number;
}
export interface CreditAmounts {
  lines: { id: string; netCents: number }[];
  taxes: { id: string; taxCents: number }[];
  netCents: number;
  taxCents: number;
  totalCents: number;
}

/**
 * What a credit of parts of lines gives back. Tax goes back in proportion to what has been credited in all, less what
 * went back before, so that credits of a whole invoice, in any number of steps, give back exactly its tax.
 * @param picks net integer cents per line, none above what is left of it
 * @throws {RangeError} for a line that is not on the invoice, an amount below one cent or above what is left
 */
export function creditAmounts(
  lines: readonly CreditableLine[],
  taxes: readonly CreditableTax[],
  picks: readonly { id: string; netCents: number }[],
): CreditAmounts {
  const picked = new Map<string, number>();
  for (const { id, netCents } of picks) {
    const line = lines.find((one) => one.id === id);
    if (!line) throw new RangeError('That line is not on the invoice.');
    const all = (picked.get(id) ?? 0) + netCents;
    if (netCents < 1 || all > line.netCents - line.creditedCents)
      throw new RangeError('More than is left of that line.');
    picked.set(id, all);
  }
  const backOn = taxes.map((tax) => ({ id: tax.id, taxCents: taxBack(tax, lines, picked) }));
  const netCents = [...picked.values()].reduce((total, cents) => total + cents, 0);
  const taxCents = backOn.reduce((total, tax) => total + tax.taxCents, 0);
  return {
    lines: [...picked].map(([id, cents]) => ({ id, netCents: cents })),
    taxes: backOn.filter((tax) => tax.taxCents !== 0),
    netCents,
    taxCents,
    totalCents: netCents + taxCents,
  };
}

function taxBack(tax: CreditableTax, lines: readonly CreditableLine[], picked: ReadonlyMap<string, number>): number {
  const credited = lines
    .filter((line) => line.taxClass === tax.taxClass)
    .reduce((total, line) => total + line.creditedCents + (picked.get(line.id) ?? 0), 0);
  if (tax.baseCents === 0) return 0;
  return toCents(exact(tax.taxCents).mul(credited).div(tax.baseCents).div(100)) - tax.creditedCents;
}
