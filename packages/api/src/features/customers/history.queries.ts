import type { PastJobDto } from '@driprail/shared/contracts/customers.contract';
import { select } from '../../db/sequelize.ts';

const MOST_JOBS = 200;

/** A customer's jobs, the newest first, each with what was done, by whom, for how much, and its photos. */
export function historyOf(customerId: string): Promise<PastJobDto[]> {
  return select<PastJobDto>(
    `SELECT j.id AS "jobId", j.number AS "jobNumber", to_json(last.starts_at) #>> '{}' AS "on", coalesce(last.progress, 'unplaced') AS progress,
            coalesce((SELECT string_agg(s.name, ', ' ORDER BY s.first) FROM (
               SELECT s.name, min(l.position) AS first FROM job_lines l JOIN services s ON s.id = l.service_id WHERE l.job_id = j.id GROUP BY s.name) s), '') AS services,
            coalesce((SELECT string_agg(v.label, ', ' ORDER BY v.first) FROM (
               SELECT a.label, min(l.position) AS first FROM job_lines l JOIN vehicles a ON a.id = l.vehicle_id WHERE l.job_id = j.id GROUP BY a.id) v), '') AS vehicles,
            coalesce(last.van_name, '') AS "vanName", coalesce(last.crew, '') AS crew,
            (SELECT round(sum(extract(epoch FROM ended.at - begun.at) / 60))::integer FROM visits v
               JOIN LATERAL (SELECT min(e.occurred_at) AS at FROM visit_events e WHERE e.visit_id = v.id AND e.kind = 'start_work' AND NOT e.is_undone) begun ON true
               JOIN LATERAL (SELECT max(e.occurred_at) AS at FROM visit_events e WHERE e.visit_id = v.id AND e.kind IN ('finish', 'part_done') AND NOT e.is_undone) ended ON true
              WHERE v.job_id = j.id AND ended.at >= begun.at) AS "workedMinutes",
            coalesce((SELECT sum(v.minutes) FROM visits v WHERE v.job_id = j.id AND v.progress <> 'called_off'), 0)::integer AS "plannedMinutes",
            (coalesce((SELECT sum(l.price_cents) FROM job_lines l WHERE l.job_id = j.id), 0) - j.discount_cents)::bigint AS "totalCents",
            photos.visit_id AS "photoVisitId", photos.count AS "photoCount", photos.shown AS photos
       FROM jobs j
       LEFT JOIN LATERAL (
         SELECT lower(v.planned) AS starts_at, v.progress, n.name AS van_name,
                (SELECT string_agg(p.name, ', ' ORDER BY k.position) FROM visit_crew k JOIN people p ON p.id = k.person_id WHERE k.visit_id = v.id) AS crew
           FROM visits v LEFT JOIN vans n ON n.id = v.van_id WHERE v.job_id = j.id ORDER BY v.part DESC LIMIT 1) last ON true
       CROSS JOIN LATERAL (
         SELECT (array_agg(f.visit_id ORDER BY f.occurred_at DESC))[1] AS visit_id, count(*)::integer AS count,
                to_json(array_remove(ARRAY[
                  (array_agg(json_build_object('id', f.id, 'moment', 'before')::jsonb ORDER BY f.occurred_at) FILTER (WHERE f.moment = 'before'))[1],
                  (array_agg(json_build_object('id', f.id, 'moment', 'after')::jsonb ORDER BY f.occurred_at DESC) FILTER (WHERE f.moment = 'after'))[1]], NULL)) AS shown
           FROM photos f JOIN visits v ON v.id = f.visit_id WHERE v.job_id = j.id AND f.stored_at IS NOT NULL) photos
      WHERE j.customer_id = :customerId ORDER BY last.starts_at DESC NULLS FIRST, j.number DESC LIMIT ${MOST_JOBS}`,
    { customerId },
  );
}

/** Since when somebody is a customer: the first booking, or the record itself. */
export async function customerSince(id: string): Promise<string> {
  const [row] = await select<{ since: string }>(
    `SELECT to_json(least(c.created_at, (SELECT min(j.created_at) FROM jobs j WHERE j.customer_id = c.id))) #>> '{}' AS since
       FROM customers c WHERE c.id = :id`,
    { id },
  );
  if (!row) throw new Error('the customer was just read');
  return row.since;
}
