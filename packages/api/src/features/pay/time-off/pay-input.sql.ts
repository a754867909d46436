/** What an adjustment `x` that pays hours off adds to the engine's input; null for every other. */
export const timeOffTakenJson = `CASE WHEN x.time_off_kind IS NULL THEN NULL ELSE json_build_object('kind', x.time_off_kind,
  'hours', x.time_off_hours, 'on', x.time_off_on, 'rate', x.time_off_rate, 'ruleId', x.time_off_basis->>'ruleId',
  'ruleWords', x.time_off_basis->>'ruleWords', 'rateWords', x.time_off_basis->>'rateWords') END`;

/**
 * Visits of the week that were called off, by the crew or by the desk, after the crew had arrived and somebody had
 * reported nobody home. A mark that was taken back does not count.
 */
export const noShowTripSql = `SELECT v.* FROM visits v WHERE v.progress = 'called_off'
  AND v.progress_since >= :startsAt AND v.progress_since < :endsAt
  AND EXISTS (SELECT 1 FROM visit_events e WHERE e.visit_id = v.id AND e.kind = 'arrive' AND NOT e.is_undone)
  AND EXISTS (SELECT 1 FROM visit_events e WHERE e.visit_id = v.id AND e.trouble = 'nobody_home' AND NOT e.is_undone)`;

/** The engine's list of trips, from rows `trip` of the statement above. */
export const noShowTripsJson = (crewJson: string): string => `coalesce((SELECT json_agg(json_build_object(
    'visitId', t.id, 'jobId', j.id, 'jobNumber', j.number, 'calledOffAt', to_json(t.progress_since) #>> '{}',
    'crew', coalesce((SELECT json_agg(${crewJson} ORDER BY vc.position) FROM visit_crew vc WHERE vc.visit_id = t.id), '[]'::json))
    ORDER BY t.progress_since, t.id) FROM trip t JOIN jobs j ON j.id = t.job_id), '[]'::json)`;

/** Days away that touch the week; they matter to show-up pay alone. */
export const daysAwayJson = `coalesce((SELECT json_agg(json_build_object('personId', a.person_id, 'startsOn', a.starts_on,
    'endsOn', a.ends_on) ORDER BY a.person_id, a.starts_on) FROM time_off a
    WHERE a.ends_on >= :startsOn AND a.starts_on < :startsOn::date + 8 AND EXISTS (SELECT 1 FROM show_up_rules)), '[]'::json)`;

export const showUpRulesJson = `coalesce((SELECT json_agg(json_build_object('id', r.id, 'placeId', r.place_id,
    'startsOn', r.starts_on, 'rule', r.rule) ORDER BY r.starts_on, r.id) FROM show_up_rules r), '[]'::json)`;
