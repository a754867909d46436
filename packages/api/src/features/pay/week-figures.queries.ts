import type { Transaction } from 'sequelize';
import type { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

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

export interface WeekFigures {
  id: string;
  grossCents: number | null;
  tipCents: number | null;
  salesCents: number;
}

/** Gross and tips of locked weeks and sales of all, newest first. */
export function listWeekFigures(): Promise<WeekFigures[]> {
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
