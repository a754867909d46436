import { withOffset } from '@driprail/shared/domain/time/zone-instants';
import { companyOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import { csvText, harmless, plainCents } from '../../paper/csv.ts';

interface Row {
  at: string;
  kind: string;
  method: string;
  jobNumber: number;
  invoiceNumber: number | null;
  customerName: string;
  amountCents: number;
  tipCents: number;
  by: string;
  reference: string;
  state: string;
}

const columns = [
  ...['time', 'kind', 'method', 'job', 'invoice', 'customer', 'amount', 'tip', 'by', 'reference', 'state'],
] as const;

/** A row per payment of a day and per amount given back, which is negative; times are the company's. */
export async function moneyDayCsv(day: string): Promise<string> {
  const { zone } = await companyOf();
  const rows = await select<Row>(
    `WITH rows AS (
       SELECT p.received_at AS at, 'payment' AS kind, p.method, p.job_id, p.amount_cents AS amount,
              (SELECT coalesce(sum(t.amount_cents), 0) FROM tips t WHERE t.payment_id = p.id AND NOT t.already_received) AS tip,
              coalesce(n.name, u.name, '') AS "by", p.reference, 'done' AS state
         FROM payments p LEFT JOIN people n ON n.id = p.person_id LEFT JOIN users u ON u.id = p.recorded_by
       UNION ALL
       SELECT r.made_at, r.kind, p.method, p.job_id, -r.amount_cents, 0, coalesce(u.name, ''), r.note, r.state
         FROM refunds r JOIN payments p ON p.id = r.payment_id LEFT JOIN users u ON u.id = r.made_by WHERE r.state <> 'failed'
     )
     SELECT to_json(rows.at) #>> '{}' AS at, kind, method, j.number AS "jobNumber", i.number AS "invoiceNumber", c.name AS "customerName",
            amount::bigint AS "amountCents", tip::bigint AS "tipCents", rows."by", reference, state
       FROM rows JOIN jobs j ON j.id = rows.job_id JOIN customers c ON c.id = j.customer_id
       LEFT JOIN invoices i ON i.job_id = j.id AND i.voided_at IS NULL
      WHERE rows.at >= :day::timestamp AT TIME ZONE :zone AND rows.at < (:day::date + 1)::timestamp AT TIME ZONE :zone
      ORDER BY rows.at, kind, j.number`,
    { day, zone },
  );
  return csvText(
    columns,
    rows.map((row) => [
      ...[withOffset(row.at, zone), row.kind, row.method, row.jobNumber, row.invoiceNumber ?? ''],
      ...[harmless(row.customerName), plainCents(row.amountCents), plainCents(row.tipCents)],
      ...[harmless(row.by), harmless(row.reference), row.state],
    ]),
  );
}
