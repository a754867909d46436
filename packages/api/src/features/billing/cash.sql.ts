/** A cash payment that really was: what was recorded by mistake never came in hand. */
export const isCash = `p.method = 'cash' AND NOT EXISTS (
  SELECT 1 FROM refunds m WHERE m.payment_id = p.id AND m.kind = 'mistake' AND m.state <> 'failed')`;

/** Cash payments `p` with `tip.cents`, the tip handed over with each; one kept on the spot is the crew's already. */
export const cashTaken = `payments p
  CROSS JOIN LATERAL (SELECT coalesce(sum(t.amount_cents), 0)::bigint AS cents FROM tips t
    WHERE t.payment_id = p.id AND t.method = 'cash' AND NOT t.already_received) tip
  LEFT JOIN people n ON n.id = p.person_id LEFT JOIN users u ON u.id = p.recorded_by`;
export const isUncounted = `NOT EXISTS (SELECT 1 FROM cash_count_payments k WHERE k.payment_id = p.id)`;

/** Who holds it. */
export const holderName = `coalesce(n.name, u.name || ', at the desk', 'At the desk')`;

/** A count as JSON, from `cash_counts c`, `people n` and `users u`. */
export const countJson = `json_build_object('id', c.id, 'personId', c.person_id, 'personName', n.name,
  'expectedCents', c.expected_cents, 'countedCents', c.counted_cents, 'note', c.note,
  'countedAt', to_json(c.counted_at) #>> '{}', 'countedBy', u.name)`;
export const countFrom = `cash_counts c JOIN people n ON n.id = c.person_id JOIN users u ON u.id = c.counted_by`;
