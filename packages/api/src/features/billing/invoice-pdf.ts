import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { AppError } from '../../http/errors.ts';
import { PAGE, closePaper, head, money, openPaper, paragraph, room, section, total } from '../../paper/paper.ts';
import type { Paper } from '../../paper/paper.ts';
import { readBill } from './bill.presenter.ts';

type Company = Awaited<ReturnType<typeof companyOf>>;
type Issued = NonNullable<BillDto['invoice']>;

/**
 * A job's invoice on Letter paper, fonts embedded: what was billed, what was received and what is owed now. Neither
 * gate code nor notes are on it: it goes to the customer.
 * @throws 404, also while nothing is billed
 */
export async function readInvoicePdf(jobId: string, now: Date): Promise<Buffer> {
  const [company, bill] = [await companyOf(), await readBill(jobId, now)];
  if (!bill.invoice)
    throw new AppError(404, 'not_billed', `Job ${bill.jobNumber} is not billed yet, so there is no invoice.`);
  return invoicePdf(company, bill, bill.invoice);
}

function invoicePdf(company: Company, bill: BillDto, invoice: Issued): Promise<Buffer> {
  const date = (instant: string) => formatDate(dayOf(instant, company.zone));
  const { doc, bytes } = openPaper(`Invoice ${invoice.number}`, company.name);
  const reach = [company.name, company.phone, company.email].filter(Boolean).join(', ');
  head(doc, `Invoice ${invoice.number}`, reach, stateWords(bill, invoice));
  address(doc, bill, invoice, date);
  section(doc, 'Work', null);
  for (const line of bill.lines) row(doc, line.label, line.detail, line.priceCents);
  if (bill.discountCents > 0) row(doc, 'Discount', bill.discountReason, -bill.discountCents);
  section(doc, 'Before tax', bill.netCents);
  for (const tax of bill.taxes)
    row(
      doc,
      `${tax.name}, ${tax.percent} percent`,
      `${tax.place || 'Everywhere'}, on ${centsText(tax.baseCents)}`,
      tax.taxCents,
    );
  total(doc, 'Total', bill.totalCents);
  const received = receivedRows(bill, date);
  if (received.length > 0) {
    section(doc, 'Received and credited', null);
    for (const { name, detail, cents } of received) row(doc, name, detail, cents);
  }
  total(doc, bill.owedCents < 0 ? 'Owed to you' : 'Owed', Math.abs(bill.owedCents));
  if (bill.owedCents > 0)
    paragraph(doc, 9, `Due ${formatDate(invoice.dueOn)}. Name invoice ${invoice.number} when you pay.`);
  closePaper(doc);
  return bytes;
}

function stateWords({ state }: BillDto, { dueOn }: Issued): string {
  if (state === 'paid') return 'Paid';
  return state === 'overdue' ? `Overdue since ${formatDate(dueOn)}` : `Due ${formatDate(dueOn)}`;
}

function address(doc: Paper, bill: BillDto, invoice: Issued, date: (instant: string) => string): void {
  const { name, line, city, postcode } = bill.billTo;
  const top = doc.y;
  const town = [city, postcode].filter(Boolean).join(' ');
  doc.fontSize(8).text('Bill to', PAGE.left, top);
  for (const words of [name, line, town]) if (words) doc.fontSize(11).text(words, PAGE.left, doc.y, { width: 280 });
  const bottom = doc.y;
  const facts = [
    ['Issued', date(invoice.issuedAt)],
    ['Due', formatDate(invoice.dueOn)],
    ['Job', String(bill.jobNumber)],
  ];
  facts.forEach(([label = '', words = ''], index) => {
    const y = top + index * 16;
    doc.fontSize(8).text(label, 380, y + 3, { lineBreak: false });
    doc.fontSize(11).text(words, 430, y, { width: PAGE.right - 430, align: 'right', lineBreak: false });
  });
  doc.y = Math.max(bottom, top + facts.length * 16) + 8;
}

function row(doc: Paper, name: string, detail: string, cents: number): void {
  room(doc, 34);
  const y = doc.y;
  doc.fontSize(10).text(name, PAGE.left, y, { width: 370 });
  if (detail) doc.fontSize(8).text(detail, PAGE.left, doc.y, { width: 370 });
  const bottom = doc.y;
  money(doc, 10, centsText(cents), y);
  doc.y = bottom + 4;
}

/** What came in and what was taken off, by day. A payment that was recorded by mistake never was. */
function receivedRows(bill: BillDto, date: (instant: string) => string) {
  const mistaken = new Set(bill.refunds.filter(({ kind }) => kind === 'mistake').map(({ paymentId }) => paymentId));
  const rows = [
    ...bill.payments
      .filter(({ id }) => !mistaken.has(id))
      .map(({ method, reference, amountCents, receivedAt }) => ({
        ...{ at: receivedAt, name: paymentMethodNames[method], detail: reference, cents: -amountCents },
      })),
    ...bill.creditNotes.map(({ number, note, totalCents, issuedAt }) => ({
      ...{ at: issuedAt, name: `Credit note ${number}`, detail: note, cents: -totalCents },
    })),
    ...bill.refunds
      .filter(({ kind, state }) => kind !== 'mistake' && state !== 'failed')
      .map(({ kind, amountCents, madeAt }) => ({
        ...{ at: madeAt, name: kind === 'dispute' ? 'Disputed with the bank' : 'Given back', detail: '' },
        cents: amountCents,
      })),
  ];
  return rows
    .toSorted((a, b) => a.at.localeCompare(b.at))
    .map(({ at, name, detail, cents }) => ({ name, detail: [date(at), detail].filter(Boolean).join(', '), cents }));
}
