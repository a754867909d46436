import type { z } from 'zod';
import type { listInvoices as contract } from '@driprail/shared/contracts/billing.contract';
import { todayOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';

type Ask = z.infer<(typeof contract)['query']>;
type Answer = z.infer<(typeof contract)['response']>;
type Row = Answer['invoices'][number] & { total: number; allOwedCents: number; allOverdueCents: number };

const among: Record<Ask['state'], string> = {
  all: 'true',
  unpaid: `state IN ('open', 'overdue', 'owes_back')`,
  draft: 'false',
  open: `state = 'open'`,
  overdue: `state = 'overdue'`,
  paid: `state = 'paid'`,
  owes_back: `state = 'owes_back'`,
};

/** Invoices that stand, newest first, with what is owed on their jobs, and the sums over all that match. */
export async function findInvoices({ state, find, limit, before }: Ask, now: Date): Promise<Answer> {
  const like = `%${find.replace(/[\\%_]/g, '\\$&')}%`;
  const rows = await select<Row>(
    `WITH sums AS (
       SELECT i.id, i.number, i.job_id AS "jobId", j.number AS "jobNumber", i.bill_to ->> 'name' AS "customerName",
              to_json(i.issued_at) #>> '{}' AS "issuedAt", i.due_on::text AS "dueOn", i.total_cents AS "totalCents",
              (SELECT sum(o.total_cents) FROM invoices o WHERE o.job_id = i.job_id)
                - coalesce((SELECT sum(c.net_cents + c.tax_cents) FROM credit_notes c JOIN invoices o ON o.id = c.invoice_id WHERE o.job_id = i.job_id), 0)
                - coalesce((SELECT sum(p.amount_cents) FROM payments p WHERE p.job_id = i.job_id), 0)
                + coalesce((SELECT sum(r.amount_cents) FROM refunds r JOIN payments p ON p.id = r.payment_id
                             WHERE p.job_id = i.job_id AND r.state <> 'failed'), 0) AS owed
         FROM invoices i JOIN jobs j ON j.id = i.job_id WHERE i.voided_at IS NULL
     ), stated AS (
       SELECT sums.*, owed::bigint AS "owedCents", CASE WHEN owed < 0 THEN 'owes_back' WHEN owed = 0 THEN 'paid'
                WHEN "dueOn" < :today THEN 'overdue' ELSE 'open' END AS state FROM sums
     )
     SELECT * FROM (SELECT id, number, "jobId", "jobNumber", "customerName", "issuedAt", "dueOn", "totalCents", "owedCents", state,
            count(*) OVER ()::int AS total, coalesce(sum(owed) FILTER (WHERE owed > 0) OVER (), 0)::bigint AS "allOwedCents",
            coalesce(sum(owed) FILTER (WHERE state = 'overdue') OVER (), 0)::bigint AS "allOverdueCents"
       FROM stated
      WHERE ${among[state]} AND (:find = '' OR "customerName" ILIKE :like OR number::text LIKE :prefix OR "jobNumber"::text LIKE :prefix)
) found
      WHERE :before::int IS NULL OR number < :before::int ORDER BY number DESC LIMIT :limit`,
    { today: await todayOf(now), find, like, prefix: like.slice(1), limit, before: before ?? null },
  );
  const [first] = rows;
  return {
    invoices: rows.map(({ total: _t, allOwedCents: _o, allOverdueCents: _d, ...row }) => row),
    total: first?.total ?? 0,
    owedCents: first?.allOwedCents ?? 0,
    overdueCents: first?.allOverdueCents ?? 0,
  };
}
