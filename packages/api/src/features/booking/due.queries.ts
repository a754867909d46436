import type { z } from 'zod';
import { DUE_AHEAD_DAYS } from '@driprail/shared/contracts/jobs.contract';
import type { listDue as contract } from '@driprail/shared/contracts/jobs.contract';
import { select } from '../../db/sequelize.ts';

type Due = z.infer<(typeof contract)['response']>['due'];

/**
 * Each car's last of every service that comes again by the menu, where its day is near or past and nothing of the
 * customer's is still to come for that car. @param today company-zone day
 */
export function carsDue(today: string): Promise<Due> {
  return select<Due[number]>(
    `WITH last AS (
       SELECT DISTINCT ON (l.vehicle_id, l.service_id) j.id AS "jobId", j.number AS "jobNumber", c.id AS "customerId",
              c.name AS "customerName", c.phone, concat_ws(' ', nullif(w.color, ''), w.label) AS vehicle, s.name AS "serviceName",
              l.vehicle_id, l.price_cents AS "priceCents", (l.finished_at AT TIME ZONE k.zone)::date AS done, s.interval_days AS days
         FROM job_lines l JOIN services s ON s.id = l.service_id JOIN jobs j ON j.id = l.job_id JOIN customers c ON c.id = j.customer_id
         JOIN vehicles w ON w.id = l.vehicle_id CROSS JOIN company_settings k
        WHERE l.finished_at IS NOT NULL AND s.is_active AND s.interval_days IS NOT NULL AND w.is_active AND j.call_back_of IS NULL
        ORDER BY l.vehicle_id, l.service_id, l.finished_at DESC
     )
     SELECT "jobId", "jobNumber", "customerId", "customerName", phone, vehicle, "serviceName", "priceCents",
            done::text AS "doneOn", (done + days)::text AS "dueOn"
       FROM last
      WHERE done + days <= :today::date + :ahead
        AND NOT EXISTS (SELECT 1 FROM job_lines o JOIN visits v ON v.job_id = o.job_id
              WHERE o.vehicle_id = last.vehicle_id AND o.finished_at IS NULL
                AND v.progress IN ('unplaced', 'placed', 'on_the_way', 'on_site', 'working'))
      ORDER BY done + days, "customerName", vehicle LIMIT 200`,
    { today, ahead: DUE_AHEAD_DAYS },
  );
}
