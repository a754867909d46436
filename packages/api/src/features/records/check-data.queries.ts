import { select } from '../../db/sequelize.ts';

/** What must hold in every company's data, each as a statement that counts the rows that break it. */
const checks: { what: string; sql: string }[] = [
  {
    what: 'no van is planned at two stops at once',
    sql: `SELECT count(*) AS count FROM visits a JOIN visits b ON a.van_id = b.van_id AND a.id < b.id AND a.stop_id <> b.stop_id AND a.planned && b.planned
      WHERE a.progress <> 'called_off' AND b.progress <> 'called_off'`,
  },
  {
    what: 'no person rides in two vans at once',
    sql: `SELECT count(*) AS count FROM van_crew a JOIN van_crew b ON a.person_id = b.person_id AND a.id < b.id AND a.span && b.span`,
  },
  {
    what: 'a locked statement is the sum of its payable lines',
    sql: `SELECT count(*) AS count FROM pay_statements s WHERE s.gross_cents <>
      coalesce((SELECT sum(l.amount_cents) FROM pay_lines l WHERE l.pay_week_id = s.pay_week_id AND l.person_id = s.person_id AND l.is_payable), 0)`,
  },
  {
    what: 'every locked week has its snapshot and who locked it',
    sql: `SELECT count(*) AS count FROM pay_weeks WHERE state = 'locked' AND (snapshot IS NULL OR locked_by IS NULL OR locked_at < ends_at)`,
  },
  {
    what: 'lines are frozen for locked weeks only',
    sql: `SELECT count(*) AS count FROM pay_lines l JOIN pay_weeks w ON w.id = l.pay_week_id WHERE w.state <> 'locked'`,
  },
  {
    what: 'a correction names a line of the same person in another week',
    sql: `SELECT count(*) AS count FROM pay_adjustments a JOIN pay_lines l ON l.id = a.corrects_line_id
      WHERE l.person_id <> a.person_id OR l.pay_week_id = a.pay_week_id`,
  },
  {
    what: 'finished lines belong to a visit that ended',
    sql: `SELECT count(*) AS count FROM job_lines l JOIN visits v ON v.id = l.finished_visit_id WHERE v.progress NOT IN ('done', 'part_done')`,
  },
  {
    what: 'a visit that began has its crew',
    sql: `SELECT count(*) AS count FROM visits v WHERE v.progress IN ('on_site', 'working') AND NOT EXISTS (SELECT 1 FROM visit_crew c WHERE c.visit_id = v.id)`,
  },
  {
    what: 'a discount is not more than its job',
    sql: `SELECT count(*) AS count FROM jobs j WHERE j.discount_cents > coalesce((SELECT sum(price_cents) FROM job_lines l WHERE l.job_id = j.id), 0)`,
  },
  {
    what: 'a stored photo has arrived whole, and no piece of it is left',
    sql: `SELECT count(*) AS count FROM photos p WHERE p.stored_at IS NOT NULL
      AND (p.received_bytes <> p.bytes OR EXISTS (SELECT 1 FROM photo_pieces x WHERE x.photo_id = p.id))`,
  },
  {
    what: 'pieces of a photo add up to what has arrived of it',
    sql: `SELECT count(*) AS count FROM photos p WHERE p.stored_at IS NULL AND p.refused IS NULL
      AND p.received_bytes <> coalesce((SELECT sum(octet_length(x.content)) FROM photo_pieces x WHERE x.photo_id = p.id), 0)`,
  },
  {
    what: 'a mark of last time answers one of the same car',
    sql: `SELECT count(*) AS count FROM walk_marks m JOIN walk_marks o ON o.id = m.carried_from WHERE o.vehicle_id IS DISTINCT FROM m.vehicle_id`,
  },
  {
    what: 'numbers of invoices and credit notes run without a gap, up to their counters',
    sql: `SELECT coalesce(sum(abs(c.last_number - c.first_number + 1 - c.there)), 0)::int AS count FROM (
      SELECT k.last_number, CASE k.kind WHEN 'invoice' THEN 1001 ELSE 101 END AS first_number,
             CASE k.kind WHEN 'invoice' THEN (SELECT count(*) FROM invoices) ELSE (SELECT count(*) FROM credit_notes) END AS there
        FROM document_counters k) c`,
  },
  {
    what: 'an invoice is the sum of its lines and taxes',
    sql: `SELECT count(*) AS count FROM invoices i
      WHERE i.net_cents <> coalesce((SELECT sum(l.price_cents - l.discount_cents) FROM invoice_lines l WHERE l.invoice_id = i.id), 0)
         OR i.tax_cents <> coalesce((SELECT sum(t.tax_cents) FROM invoice_taxes t WHERE t.invoice_id = i.id), 0)`,
  },
  {
    what: 'a credit note is the sum of its lines and taxes, and no line is credited beyond its price',
    sql: `SELECT (SELECT count(*) FROM credit_notes c
        WHERE c.net_cents <> coalesce((SELECT sum(l.net_cents) FROM credit_note_lines l WHERE l.credit_note_id = c.id), 0)
           OR c.tax_cents <> coalesce((SELECT sum(t.tax_cents) FROM credit_note_taxes t WHERE t.credit_note_id = c.id), 0))
      + (SELECT count(*) FROM invoice_lines i WHERE i.price_cents - i.discount_cents
           < coalesce((SELECT sum(l.net_cents) FROM credit_note_lines l WHERE l.invoice_line_id = i.id), 0)) AS count`,
  },
  {
    what: 'no more goes back of a payment than was received',
    sql: `SELECT count(*) AS count FROM payments p
      WHERE p.amount_cents < coalesce((SELECT sum(r.amount_cents) FROM refunds r WHERE r.payment_id = p.id AND r.state <> 'failed'), 0)`,
  },
  {
    what: 'a count of cash names what should have been there',
    sql: `SELECT count(*) AS count FROM cash_counts c WHERE c.expected_cents <> coalesce((
      SELECT sum(p.amount_cents + coalesce((SELECT sum(t.amount_cents) FROM tips t WHERE t.payment_id = p.id AND NOT t.already_received), 0))
        FROM cash_count_payments x JOIN payments p ON p.id = x.payment_id WHERE x.cash_count_id = c.id), 0)`,
  },
];

export interface DataFinding {
  what: string;
  /** Rows that break it. */
  count: number;
}

export async function checkData(): Promise<DataFinding[]> {
  const findings: DataFinding[] = [];
  for (const { what, sql } of checks) {
    const [row] = await select<{ count: number }>(sql);
    findings.push({ what, count: row?.count ?? 0 });
  }
  return findings;
}
