import { exact } from '../money/exact.ts';
import { splitByLargestRemainder } from '../money/largest-remainder.ts';
import { toCents } from '../money/rounding.ts';
import type { TaxClass, TaxInForce } from './tax-rates.ts';

export interface BillableLine {
  /** The job line's id. */
  id: string;
  priceCents: number;
  taxClass: TaxClass;
}

export interface BilledLine extends BillableLine {
  /** This line's share of the job's discount. */
  discountCents: number;
  netCents: number;
}

export interface BilledTax {
  name: string;
  place: string;
  taxClass: TaxClass;
  /** Percent as an exact decimal string, "6.25". */
  percent: string;
  baseCents: number;
  taxCents: number;
}

export interface InvoiceAmounts {
  lines: BilledLine[];
  taxes: BilledTax[];
  netCents: number;
  taxCents: number;
  totalCents: number;
}

/**
 * The amounts of an invoice in integer cents. A discount lies on the lines by their prices (largest remainder), so that
 * every line can be credited alone; it never makes a line less than nothing. Each tax is worked out once on the
 * invoice's whole base, halves up: rounding at the invoice's level, which Streamlined Sales and Use Tax Agreement
 * section 324 allows (from memory).
 */
export function invoiceAmounts(
  lines: readonly BillableLine[],
  discountCents: number,
  rates: readonly TaxInForce[],
): InvoiceAmounts {
  const gross = lines.reduce((total, line) => total + line.priceCents, 0);
  const discounts = splitByLargestRemainder(
    Math.min(discountCents, gross),
    lines.map((line) => exact(line.priceCents)),
  );
  const billed = lines.map((line, index) => {
    const discount = discounts[index] ?? 0;
    return { ...line, discountCents: discount, netCents: line.priceCents - discount };
  });
  const taxes = rates.map((rate) => taxOn(billed, rate)).filter((tax) => tax.baseCents > 0);
  const netCents = billed.reduce((total, line) => total + line.netCents, 0);
  const taxCents = taxes.reduce((total, tax) => total + tax.taxCents, 0);
  return { lines: billed, taxes, netCents, taxCents, totalCents: netCents + taxCents };
}

function taxOn(lines: readonly BilledLine[], { name, place, taxClass, percent }: TaxInForce): BilledTax {
  const baseCents = lines.reduce((total, line) => total + (line.taxClass === taxClass ? line.netCents : 0), 0);
  return { name, place, taxClass, percent, baseCents, taxCents: percentOf(baseCents, percent) };
}

/** A percent of whole cents, halves up. */
export function percentOf(cents: number, percent: string): number {
  return toCents(exact(percent).mul(cents).div(10_000));
}
