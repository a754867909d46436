import type { PaidJob, UnpaidJob } from '@driprail/shared/contracts/jobs-paid.contract';
import { companyOf } from '../../../db/company.ts';
import { select } from '../../../db/sequelize.ts';

const jobs = `
  SELECT j.id AS "jobId", j.number AS "jobNumber", c.name AS "customerName",
         (max(l.finished_at) AT TIME ZONE :zone)::date::text AS "doneOn",
         (SELECT sum(o.price_cents) FROM job_lines o WHERE o.job_id = j.id)::bigint - j.discount_cents AS "totalCents"`;
const finished = `FROM jobs j JOIN customers c ON c.id = j.customer_id JOIN job_lines l ON l.job_id = j.id AND l.finished_at IS NOT NULL`;

/** Finished jobs that nobody paid for, done while commission was earned on payment; oldest first. */
export async function jobsWaiting(): Promise<UnpaidJob[]> {
  const { zone } = await companyOf();
  return select<UnpaidJob>(
    `${jobs} ${finished}
      WHERE NOT EXISTS (SELECT 1 FROM jobs_paid jp WHERE jp.job_id = j.id)
        AND (SELECT r.commission_earned FROM pay_rules r WHERE r.starts_on <= (l.finished_at AT TIME ZONE :zone)::date
              ORDER BY r.starts_on DESC LIMIT 1) = 'paid'
      GROUP BY j.id, c.name ORDER BY max(l.finished_at), j.number`,
    { zone },
  );
}

/** The jobs marked as paid last, newest first. */
export async function jobsPaidLately(): Promise<PaidJob[]> {
  const { zone } = await companyOf();
  return select<PaidJob>(
    `${jobs}, (jp.paid_at AT TIME ZONE :zone)::date::text AS "paidOn", coalesce(u.name, 'card payment') AS "recordedBy",
            NOT EXISTS (SELECT 1 FROM pay_weeks w WHERE w.state = 'locked' AND jp.paid_at >= w.starts_at AND jp.paid_at < w.ends_at) AS "mayTakeBack"
       ${finished} JOIN jobs_paid jp ON jp.job_id = j.id LEFT JOIN users u ON u.id = jp.recorded_by
      GROUP BY j.id, c.name, jp.job_id, u.name ORDER BY jp.recorded_at DESC LIMIT 30`,
    { zone },
  );
}
