import { invoiceAmounts } from '@driprail/shared/domain/billing/invoice-amounts';
import type { InvoiceAmounts } from '@driprail/shared/domain/billing/invoice-amounts';
import { taxesInForce } from '@driprail/shared/domain/billing/tax-rates';
import type { TaxRate } from '@driprail/shared/domain/billing/tax-rates';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { ZONE, instant, minuteOf } from './calendar.ts';
import { writeCashCounts } from './cash-rows.ts';
import type { Book } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import type { Random } from './random.ts';
import { randomFor } from './random.ts';

/** Invented, as the town is. */
const rates = [
  { name: 'State sales tax', place: '', percent: '5.500000' },
  { name: 'City tax', place: 'Ternmouth', percent: '0.750000' },
] as const;
const DUE_DAYS = 14;
const MINUTE = 60_000;

type Job = Book['rows']['jobs'][number];

/** Taxes, an invoice for every job that is over, and what was paid on it; some of the later ones are still open. */
export function writeBilling(book: Book, people: DemoPeople): void {
  const { rows, ids, calendar } = book;
  const taxRates: TaxRate[] = rates.map((rate) => ({ ...rate, taxClass: 'standard', startsOn: calendar.rulesFrom }));
  const setAt = instant(calendar.rulesFrom, minuteOf('09:00'));
  rows.taxRates.push(...taxRates.map((rate) => ({ id: ids(), ...rate, setBy: people.ownerUserId, setAt })));
  // Those that have just been done are billed by the running company itself.
  const until = calendar.asOf.getTime() - 30 * MINUTE;
  const over = rows.jobs
    .map((job) => ({ job, doneAt: doneAt(book, job) }))
    .filter((one): one is { job: Job; doneAt: Date } => one.doneAt !== null && one.doneAt.getTime() <= until)
    .sort((a, b) => a.doneAt.getTime() - b.doneAt.getTime() || a.job.id.localeCompare(b.job.id));
  const random = randomFor('billing');
  over.forEach(({ job, doneAt: at }, index) => {
    const issuedAt = new Date(at.getTime() + 3 * MINUTE);
    const amounts = writeInvoice(book, job, { number: 1001 + index, issuedAt, taxRates });
    writePayment(book, people, job, { issuedAt, totalCents: amounts.totalCents, random });
  });
  writeCashCounts(book, people);
}

/** When the last of a job was finished; null while something of it is still to come, or when nothing was. */
function doneAt({ rows }: Book, job: Job): Date | null {
  const isOpen = rows.visits.some(
    (visit) => visit.jobId === job.id && !['part_done', 'done', 'called_off'].includes(visit.progress ?? 'unplaced'),
  );
  const finished = rows.jobLines.flatMap((line) => (line.jobId === job.id && line.finishedAt ? [line.finishedAt] : []));
  if (isOpen || finished.length === 0) return null;
  return new Date(Math.max(...finished.map((at) => at.getTime())));
}

function writeInvoice(
  { rows, ids }: Book,
  job: Job,
  { number, issuedAt, taxRates }: { number: number; issuedAt: Date; taxRates: TaxRate[] },
): InvoiceAmounts {
  const customer = found(rows.customers, job.customerId);
  const address = found(rows.addresses, job.addressId);
  const place = address.city ?? '';
  const today = dayOf(issuedAt.toISOString(), ZONE);
  const lines = rows.jobLines.filter((line) => line.jobId === job.id && line.finishedAt);
  const billable = lines.map(({ id, priceCents }) => ({ id, priceCents, taxClass: 'standard' as const }));
  const amounts = invoiceAmounts(billable, job.discountCents ?? 0, taxesInForce(taxRates, today, place));
  const id = ids();
  rows.invoices.push({
    ...{ id, number, jobId: job.id, customerId: job.customerId, issuedAt, dueOn: addDays(today, DUE_DAYS), place },
    billTo: { name: customer.name, line: address.line, city: place, postcode: address.postcode ?? '' },
    discountReason: job.discountReason ?? '',
    ...{ netCents: amounts.netCents, taxCents: amounts.taxCents, totalCents: amounts.totalCents },
  });
  amounts.lines.forEach(({ id: jobLineId, taxClass, priceCents, discountCents }, position) => {
    const line = found(lines, jobLineId);
    const vehicle = rows.vehicles.find((one) => one.id === line.vehicleId);
    rows.invoiceLines.push({
      ...{ id: ids(), invoiceId: id, jobLineId, taxClass, priceCents, discountCents, position },
      label: found(rows.services, line.serviceId).name,
      detail: [vehicle?.color, vehicle?.label].filter(Boolean).join(' '),
    });
  });
  amounts.taxes.forEach((tax, position) => rows.invoiceTaxes.push({ id: ids(), invoiceId: id, ...tax, position }));
  return amounts;
}

interface Owed {
  issuedAt: Date;
  totalCents: number;
  random: Random;
}

/** Most pay by card within hours, some at the car; companies by transfer; a few are late. */
function writePayment({ rows, ids, calendar }: Book, people: DemoPeople, job: Job, owed: Owed): void {
  const { issuedAt, totalCents, random } = owed;
  const age = (calendar.asOf.getTime() - issuedAt.getTime()) / (24 * 60 * MINUTE);
  const isCompany = found(rows.customers, job.customerId).isCompany ?? false;
  const [draw, wait, isSlow] = [random.next(), random.int(2, 600), random.chance(age > 30 ? 0.02 : 0.14)];
  if (totalCents === 0 || isSlow) return;
  const method = isCompany ? 'transfer' : draw < 0.72 ? 'card' : draw < 0.9 ? 'cash' : 'check';
  const isAtTheCar = method === 'cash' || method === 'check';
  const receivedAt = new Date(issuedAt.getTime() + (isAtTheCar ? 2 : isCompany ? wait * 20 : wait) * MINUTE);
  if (receivedAt > calendar.asOf) return;
  const id = ids();
  const visit = rows.visits.find((one) => one.jobId === job.id);
  const taker = isAtTheCar ? rows.visitCrew.find((one) => one.visitId === visit?.id)?.personId : undefined;
  const desk = people.dispatchers[0]?.userId ?? people.ownerUserId;
  const takerUser = rows.users.find((user) => user.personId === taker)?.id;
  const recordedBy = method === 'card' ? null : (takerUser ?? desk);
  rows.payments.push({
    ...{ id, jobId: job.id, method, amountCents: totalCents, receivedAt, recordedAt: receivedAt, recordedBy },
    ...{ personId: taker ?? null, providerRef: method === 'card' ? `pi_demo_${id.slice(-12)}` : null },
  });
  rows.jobsPaid.push({ jobId: job.id, paidAt: receivedAt, recordedBy, recordedAt: receivedAt });
}

function found<T extends { id: string }>(list: readonly T[], id: string): T {
  const item = list.find((one) => one.id === id);
  if (!item) throw new RangeError(`no row ${id}`);
  return item;
}
