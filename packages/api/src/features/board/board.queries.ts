import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { boardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { visitDto } from '@driprail/shared/contracts/visit.dto';
import { FORGOTTEN_AFTER_HOURS } from '@driprail/shared/domain/time/forgotten';
import { select } from '../../db/sequelize.ts';
import { visitFrom, visitJson } from './visit.sql.ts';

/** What the contract takes; parsing it on the way out makes every instant look the same. */
export type BoardRow = z.input<typeof boardDto>;

const OVERTIME_AFTER_MINUTES = 40 * 60;

/** A day by vans in one statement: bounds come from the company's zone, the workweek from the rules of that day. */
export const boardSql = `
WITH frame AS (
  SELECT s.zone, s.clock, s.day_starts_at, s.day_ends_at, s.reason_kinds,
         (:day::date)::timestamp AT TIME ZONE s.zone AS starts_at,
         (:day::date + 1)::timestamp AT TIME ZONE s.zone AS ends_at,
         (:day::date - ((extract(isodow FROM :day::date)::int - coalesce(r.workweek_starts_on, 1) + 7) % 7))
           + coalesce(r.workweek_starts_at, '00:00')::time AS week_local
    FROM company_settings s
    LEFT JOIN LATERAL (SELECT workweek_starts_on, workweek_starts_at FROM pay_rules WHERE starts_on <= :day ORDER BY starts_on DESC LIMIT 1) r ON true
), week AS (
  SELECT week_local AT TIME ZONE zone AS starts_at, (week_local + interval '7 days') AT TIME ZONE zone AS ends_at FROM frame
), load AS (
  SELECT p.id AS person_id, (
    coalesce((SELECT sum(extract(epoch FROM least(coalesce(e.ended_at, :now), w.ends_at) - greatest(e.started_at, w.starts_at))) / 60
       FROM clock_entries e WHERE e.person_id = p.id AND e.kind <> 'meal_break'
        AND e.started_at < w.ends_at AND coalesce(e.ended_at, :now) > w.starts_at
        AND (e.ended_at IS NOT NULL OR e.started_at > :now::timestamptz - interval '${FORGOTTEN_AFTER_HOURS} hours')), 0)
    + coalesce((SELECT sum(extract(epoch FROM upper(v.planned) - greatest(lower(v.planned), :now::timestamptz)) / 60)
       FROM van_crew r JOIN visits v ON v.van_id = r.van_id AND v.planned && r.span
      WHERE r.person_id = p.id AND r.span && tstzrange(w.starts_at, w.ends_at) AND v.planned && tstzrange(w.starts_at, w.ends_at)
        AND upper(v.planned) > :now AND v.progress IN ('placed', 'on_the_way', 'on_site', 'working')), 0))::int AS minutes
    FROM people p CROSS JOIN week w WHERE p.is_active
)
SELECT json_build_object(
  'day', :day::text, 'zone', f.zone, 'clock', f.clock, 'now', to_json(:now::timestamptz) #>> '{}',
  'dayStartsAt', f.day_starts_at, 'dayEndsAt', f.day_ends_at, 'reasonKinds', to_json(f.reason_kinds),
  'overtimeAfterMinutes', ${OVERTIME_AFTER_MINUTES},
  'isLocked', EXISTS (SELECT 1 FROM pay_weeks p WHERE p.state = 'locked' AND p.starts_at < f.ends_at AND p.ends_at > f.starts_at),
  'vans', coalesce((SELECT json_agg(json_build_object('id', n.id, 'name', n.name, 'equipment', to_json(n.equipment), 'crew',
      coalesce((SELECT json_agg(json_build_object('personId', p.id, 'name', p.name, 'skills', to_json(p.skills), 'isTrainee', p.is_trainee,
          'from', to_json(lower(r.span)) #>> '{}', 'to', to_json(upper(r.span)) #>> '{}',
          'isOff', EXISTS (SELECT 1 FROM time_off t WHERE t.person_id = p.id AND :day::date BETWEEN t.starts_on AND t.ends_on),
          'isClockedIn', EXISTS (SELECT 1 FROM clock_entries e WHERE e.person_id = p.id AND e.ended_at IS NULL),
          'weekMinutes', coalesce(load.minutes, 0)) ORDER BY lower(r.span), r.position)
        FROM van_crew r JOIN people p ON p.id = r.person_id LEFT JOIN load ON load.person_id = p.id
       WHERE r.van_id = n.id AND r.span && tstzrange(f.starts_at, f.ends_at)), '[]'::json)) ORDER BY n.position, n.name)
    FROM vans n WHERE n.is_active OR EXISTS (SELECT 1 FROM visits v WHERE v.van_id = n.id AND v.planned && tstzrange(f.starts_at, f.ends_at))), '[]'::json),
  'visits', coalesce((SELECT json_agg(${visitJson} ORDER BY lower(v.planned), v.id) FROM ${visitFrom}
     WHERE v.planned && tstzrange(f.starts_at, f.ends_at)), '[]'::json),
  'unplaced', coalesce((SELECT json_agg(${visitJson} ORDER BY j.window_from NULLS LAST, j.number, v.part) FROM ${visitFrom}
     WHERE v.progress = 'unplaced'), '[]'::json),
  'troubles', coalesce((SELECT json_agg(json_build_object('id', e.id, 'visitId', e.visit_id, 'at', to_json(e.occurred_at) #>> '{}',
      'kind', coalesce(e.trouble, 'other'), 'note', e.reason, 'by', coalesce(p.name, u.name, '')) ORDER BY e.occurred_at)
    FROM visit_events e JOIN visits v ON v.id = e.visit_id LEFT JOIN people p ON p.id = e.person_id LEFT JOIN users u ON u.id = e.user_id
   WHERE e.kind = 'trouble' AND e.settled_at IS NULL
     AND (v.planned && tstzrange(f.starts_at, f.ends_at) OR v.progress = 'unplaced')), '[]'::json)
) AS board FROM frame f`;

export async function readBoard(day: string, now: Date, tx?: Transaction): Promise<BoardRow> {
  const [row] = await select<{ board: BoardRow }>(boardSql, { day, now: now.toISOString() }, tx);
  if (!row) throw new Error('the company is not set up');
  return row.board;
}

/** Visits by id or by job, as the board shows them. */
export async function readVisits(where: { ids: string[] } | { jobId: string }, tx?: Transaction): Promise<VisitDto[]> {
  const condition = 'ids' in where ? 'v.id IN (:ids)' : 'v.job_id = :jobId';
  const rows = await select<{ visit: z.input<typeof visitDto> }>(
    `SELECT ${visitJson} AS visit FROM ${visitFrom} WHERE ${condition} ORDER BY v.part`,
    { ...where },
    tx,
  );
  return rows.map((row) => visitDto.parse(row.visit));
}

export interface DayLoad {
  day: string;
  vans: { vanId: string; minutes: number; visits: number }[];
}

/** Planned minutes per van on each day of the calendar week that holds `day`; called-off visits do not count. */
export async function readBoardWeek(day: string): Promise<{ days: DayLoad[]; capacityMinutes: number }> {
  const rows = await select<{ day: string; vans: DayLoad['vans']; capacity: number }>(
    `SELECT d::date::text AS day, (extract(epoch FROM s.day_ends_at::time - s.day_starts_at::time) / 60)::int AS capacity,
            coalesce((SELECT json_agg(json_build_object('vanId', x.van_id, 'minutes', x.minutes, 'visits', x.visits)) FROM (
              SELECT v.van_id, sum(extract(epoch FROM upper(v.planned) - lower(v.planned)) / 60)::int AS minutes, count(*) AS visits
                FROM visits v WHERE v.progress <> 'called_off' AND lower(v.planned) >= d::timestamp AT TIME ZONE s.zone
                 AND lower(v.planned) < (d + interval '1 day')::timestamp AT TIME ZONE s.zone GROUP BY v.van_id) x), '[]') AS vans
       FROM company_settings s, generate_series(date_trunc('week', :day::timestamp), date_trunc('week', :day::timestamp) + interval '6 days', interval '1 day') d
      ORDER BY d`,
    { day },
  );
  return { days: rows.map(({ day: on, vans }) => ({ day: on, vans })), capacityMinutes: rows[0]?.capacity ?? 600 };
}
