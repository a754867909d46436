import type { Transaction } from 'sequelize';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { PayWeekDto, listPayWeeks } from '@driprail/shared/contracts/pay.contract';
import { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { headOf, weekAt } from './weeks.service.ts';

/** What a finished line `l` of job `j` sold for: a discount lowers each line by its share of the job's price. */
const soldSql = `l.price_cents - CASE WHEN j.discount_cents = 0 THEN 0 ELSE
  round(j.discount_cents * l.price_cents::numeric / greatest(1, (SELECT sum(price_cents) FROM job_lines o WHERE o.job_id = j.id))) END`;

/** What the week's finished work sold for, cents. */
export async function salesOf(week: PayWeek, tx?: Transaction): Promise<number> {
  const [row] = await select<{ cents: number }>(
    `SELECT coalesce(sum(${soldSql}), 0)::bigint AS cents
       FROM job_lines l JOIN jobs j ON j.id = l.job_id WHERE l.finished_at >= :from AND l.finished_at < :to`,
    { from: week.startsAt, to: week.endsAt },
    tx,
  );
  return row?.cents ?? 0;
}

/** Visits planned on days of the week that are over, which nobody marked done, part done or called off. */
export function unendedOf(week: PayWeek, now: Date, tx?: Transaction): Promise<PayWeekDto['unended']> {
  return select(
    `SELECT v.id AS "visitId", j.number AS "jobNumber", (lower(v.planned) AT TIME ZONE s.zone)::date::text AS day,
            coalesce((SELECT json_agg(p.name ORDER BY c.position) FROM van_crew c JOIN people p ON p.id = c.person_id
               WHERE c.van_id = v.van_id AND c.span && v.planned), '[]') AS "crewNames"
       FROM visits v JOIN jobs j ON j.id = v.job_id CROSS JOIN company_settings s
      WHERE v.planned && tstzrange(:from, :to) AND lower(v.planned) >= :from
        AND v.progress IN ('placed', 'on_the_way', 'on_site', 'working')
        AND (lower(v.planned) AT TIME ZONE s.zone)::date < (:now::timestamptz AT TIME ZONE s.zone)::date
      ORDER BY v.planned, j.number`,
    { from: week.startsAt, to: week.endsAt, now: now.toISOString() },
    tx,
  );
}

interface WeekFigures {
  id: string;
  grossCents: number | null;
  tipCents: number | null;
  salesCents: number;
}

/** Weeks that were touched and the one that holds today, newest first, each with its figures. */
export async function listWeeks(today: string): Promise<OutputOf<typeof listPayWeeks>['weeks']> {
  const figures = await listWeekFigures();
  const stored = await PayWeek.findAll({ where: { id: figures.map((f) => f.id) } });
  const current = await weekAt(today);
  const weeks = current.isNewRecord ? [...stored, current] : stored;
  weeks.sort((a, b) => (a.startsOn < b.startsOn ? 1 : -1));
  return Promise.all(
    weeks.map(async (week) => {
      const known = figures.find((f) => f.id === week.id);
      const salesCents = known?.salesCents ?? (await salesOf(week));
      return {
        ...(await headOf(week)),
        grossCents: known?.grossCents ?? null,
        tipCents: known?.tipCents ?? null,
        salesCents,
      };
    }),
  );
}

/** Gross and tips of locked weeks and sales of all, newest first. */
function listWeekFigures(): Promise<WeekFigures[]> {
  return select<WeekFigures>(
    `SELECT w.id, s."grossCents", s."tipCents",
            coalesce((SELECT sum(${soldSql}) FROM job_lines l JOIN jobs j ON j.id = l.job_id
               WHERE l.finished_at >= w.starts_at AND l.finished_at < w.ends_at), 0)::bigint AS "salesCents"
       FROM pay_weeks w
       LEFT JOIN LATERAL (SELECT sum(p.gross_cents)::bigint AS "grossCents", sum((p.summary->'totals'->>'tips')::bigint)::bigint AS "tipCents"
              FROM pay_statements p WHERE p.pay_week_id = w.id) s ON true
      ORDER BY w.starts_on DESC LIMIT 60`,
  );
}
