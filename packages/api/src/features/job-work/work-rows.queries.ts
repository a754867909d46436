import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { JobChangeDto } from '@driprail/shared/contracts/job-work.contract';
import { visitDto } from '@driprail/shared/contracts/visit.dto';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { WorkEvent } from '@driprail/shared/domain/job-work/fold-work';
import type { MustKnowFacts } from '@driprail/shared/domain/job-work/must-knows';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import { select } from '../../db/sequelize.ts';
import { ownDay, visitFrom, visitJson } from '../board/index.ts';
import { changeJson } from './change.sql.ts';

export interface WorkExtras {
  mustKnow: MustKnowFacts & { keyGoesBack: string };
  checklists: { lineId: string; asksNote: boolean; steps: CheckStep[] }[];
  events: WorkEvent[];
  changes: JobChangeDto[];
  crew: { personId: string; skills: string[]; isTrainee: boolean }[];
  arrivedAt: string | null;
  startedAt: string | null;
  next: {
    customerName: string;
    windowTo: string | null;
    stopId: string;
    lat: number | null;
    lng: number | null;
  } | null;
}
export interface WorkRow {
  visit: VisitDto;
  extras: WorkExtras;
}

const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;
const at = (kind: string) =>
  `(SELECT ${iso('max(e.occurred_at)')} FROM visit_events e WHERE e.visit_id = v.id AND NOT e.is_undone AND e.kind = '${kind}')`;
const own = 'visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id';

/** A dropped line is not on the visit any more; a line goes by the version fixed when work started, else by the newest. */
const checklists = `coalesce((SELECT json_agg(json_build_object('lineId', l.id, 'asksNote', k.asks_note, 'steps', k.steps))
  FROM ${own} LEFT JOIN visit_checklists p ON p.visit_id = v.id AND p.job_line_id = l.id AND p.service_id = l.service_id
  JOIN LATERAL (SELECT asks_note, steps FROM service_checklists
     WHERE service_id = l.service_id AND (p.version IS NULL OR version = p.version) ORDER BY version DESC LIMIT 1) k ON true
  WHERE vl.visit_id = v.id), '[]'::json)`;

const crew = `coalesce((SELECT json_agg(json_build_object('personId', p.id, 'skills', to_json(p.skills), 'isTrainee', p.is_trainee))
  FROM people p WHERE p.id IN (SELECT person_id FROM visit_crew WHERE visit_id = v.id)
    OR (NOT EXISTS (SELECT 1 FROM visit_crew WHERE visit_id = v.id)
      AND p.id IN (SELECT r.person_id FROM van_crew r WHERE r.van_id = v.van_id AND r.span && v.planned))), '[]'::json)`;

const next = `(SELECT json_build_object('customerName', c2.name, 'windowTo', ${iso('j2.window_to')}, 'stopId', v2.stop_id, 'lat', a2.lat, 'lng', a2.lng)
  FROM visits v2 JOIN jobs j2 ON j2.id = v2.job_id JOIN customers c2 ON c2.id = j2.customer_id JOIN addresses a2 ON a2.id = j2.address_id
 WHERE v2.van_id = v.van_id AND v2.id <> v.id AND v2.progress IN ('placed', 'on_the_way') AND lower(v2.planned) >= lower(v.planned)
   AND (lower(v2.planned) AT TIME ZONE s.zone)::date = (lower(v.planned) AT TIME ZONE s.zone)::date
 ORDER BY lower(v2.planned), v2.id LIMIT 1)`;

const workJson = `json_build_object(
  'mustKnow', json_build_object('isScentFree', c.is_scent_free, 'ringsFirst', c.rings_first, 'customerNote', c.must_know,
     'hasDog', a.has_dog, 'shutsGate', a.shuts_gate, 'drainsToCreek', a.drains_to_creek, 'takesKey', a.takes_key,
     'keyGoesBack', a.key_goes_back, 'addressNote', a.must_know,
     'vehicles', coalesce((SELECT json_agg(json_build_object('id', w.id, 'name', w.label, 'isCoated', w.is_coated, 'note', w.must_know) ORDER BY w.position, w.id)
        FROM vehicles w WHERE w.id IN (SELECT l.vehicle_id FROM ${own} WHERE vl.visit_id = v.id)), '[]'::json)),
  'checklists', ${checklists},
  'events', coalesce((SELECT json_agg(json_build_object('id', e.id, 'kind', e.kind, 'at', ${iso('e.occurred_at')}, 'by', coalesce(p.name, u.name),
       'steps', e.steps, 'lineId', e.line_id, 'keys', to_json(e.keys), 'words', e.words) ORDER BY e.occurred_at, e.received_at, e.id)
     FROM work_events e JOIN users u ON u.id = e.user_id LEFT JOIN people p ON p.id = e.person_id WHERE e.visit_id = v.id), '[]'::json),
  'changes', coalesce((SELECT json_agg(${changeJson} ORDER BY h.occurred_at DESC, h.id DESC)
     FROM job_changes h JOIN users u ON u.id = h.user_id LEFT JOIN people p ON p.id = h.person_id LEFT JOIN users w ON w.id = h.answered_by
    WHERE h.visit_id = v.id), '[]'::json),
  'crew', ${crew}, 'arrivedAt', ${at('arrive')}, 'startedAt', ${at('start_work')}, 'next', ${next})`;

/** One visit, or a person's own of a day, with everything that its work needs. */
export async function readWorkRows(
  where: { visitId: string } | { personId: string; day: string },
  tx?: Transaction,
): Promise<WorkRow[]> {
  const condition = 'visitId' in where ? 'v.id = :visitId' : ownDay;
  const rows = await select<{ visit: z.input<typeof visitDto>; extras: WorkExtras }>(
    `SELECT ${visitJson} AS visit, ${workJson} AS extras FROM ${visitFrom} CROSS JOIN company_settings s
      WHERE ${condition} ORDER BY lower(v.planned), v.id`,
    where,
    tx,
  );
  return rows.map(({ visit, extras }) => ({ visit: visitDto.parse(visit), extras }));
}
