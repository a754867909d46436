/** The columns of a visit as the board shows it, from `visits v`; built in the database, checked by the contract. */
const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;

export const visitJson = `json_build_object(
  'id', v.id, 'jobId', v.job_id, 'jobNumber', j.number, 'part', v.part,
  'parts', (SELECT count(*) FROM visits other WHERE other.job_id = v.job_id),
  'stopId', v.stop_id, 'vanId', v.van_id, 'from', ${iso('lower(v.planned)')}, 'to', ${iso('upper(v.planned)')},
  'minutes', v.minutes, 'progress', v.progress, 'since', ${iso('v.progress_since')}, 'reason', v.reason,
  'planVersion', v.plan_version, 'version', v.version,
  'customerId', c.id, 'customerName', c.name, 'phone', c.phone,
  'addressId', a.id, 'address', concat_ws(', ', a.line, nullif(a.city, '')), 'area', a.area, 'lat', a.lat, 'lng', a.lng,
  'hasGateCode', a.gate_code <> '', 'hasWater', a.has_water, 'hasPower', a.has_power,
  'windowFrom', ${iso('j.window_from')}, 'windowTo', ${iso('j.window_to')}, 'notes', j.notes, 'isCallBack', j.call_back_of IS NOT NULL,
  'lines', lines.list, 'skills', needs.skills, 'equipment', needs.equipment,
  'needsWater', needs.water, 'needsPower', needs.power,
  'crew', coalesce(worked.list, riding.list, '[]'::json), 'accepted', v.accepted,
  'walkRound', json_build_object('photoSet', (ARRAY['none', 'quick', 'full'])[walk.rank], 'cars', walk.cars, 'made', walk.made, 'due', walk.due,
    'isSecondLookDue', walk.is_second_look_due, 'startReason', walk.start_reason)
)`;

export const visitFrom = `visits v
  JOIN jobs j ON j.id = v.job_id JOIN customers c ON c.id = j.customer_id JOIN addresses a ON a.id = j.address_id
  CROSS JOIN LATERAL (
    SELECT coalesce(json_agg(json_build_object('id', l.id, 'serviceId', s.id, 'serviceName', s.name, 'vehicleId', l.vehicle_id,
             'vehicle', concat_ws(' ', nullif(w.color, ''), w.label), 'sizeClass', l.size_class, 'minutes', l.minutes,
             'priceCents', l.price_cents, 'isFinished', l.finished_at IS NOT NULL) ORDER BY l.position), '[]'::json) AS list
      FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN services s ON s.id = l.service_id
      LEFT JOIN vehicles w ON w.id = l.vehicle_id
     WHERE vl.visit_id = v.id) lines
  CROSS JOIN LATERAL (
    SELECT coalesce(json_agg(DISTINCT need.name) FILTER (WHERE need.kind = 'skill'), '[]'::json) AS skills,
           coalesce(json_agg(DISTINCT need.name) FILTER (WHERE need.kind = 'tool'), '[]'::json) AS equipment,
           coalesce(bool_or(s.needs_water), false) AS water, coalesce(bool_or(s.needs_power), false) AS power
      FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN services s ON s.id = l.service_id
      LEFT JOIN LATERAL (SELECT 'skill' AS kind, unnest(s.skills) AS name UNION ALL SELECT 'tool', unnest(s.equipment)) need ON true
     WHERE vl.visit_id = v.id AND l.finished_at IS NULL) needs
  LEFT JOIN LATERAL (
    SELECT json_agg(json_build_object('personId', p.id, 'name', p.name) ORDER BY vc.position) AS list
      FROM visit_crew vc JOIN people p ON p.id = vc.person_id WHERE vc.visit_id = v.id) worked ON true
  LEFT JOIN LATERAL (
    SELECT json_agg(json_build_object('personId', p.id, 'name', p.name) ORDER BY r.position) AS list
      FROM van_crew r JOIN people p ON p.id = r.person_id WHERE r.van_id = v.van_id AND r.span && v.planned) riding ON true
  CROSS JOIN LATERAL (
    SELECT coalesce(max(car.rank), 1) AS rank, count(*) FILTER (WHERE car.rank > 1) AS cars,
           count(w.id) FILTER (WHERE car.rank > 1) AS made,
           coalesce(json_agg(car.vehicle_id) FILTER (WHERE car.rank > 1 AND w.id IS NULL), '[]'::json) AS due,
           coalesce(bool_or(w.is_too_dirty AND NOT EXISTS (SELECT 1 FROM walk_looks k
             WHERE k.visit_id = v.id AND k.vehicle_id IS NOT DISTINCT FROM w.vehicle_id)), false) AS is_second_look_due,
           coalesce((SELECT e.reason FROM visit_events e WHERE e.visit_id = v.id AND e.kind = 'start_work' AND NOT e.is_undone
             ORDER BY e.received_at DESC LIMIT 1), '') AS start_reason
      FROM (SELECT l.vehicle_id, max(array_position(ARRAY['none', 'quick', 'full'], s.photo_set)) AS rank
              FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN services s ON s.id = l.service_id
             WHERE vl.visit_id = v.id GROUP BY l.vehicle_id) car
      LEFT JOIN walk_rounds w ON w.visit_id = v.id AND w.vehicle_id IS NOT DISTINCT FROM car.vehicle_id) walk`;

/** One's own crew's visits of a day, `:personId` and `:day`, in the zone of `company_settings s`. */
export const ownDay = `v.planned && tstzrange(:day::timestamp AT TIME ZONE s.zone, (:day::date + 1)::timestamp AT TIME ZONE s.zone)
  AND (EXISTS (SELECT 1 FROM visit_crew vc WHERE vc.visit_id = v.id AND vc.person_id = :personId)
    OR (NOT EXISTS (SELECT 1 FROM visit_crew vc WHERE vc.visit_id = v.id)
      AND EXISTS (SELECT 1 FROM van_crew r WHERE r.van_id = v.van_id AND r.person_id = :personId AND r.span && v.planned)))`;
