import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { invoiceAmounts } from '@driprail/shared/domain/billing/invoice-amounts';
import { taxesInForce } from '@driprail/shared/domain/billing/tax-rates';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import { Invoice, InvoiceLine, InvoiceTax } from '../../db/models/index.ts';
import type { JobRow } from './bill.queries.ts';
import { readTaxRates } from './bill.queries.ts';
import type { By } from './note-paid.ts';
import { nextNumber } from './numbers.ts';

export interface InvoiceLineFields {
  /** Null for a fee. */
  jobLineId: string | null;
  label: string;
  detail: string;
  taxClass: TaxClass;
  priceCents: number;
}

/**
 * Writes an invoice with the next number and the taxes in force today at the job's place. The caller holds the job and
 * has seen that nothing stands for it. @returns its id
 */
export async function writeInvoice(
  tx: Transaction,
  job: JobRow,
  lines: readonly InvoiceLineFields[],
  discount: { cents: number; reason: string },
  { userId, at }: By,
): Promise<string> {
  const company = await companyOf(tx);
  const today = dayOf(at.toISOString(), company.zone);
  const rates = taxesInForce(await readTaxRates(tx), today, job.place);
  const { netCents, taxCents, totalCents, ...amounts } = invoiceAmounts(
    lines.map(({ taxClass, priceCents }, index) => ({ id: String(index), taxClass, priceCents })),
    discount.cents,
    rates,
  );
  const id = uuid();
  const number = await nextNumber(tx, 'invoice');
  await Invoice.create(
    {
      ...{ id, number, jobId: job.jobId, customerId: job.customerId, issuedAt: at, issuedBy: userId },
      dueOn: addDays(today, company.invoiceDueDays),
      ...{ billTo: job.billTo, place: job.place, discountReason: discount.reason },
      ...{ netCents, taxCents, totalCents },
    },
    { transaction: tx },
  );
  await InvoiceLine.bulkCreate(
    lines.map((line, position) => ({
      ...{ id: uuid(), invoiceId: id, ...line, position },
      discountCents: amounts.lines[position]?.discountCents ?? 0,
    })),
    { transaction: tx },
  );
  await InvoiceTax.bulkCreate(
    amounts.taxes.map((tax, position) => ({ id: uuid(), invoiceId: id, ...tax, position })),
    { transaction: tx },
  );
  const sums = { netCents, taxCents, totalCents };
  await audit(tx, { userId, at }, 'invoice', id, 'issued', { number, jobNumber: job.jobNumber, ...sums });
  return id;
}
