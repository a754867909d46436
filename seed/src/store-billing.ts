import * as models from '@driprail/api/db/models/index';
import { run } from '@driprail/api/db/sequelize';
import type { DemoRows } from './rows.ts';
import type { Transaction } from './store-visits.ts';

/** Taxes, invoices and payments; the counter goes on where the last invoice stands. */
export async function storeBilling(rows: DemoRows, transaction: Transaction): Promise<void> {
  const options = { transaction };
  await models.TaxRateRow.bulkCreate(rows.taxRates, options);
  await models.Invoice.bulkCreate(rows.invoices, options);
  await models.InvoiceLine.bulkCreate(rows.invoiceLines, options);
  await models.InvoiceTax.bulkCreate(rows.invoiceTaxes, options);
  await models.Payment.bulkCreate(rows.payments, options);
  await models.JobPaid.bulkCreate(rows.jobsPaid, options);
  await models.CashCount.bulkCreate(rows.cashCounts, options);
  await models.CashCountPayment.bulkCreate(rows.cashCountPayments, options);
  await run(
    `UPDATE document_counters SET last_number = :number WHERE kind = 'invoice'`,
    { number: Math.max(1000, ...rows.invoices.map((invoice) => invoice.number)) },
    transaction,
  );
}
