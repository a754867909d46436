import type { Transaction } from 'sequelize';
import type { FreeVan, OpenPromise } from '@driprail/shared/domain/availability/plan';
import { select } from '../../db/sequelize.ts';

const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;
const place = (lat: string, lng: string) =>
  `CASE WHEN ${lat} IS NOT NULL AND ${lng} IS NOT NULL THEN json_build_object('lat', ${lat}, 'lng', ${lng}) END`;

/**
 * Everything that availability is reckoned from between `:from` and `:to`, in one statement: vans with who rides and what
 * is planned or held, and the promises on Unplaced. `:now` tells which holds still stand; `:ownHold` and `:ownJob` are
 * what is being booked or moved, and stand in nobody's way.
 */
export const vanDaysSql = `
WITH span AS (SELECT tstzrange(:from, :to) AS whole)
SELECT
  coalesce((SELECT json_agg(json_build_object('id', n.id, 'equipment', to_json(n.equipment),
      'crew', coalesce(crew.list, '[]'::json), 'busy', coalesce(busy.list, '[]'::json)) ORDER BY n.position, n.name)
    FROM vans n CROSS JOIN span
    LEFT JOIN LATERAL (
      SELECT json_agg(json_build_object('from', ${iso('lower(r.span)')}, 'to', ${iso('upper(r.span)')},
               'skills', to_json(p.skills), 'isTrainee', p.is_trainee) ORDER BY lower(r.span), r.position) AS list
        FROM van_crew r JOIN people p ON p.id = r.person_id CROSS JOIN company_settings s
       WHERE r.van_id = n.id AND r.span && span.whole AND p.is_active
         AND NOT EXISTS (SELECT 1 FROM time_off t WHERE t.person_id = p.id
           AND (lower(r.span) AT TIME ZONE s.zone)::date BETWEEN t.starts_on AND t.ends_on)) crew ON true
    LEFT JOIN LATERAL (
      SELECT json_agg(json_build_object('from', ${iso('lower(b.during)')}, 'to', ${iso('upper(b.during)')}, 'place', b.place)) AS list
        FROM (
          SELECT v.planned AS during, ${place('a.lat', 'a.lng')} AS place
            FROM visits v JOIN jobs j ON j.id = v.job_id JOIN addresses a ON a.id = j.address_id
           WHERE v.van_id = n.id AND v.planned && span.whole AND v.progress <> 'called_off' AND v.job_id IS DISTINCT FROM :ownJob::uuid
          UNION ALL
          SELECT h.during, ${place('h.lat', 'h.lng')} FROM booking_holds h
           WHERE h.van_id = n.id AND h.during && span.whole AND h.expires_at > :now AND h.id IS DISTINCT FROM :ownHold::uuid
        ) b) busy ON true
   WHERE n.is_active), '[]'::json) AS vans,
  coalesce((SELECT json_agg(json_build_object('window', json_build_object('from', ${iso('j.window_from')}, 'to', ${iso('j.window_to')}),
      'lineMinutes', json_build_array(v.minutes), 'skills', needs.skills, 'equipment', needs.equipment,
      'bringsWater', needs.water AND NOT a.has_water, 'bringsPower', needs.power AND NOT a.has_power,
      'place', ${place('a.lat', 'a.lng')}) ORDER BY j.window_from, v.minutes DESC, v.id)
    FROM visits v JOIN jobs j ON j.id = v.job_id JOIN addresses a ON a.id = j.address_id CROSS JOIN span
   CROSS JOIN LATERAL (
     SELECT coalesce(json_agg(DISTINCT need.name) FILTER (WHERE need.kind = 'skill'), '[]'::json) AS skills,
            coalesce(json_agg(DISTINCT need.name) FILTER (WHERE need.kind = 'tool'), '[]'::json) AS equipment,
            coalesce(bool_or(s.needs_water), false) AS water, coalesce(bool_or(s.needs_power), false) AS power
       FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN services s ON s.id = l.service_id
       LEFT JOIN LATERAL (SELECT 'skill' AS kind, unnest(s.skills) AS name UNION ALL SELECT 'tool', unnest(s.equipment)) need ON true
      WHERE vl.visit_id = v.id AND l.finished_at IS NULL) needs
   WHERE v.progress = 'unplaced' AND j.window_from <@ span.whole AND v.job_id IS DISTINCT FROM :ownJob::uuid), '[]'::json) AS promises`;

export interface VanDays {
  vans: FreeVan[];
  promises: OpenPromise[];
}

export interface VanDaysAsk {
  from: string;
  to: string;
  now: string;
  /** What is being booked, or moved. */
  ownHold: string | null;
  ownJob: string | null;
}

export async function readVanDays(ask: VanDaysAsk, tx?: Transaction): Promise<VanDays> {
  const [row] = await select<VanDays>(vanDaysSql, { ...ask }, tx);
  return row ?? { vans: [], promises: [] };
}
