import type { Transaction } from 'sequelize';
import type { BillDto, BillTo } from '@driprail/shared/contracts/bill.dto';
import type { TaxClass, TaxRate } from '@driprail/shared/domain/billing/tax-rates';
import { select } from '../../db/sequelize.ts';

/** A visit `v` that is still to come or under way. */
export const isOpenVisit = `v.progress NOT IN ('part_done', 'done', 'called_off')`;

export interface JobRow {
  jobId: string;
  jobNumber: number;
  customerId: string;
  customerName: string;
  billTo: BillTo;
  place: string;
  discountCents: number;
  discountReason: string;
  lines: { id: string; label: string; detail: string; taxClass: TaxClass; priceCents: number; isFinished: boolean }[];
  /** Visits that are still to come or under way. */
  openVisits: number;
  /** What the menu asks beforehand, of the lines' prices before tax. */
  depositCents: number;
  /** What the policy asks for a call-off that the customer made late; null for none. */
  proposedFeeCents: number | null;
}

/** A job as it would be billed. */
export async function readJobRow(jobId: string, tx?: Transaction): Promise<JobRow | null> {
  const [row] = await select<JobRow>(
    `SELECT j.id AS "jobId", j.number AS "jobNumber", c.id AS "customerId", c.name AS "customerName",
            json_build_object('name', c.name, 'line', a.line, 'city', a.city, 'postcode', a.postcode) AS "billTo",
            a.city AS place, j.discount_cents AS "discountCents", j.discount_reason AS "discountReason",
            coalesce((SELECT json_agg(json_build_object('id', l.id, 'label', s.name, 'detail', concat_ws(' ', nullif(w.color, ''), w.label),
                'taxClass', s.tax_class, 'priceCents', l.price_cents, 'isFinished', l.finished_at IS NOT NULL) ORDER BY l.position, l.id)
              FROM job_lines l JOIN services s ON s.id = l.service_id LEFT JOIN vehicles w ON w.id = l.vehicle_id
             WHERE l.job_id = j.id), '[]') AS lines,
            (SELECT count(*)::int FROM visits v WHERE v.job_id = j.id AND ${isOpenVisit}) AS "openVisits",
            (SELECT coalesce(sum(ceil(l.price_cents * s.deposit_percent / 100.0)), 0)::bigint FROM job_lines l
               JOIN services s ON s.id = l.service_id WHERE l.job_id = j.id) AS "depositCents",
            (SELECT nullif(o.proposed_fee_cents, 0) FROM online_bookings o WHERE o.job_id = j.id) AS "proposedFeeCents"
       FROM jobs j JOIN customers c ON c.id = j.customer_id JOIN addresses a ON a.id = j.address_id WHERE j.id = :jobId`,
    { jobId },
    tx,
  );
  return row ?? null;
}

export type InvoiceRow = NonNullable<BillDto['invoice']> & {
  billTo: BillTo;
  place: string;
  discountReason: string;
  totalCents: number;
  lines: BillDto['lines'];
  taxes: BillDto['taxes'];
};

/** The invoice that stands for a job, with what was credited of each line and tax. */
export async function readInvoiceRow(jobId: string, tx?: Transaction): Promise<InvoiceRow | null> {
  const [row] = await select<InvoiceRow>(
    `SELECT i.id, i.number, to_json(i.issued_at) #>> '{}' AS "issuedAt", i.due_on::text AS "dueOn", i.bill_to AS "billTo", i.place,
            i.discount_reason AS "discountReason", i.total_cents AS "totalCents",
            (SELECT json_agg(json_build_object('id', l.id, 'label', l.label, 'detail', l.detail, 'taxClass', l.tax_class,
                'priceCents', l.price_cents, 'discountCents', l.discount_cents, 'creditedCents',
                (SELECT coalesce(sum(n.net_cents), 0) FROM credit_note_lines n WHERE n.invoice_line_id = l.id)) ORDER BY l.position)
               FROM invoice_lines l WHERE l.invoice_id = i.id) AS lines,
            coalesce((SELECT json_agg(json_build_object('id', t.id, 'name', t.name, 'place', t.place, 'taxClass', t.tax_class,
                'percent', trim_scale(t.percent)::text, 'baseCents', t.base_cents, 'taxCents', t.tax_cents, 'creditedCents',
                (SELECT coalesce(sum(n.tax_cents), 0) FROM credit_note_taxes n WHERE n.invoice_tax_id = t.id)) ORDER BY t.position)
               FROM invoice_taxes t WHERE t.invoice_id = i.id), '[]') AS taxes
       FROM invoices i WHERE i.job_id = :jobId AND i.voided_at IS NULL`,
    { jobId },
    tx,
  );
  return row ?? null;
}

export interface LedgerRow {
  payments: BillDto['payments'];
  refunds: BillDto['refunds'];
  creditNotes: BillDto['creditNotes'];
  /** Of every invoice of the job, voided ones too. */
  invoicedCents: number;
}

/** Everything that was billed, received and given back on a job. */
export async function readLedger(jobId: string, tx?: Transaction): Promise<LedgerRow> {
  const [row] = await select<LedgerRow>(
    `SELECT coalesce((SELECT json_agg(json_build_object('id', p.id, 'method', p.method, 'amountCents', p.amount_cents,
              'receivedAt', to_json(p.received_at) #>> '{}', 'by', coalesce(n.name, u.name, ''), 'reference', p.reference,
              'refundedCents', (SELECT coalesce(sum(r.amount_cents), 0) FROM refunds r WHERE r.payment_id = p.id AND r.state <> 'failed'))
              ORDER BY p.received_at, p.id)
             FROM payments p LEFT JOIN users u ON u.id = p.recorded_by LEFT JOIN people n ON n.id = p.person_id WHERE p.job_id = :jobId), '[]') AS payments,
            coalesce((SELECT json_agg(json_build_object('id', r.id, 'paymentId', r.payment_id, 'kind', r.kind, 'amountCents', r.amount_cents,
              'state', r.state, 'fault', r.fault, 'note', r.note, 'madeAt', to_json(r.made_at) #>> '{}', 'creditNoteNumber', c.number)
              ORDER BY r.made_at, r.id)
             FROM refunds r JOIN payments p ON p.id = r.payment_id LEFT JOIN credit_notes c ON c.id = r.credit_note_id WHERE p.job_id = :jobId), '[]') AS refunds,
            coalesce((SELECT json_agg(json_build_object('id', c.id, 'number', c.number, 'totalCents', c.net_cents + c.tax_cents,
              'issuedAt', to_json(c.issued_at) #>> '{}', 'note', c.note) ORDER BY c.number)
             FROM credit_notes c JOIN invoices i ON i.id = c.invoice_id WHERE i.job_id = :jobId), '[]') AS "creditNotes",
            (SELECT coalesce(sum(total_cents), 0)::bigint FROM invoices WHERE job_id = :jobId) AS "invoicedCents"`,
    { jobId },
    tx,
  );
  if (!row) throw new Error('a select without a table answers one row');
  return row;
}

/** Every tax rate ever entered. */
export function readTaxRates(tx?: Transaction): Promise<TaxRate[]> {
  return select<TaxRate>(
    `SELECT name, tax_class AS "taxClass", place, trim_scale(percent)::text AS percent, starts_on::text AS "startsOn" FROM tax_rates`,
    {},
    tx,
  );
}
