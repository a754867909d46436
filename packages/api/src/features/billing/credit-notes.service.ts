import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { creditAmounts } from '@driprail/shared/domain/billing/credit';
import type { CreditAmounts } from '@driprail/shared/domain/billing/credit';
import { audit } from '../../db/audit.ts';
import { CreditNote, CreditNoteLine, CreditNoteTax, RefundReason } from '../../db/models/index.ts';
import type { Job } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';
import type { InvoiceRow } from './bill.queries.ts';
import { readInvoiceRow } from './bill.queries.ts';
import { nextNumber } from './numbers.ts';

/**
 * Credits parts of an invoice's lines with their tax, by a note with the next number.
 * @param picks net cents per invoice line
 * @returns the note's id
 * @throws 422 without an invoice, or at a line with more than is left of it
 */
export async function creditLines(
  tx: Transaction,
  job: Pick<Job, 'id' | 'number'>,
  picks: readonly { id: string; netCents: number }[],
  { reasonId, note }: { reasonId: string | null; note: string },
  ctx: Ctx,
): Promise<string> {
  const invoice = await readInvoiceRow(job.id, tx);
  if (!invoice)
    throw unprocessable('not_billed', 'This job is not billed yet. Change its lines or its discount instead.');
  if (reasonId !== null && !(await RefundReason.findByPk(reasonId, { transaction: tx })))
    throw unprocessable('unknown_reason', 'Choose a reason from the list.', {
      fields: { reasonId: 'Choose a reason from the list.' },
    });
  const amounts = amountsOf(invoice, picks);
  const id = uuid();
  const number = await nextNumber(tx, 'credit_note');
  const by = { userId: ctx.actor.userId, at: ctx.now() };
  await CreditNote.create(
    {
      ...{ id, number, invoiceId: invoice.id, reasonId, note, issuedAt: by.at, issuedBy: by.userId },
      ...{ netCents: amounts.netCents, taxCents: amounts.taxCents },
    },
    { transaction: tx },
  );
  await CreditNoteLine.bulkCreate(
    amounts.lines.map((line) => ({ creditNoteId: id, invoiceLineId: line.id, netCents: line.netCents })),
    { transaction: tx },
  );
  await CreditNoteTax.bulkCreate(
    amounts.taxes.map((tax) => ({ creditNoteId: id, invoiceTaxId: tax.id, taxCents: tax.taxCents })),
    { transaction: tx },
  );
  await audit(tx, by, 'credit_note', id, 'issued', { number, jobNumber: job.number, totalCents: amounts.totalCents });
  return id;
}

function amountsOf(invoice: InvoiceRow, picks: readonly { id: string; netCents: number }[]): CreditAmounts {
  const lines = invoice.lines.map((line) => ({ ...line, netCents: line.priceCents - line.discountCents }));
  const taxes = invoice.taxes.flatMap((tax) => (tax.id === null ? [] : [{ ...tax, id: tax.id }]));
  try {
    return creditAmounts(lines, taxes, picks);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw unprocessable('bad_credit', error.message, { fields: { lines: error.message } });
  }
}
