import type { z } from 'zod';
import type { listHeld as contract } from '@driprail/shared/contracts/billing.contract';
import { select } from '../../db/sequelize.ts';
import { isOpenVisit } from './bill.queries.ts';

type Held = z.infer<(typeof contract)['response']>['held'];

/** Jobs where nothing was done, nothing is to come and no invoice stands, and money was received and not given back. */
export function moneyHeld(): Promise<Held> {
  return select<Held[number]>(
    `SELECT j.id AS "jobId", j.number AS "jobNumber", c.name AS "customerName", sum(p.amount_cents - back.cents)::bigint AS cents
       FROM payments p JOIN jobs j ON j.id = p.job_id JOIN customers c ON c.id = j.customer_id
      CROSS JOIN LATERAL (SELECT coalesce(sum(r.amount_cents), 0) AS cents FROM refunds r
                           WHERE r.payment_id = p.id AND r.state <> 'failed') back
      WHERE NOT EXISTS (SELECT 1 FROM invoices i WHERE i.job_id = j.id AND i.voided_at IS NULL)
        AND NOT EXISTS (SELECT 1 FROM visits v WHERE v.job_id = j.id AND ${isOpenVisit})
        AND NOT EXISTS (SELECT 1 FROM job_lines l WHERE l.job_id = j.id AND l.finished_at IS NOT NULL)
      GROUP BY j.id, c.name HAVING sum(p.amount_cents - back.cents) > 0 ORDER BY j.number`,
  );
}
