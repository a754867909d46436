import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { walkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { marksToAsk } from '@driprail/shared/domain/walk-round/marks';
import { select } from '../../db/sequelize.ts';

const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;

const marks = (visitId: string, vehicleId: string) => `coalesce((SELECT json_agg(json_build_object(
    'id', m.id, 'x', m.x, 'y', m.y, 'place', m.place, 'kind', m.kind, 'size', m.size, 'note', m.note,
    'carriedFrom', m.carried_from, 'answer', m.answer, 'isAddition', m.is_addition, 'at', ${iso('m.occurred_at')}, 'by', u.name)
    ORDER BY m.is_addition, m.position, m.occurred_at)
  FROM walk_marks m JOIN users u ON u.id = m.user_id
 WHERE m.visit_id = ${visitId} AND m.vehicle_id IS NOT DISTINCT FROM ${vehicleId}), '[]'::json)`;

/** A photo as its screen shows it, from `photos p JOIN users u`. */
export const photoJson = `json_build_object('id', p.id, 'vehicleId', p.vehicle_id, 'view', p.view, 'moment', p.moment,
  'receivedBytes', p.received_bytes, 'bytes', p.bytes, 'isStored', p.stored_at IS NOT NULL, 'width', p.width, 'height', p.height,
  'isAddition', p.is_addition, 'at', ${iso('p.occurred_at')}, 'by', u.name)`;

const walkRound = `json_build_object('id', w.id, 'body', w.body, 'paint', w.paint, 'interior', w.interior, 'odometer', w.odometer,
  'hasItems', w.has_items, 'itemsNote', w.items_note, 'mayMove', w.may_move, 'isTooDirty', w.is_too_dirty,
  'missingReason', w.missing_reason, 'absentReason', w.absent_reason, 'initials', w.initials, 'photoViews', w.photo_views,
  'isLate', w.is_late, 'at', ${iso('w.occurred_at')}, 'by', (SELECT name FROM users WHERE id = w.user_id),
  'marks', ${marks('w.visit_id', 'w.vehicle_id')},
  'secondLook', (SELECT json_build_object('outcome', k.outcome, 'note', k.note, 'at', ${iso('k.occurred_at')}, 'by', u.name)
     FROM walk_looks k JOIN users u ON u.id = k.user_id
    WHERE k.visit_id = w.visit_id AND k.vehicle_id IS NOT DISTINCT FROM w.vehicle_id ORDER BY k.occurred_at DESC LIMIT 1))`;

/** The cars that a visit's lines, walk-rounds or photos name, each with all of its walk-round, in one statement. */
const sheetSql = `
SELECT json_build_object('visitId', v.id, 'jobNumber', j.number, 'customerName', c.name, 'progress', v.progress,
  'startedAt', ${iso('begun.at')}, 'startReason', coalesce(begun.reason, ''),
  'cars', coalesce((SELECT json_agg(json_build_object('vehicleId', car.vehicle_id,
      'vehicle', concat_ws(' ', nullif(a.color, ''), a.label), 'sizeClass', coalesce(car.size_class, a.size_class, 'sedan'),
      'photoSet', (ARRAY['none', 'quick', 'full'])[coalesce(car.rank, 1)],
      'walkRound', (SELECT ${walkRound} FROM walk_rounds w WHERE w.visit_id = v.id AND w.vehicle_id IS NOT DISTINCT FROM car.vehicle_id),
      'lastMarks', CASE WHEN last.visit_id IS NULL THEN '[]'::json ELSE ${marks('last.visit_id', 'car.vehicle_id')} END,
      'lastAt', ${iso('last.occurred_at')},
      'photos', coalesce((SELECT json_agg(${photoJson} ORDER BY p.occurred_at, p.id) FROM photos p JOIN users u ON u.id = p.user_id
        WHERE p.visit_id = v.id AND p.vehicle_id IS NOT DISTINCT FROM car.vehicle_id AND p.refused IS NULL), '[]'::json)
    ) ORDER BY car.position NULLS LAST)
    FROM (
      SELECT vehicle_id, min(position) AS position, max(rank) AS rank, min(size_class) AS size_class FROM (
        SELECT l.vehicle_id, l.position, array_position(ARRAY['none', 'quick', 'full'], s.photo_set) AS rank, l.size_class
          FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN services s ON s.id = l.service_id WHERE vl.visit_id = v.id
        UNION ALL SELECT vehicle_id, NULL, NULL, NULL FROM walk_rounds WHERE visit_id = v.id
        UNION ALL SELECT vehicle_id, NULL, NULL, NULL FROM photos WHERE visit_id = v.id) named
      GROUP BY vehicle_id) car
    LEFT JOIN vehicles a ON a.id = car.vehicle_id
    LEFT JOIN LATERAL (
      SELECT w.visit_id, w.occurred_at FROM walk_rounds w
       WHERE w.vehicle_id = car.vehicle_id AND w.visit_id <> v.id
         AND w.occurred_at < coalesce((SELECT own.occurred_at FROM walk_rounds own WHERE own.visit_id = v.id AND own.vehicle_id = car.vehicle_id), 'infinity')
       ORDER BY w.occurred_at DESC LIMIT 1) last ON true), '[]'::json)) AS sheet
  FROM visits v JOIN jobs j ON j.id = v.job_id JOIN customers c ON c.id = j.customer_id
  LEFT JOIN LATERAL (SELECT e.occurred_at AS at, e.reason FROM visit_events e
    WHERE e.visit_id = v.id AND e.kind = 'start_work' AND NOT e.is_undone ORDER BY e.received_at DESC LIMIT 1) begun ON true
 WHERE v.id = :visitId`;

/** A visit's walk-round sheet; null when there is no such visit. The marks of last time are those that were not gone then. */
export async function readWalkSheet(visitId: string, tx?: Transaction): Promise<WalkSheetDto | null> {
  const [row] = await select<{ sheet: z.input<typeof walkSheetDto> }>(sheetSql, { visitId }, tx);
  if (!row) return null;
  const sheet = walkSheetDto.parse(row.sheet);
  return { ...sheet, cars: sheet.cars.map((car) => ({ ...car, lastMarks: marksToAsk(car.lastMarks) })) };
}
