import type { Transaction } from 'sequelize';
import type { BillDto, BillState } from '@driprail/shared/contracts/bill.dto';
import { owedCents } from '@driprail/shared/domain/billing/balance';
import { invoiceAmounts } from '@driprail/shared/domain/billing/invoice-amounts';
import { taxesInForce } from '@driprail/shared/domain/billing/tax-rates';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { notFound } from '../../http/errors.ts';
import type { JobRow } from './bill.queries.ts';
import { readInvoiceRow, readJobRow, readLedger, readTaxRates } from './bill.queries.ts';

/** The lines that would be billed: of a job that is over those that were finished, else all. */
export function billableLines({ lines, openVisits }: JobRow): JobRow['lines'] {
  const finished = lines.filter((line) => line.isFinished);
  return openVisits > 0 || finished.length === 0 ? lines : finished;
}

/** Nothing of the job is still to come, and something of it was done. */
export function isOver({ lines, openVisits }: JobRow): boolean {
  return openVisits === 0 && lines.some((line) => line.isFinished);
}

/** Every visit is called off, and nothing was done. */
export function isCalledOff({ lines, openVisits }: JobRow): boolean {
  return openVisits === 0 && !lines.some((line) => line.isFinished);
}

/** A job's bill: its invoice as issued, else what it would cost by today's taxes. @throws 404 */
export async function readBill(jobId: string, now: Date, tx?: Transaction): Promise<BillDto> {
  const job = await readJobRow(jobId, tx);
  if (!job) throw notFound('That job');
  const today = dayOf(now.toISOString(), (await companyOf(tx)).zone);
  const [invoice, ledger] = [await readInvoiceRow(jobId, tx), await readLedger(jobId, tx)];
  const shown = invoice ?? (await draftOf(job, today, tx));
  const sum = (values: number[]): number => values.reduce((total, value) => total + value, 0);
  const creditedCents = sum(ledger.creditNotes.map((note) => note.totalCents));
  const paidCents = sum(ledger.payments.map((payment) => payment.amountCents));
  const refundedCents = sum(ledger.payments.map((payment) => payment.refundedCents));
  const owed = owedCents({
    // A draft counts as if it were billed, so that a deposit already shows against it.
    invoicedCents: ledger.invoicedCents + (invoice || isCalledOff(job) ? 0 : shown.totalCents),
    ...{ creditedCents, paidCents, refundedCents },
  });
  const isToCome = job.openVisits > 0 && !invoice;
  const netCents = sum(shown.lines.map((line) => line.priceCents - line.discountCents));
  return {
    ...{ jobId, jobNumber: job.jobNumber, customerId: job.customerId, customerName: job.customerName },
    state: stateOf(owed, invoice?.dueOn ?? null, today),
    invoice: invoice && { id: invoice.id, number: invoice.number, issuedAt: invoice.issuedAt, dueOn: invoice.dueOn },
    ...{ billTo: shown.billTo, place: shown.place, lines: shown.lines, taxes: shown.taxes },
    discountReason: shown.discountReason,
    discountCents: sum(shown.lines.map((line) => line.discountCents)),
    netCents,
    taxCents: sum(shown.taxes.map((tax) => tax.taxCents)),
    totalCents: shown.totalCents,
    creditedCents,
    ...{ payments: ledger.payments, refunds: ledger.refunds, creditNotes: ledger.creditNotes },
    owedCents: owed,
    isDone: isOver(job),
    isCalledOff: isCalledOff(job),
    proposedFeeCents: job.proposedFeeCents,
    depositCents: isToCome ? Math.max(0, Math.min(job.depositCents - (paidCents - refundedCents), owed)) : 0,
  };
}

/** @param dueOn null while nothing is billed */
export function stateOf(owed: number, dueOn: string | null, today: string): BillState {
  if (owed < 0) return 'owes_back';
  if (dueOn === null) return 'draft';
  if (owed === 0) return 'paid';
  return dueOn < today ? 'overdue' : 'open';
}

async function draftOf(job: JobRow, today: string, tx?: Transaction) {
  const lines = billableLines(job);
  const amounts = invoiceAmounts(lines, job.discountCents, taxesInForce(await readTaxRates(tx), today, job.place));
  return {
    ...{ billTo: job.billTo, place: job.place, discountReason: job.discountReason, totalCents: amounts.totalCents },
    lines: amounts.lines.map((line, index) => ({
      ...{ id: line.id, label: lines[index]?.label ?? '', detail: lines[index]?.detail ?? '' },
      ...{ taxClass: line.taxClass, priceCents: line.priceCents, discountCents: line.discountCents, creditedCents: 0 },
    })),
    taxes: amounts.taxes.map((tax) => ({ ...tax, id: null, creditedCents: 0 })),
  };
}
