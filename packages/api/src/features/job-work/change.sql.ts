/** A change at the car from `job_changes h` with its presser `u`, `p`, who answered `w`, and visit tables `j`, `c`. */
const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;

export const changeJson = `json_build_object(
  'id', h.id, 'visitId', h.visit_id, 'jobNumber', j.number, 'customerName', c.name, 'kind', h.kind, 'state', h.state,
  'words', h.words, 'reason', h.reason, 'before', h.before, 'after', h.after,
  'priceDifferenceCents', h.price_difference_cents, 'minutesDifference', h.minutes_difference, 'finishAt', ${iso('h.finish_at')},
  'hindrances', h.hindrances, 'isBoardNotAsked', h.is_board_not_asked, 'saidYesBy', h.said_yes_by, 'saidYesAt', ${iso('h.said_yes_at')},
  'by', coalesce(p.name, u.name), 'at', ${iso('h.occurred_at')}, 'answeredBy', w.name, 'answeredAt', ${iso('h.answered_at')}, 'answer', h.answer)`;
