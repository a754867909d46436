import type pg from 'pg';
import { setUpCompany } from '../src/features/settings/index.ts';

export const TECHNICIANS = 200;
const JOBS_A_DAY = 2;

/** An empty company with its owner; everything else of the history comes as rows. */
export function fillOwner(now: Date): Promise<unknown> {
  return setUpCompany(
    {
      ...{ companyName: 'Tern & Tide', zone: 'America/New_York', ownerName: 'Rowan Tern' },
      ...{ email: 'owner@ternandtide.example', password: 'driprail-demo' },
    },
    () => now,
  );
}

/** Technicians with a van each, one customer, one service, one rate by the hour and one percentage. */
export async function fillCompany(pool: pg.Pool): Promise<void> {
  await pool.query(`
    CREATE FUNCTION pg_temp.one(text) RETURNS uuid LANGUAGE sql AS $$ SELECT md5($1)::uuid $$;
    INSERT INTO people (id, name) SELECT pg_temp.one('p' || n), 'Technician ' || lpad(n::text, 3, '0') FROM generate_series(1, ${TECHNICIANS}) n;
    INSERT INTO vans (id, name) SELECT pg_temp.one('v' || n), 'Van ' || n FROM generate_series(1, ${TECHNICIANS}) n;
    INSERT INTO customers (id, name) VALUES (pg_temp.one('c'), 'Nakagawa');
    INSERT INTO addresses (id, customer_id, line) VALUES (pg_temp.one('a'), pg_temp.one('c'), '14 Saltpan Lane');
    INSERT INTO services (id, name, kind) VALUES (pg_temp.one('s'), 'One-step polish', 'package');
    INSERT INTO pay_rates (id, kind, value, starts_on)
      VALUES (pg_temp.one('h'), 'hourly', 19.5, '2025-01-01'), (pg_temp.one('k'), 'commission_percent', 6, '2025-01-01');`);
}

/**
 * One week of everybody's work: five days of two jobs of four and a half hours, on the clock, finished.
 * @param monday "YYYY-MM-DD"
 */
export async function addWeek(pool: pg.Pool, monday: string): Promise<void> {
  await pool.query(`
    CREATE TEMP TABLE slot ON COMMIT DROP AS
      SELECT n, gen_random_uuid() AS job, gen_random_uuid() AS stop, gen_random_uuid() AS visit, gen_random_uuid() AS line,
             at, at + interval '4 hours 30 minutes' AS until
        FROM generate_series(1, ${TECHNICIANS}) n, generate_series(0, 4) d, generate_series(0, ${JOBS_A_DAY - 1}) s,
             LATERAL (SELECT (DATE '${monday}' + d + time '08:00' + s * interval '4 hours 30 minutes') AT TIME ZONE 'America/New_York' AS at) t;
    INSERT INTO jobs (id, customer_id, address_id) SELECT job, md5('c')::uuid, md5('a')::uuid FROM slot;
    INSERT INTO stops (id, address_id) SELECT stop, md5('a')::uuid FROM slot;
    INSERT INTO visits (id, job_id, stop_id, part, van_id, planned, minutes, progress)
      SELECT visit, job, stop, 1, md5('v' || n)::uuid, tstzrange(at, until), 270, 'done' FROM slot;
    INSERT INTO job_lines (id, job_id, service_id, size_class, price_cents, minutes, position, finished_visit_id, finished_at)
      SELECT line, job, md5('s')::uuid, 'sedan', 26500, 270, 0, visit, until FROM slot;
    INSERT INTO visit_crew (visit_id, person_id, position) SELECT visit, md5('p' || n)::uuid, 0 FROM slot;
    INSERT INTO clock_entries (id, person_id, kind, visit_id, started_at, ended_at)
      SELECT gen_random_uuid(), md5('p' || n)::uuid, 'job', visit, at, until FROM slot;`);
}

/** An earlier week of the same work, locked with the lines and statements of a locked one: locking each would take minutes. */
export async function copyLocked(pool: pg.Pool, from: string, monday: string): Promise<void> {
  await addWeek(pool, monday);
  await pool.query(`
    INSERT INTO pay_weeks (id, starts_on, ends_on, starts_at, ends_at)
      SELECT md5('w${monday}')::uuid, DATE '${monday}', DATE '${monday}' + 6, DATE '${monday}' AT TIME ZONE zone, (DATE '${monday}' + 7) AT TIME ZONE zone
        FROM company_settings;
    INSERT INTO pay_statements (pay_week_id, person_id, gross_cents, summary)
      SELECT md5('w${monday}')::uuid, s.person_id, s.gross_cents, s.summary FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
       WHERE w.starts_on = '${from}';
    INSERT INTO pay_lines (id, pay_week_id, person_id, position, key, amount_cents, is_payable, line)
      SELECT gen_random_uuid(), md5('w${monday}')::uuid, l.person_id, l.position, l.key, l.amount_cents, l.is_payable, l.line
        FROM pay_lines l JOIN pay_weeks w ON w.id = l.pay_week_id WHERE w.starts_on = '${from}';
    UPDATE pay_weeks n SET state = 'locked', locked_at = o.locked_at, locked_by = o.locked_by, engine_version = o.engine_version, snapshot = o.snapshot
      FROM pay_weeks o WHERE n.starts_on = '${monday}' AND o.starts_on = '${from}';`);
}
