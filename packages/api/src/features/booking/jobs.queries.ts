import type { Transaction } from 'sequelize';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import { actionNames } from '@driprail/shared/domain/board/progress';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { select } from '../../db/sequelize.ts';
import { readVisits } from '../board/index.ts';

type JobRow = Omit<JobDto, 'visits' | 'history'> & {
  history: { at: string; by: string; kind: string; reason: string; isUndone: boolean }[];
};

const dollars = (lines: string) =>
  `(SELECT to_char(coalesce(sum((x ->> 'priceCents')::numeric), 0) / 100, 'FM999,999,990.00') FROM jsonb_array_elements(${lines}) x)`;

/** Changes at the car with the price before and after, and how the board answered. */
const changeHistory = `
  SELECT h.occurred_at, coalesce(p.name, u.name), 'plan',
         concat_ws(', ', h.words, 'visit ' || ${dollars('h.before')} || ' to ' || ${dollars('h.after')}, h.reason,
           CASE WHEN h.state = 'done' THEN NULL WHEN h.state = 'quote' THEN 'kept as a quote'
                WHEN h.is_board_not_asked THEN 'board not asked' ELSE 'asked of the board' END), false
    FROM job_changes h JOIN users u ON u.id = h.user_id LEFT JOIN people p ON p.id = h.person_id WHERE h.job_id = j.id
  UNION ALL
  SELECT h.answered_at, u.name, 'plan',
         concat_ws(', ', h.words, CASE h.state WHEN 'accepted' THEN 'accepted' ELSE 'declined, kept as a quote' END, nullif(h.answer, '')), false
    FROM job_changes h JOIN users u ON u.id = h.answered_by WHERE h.job_id = j.id`;

/** One job with its visits and what happened so far, newest first. */
export async function readJob(id: string, tx?: Transaction): Promise<JobDto | null> {
  const [row] = await select<JobRow>(
    `SELECT j.id, j.number, j.customer_id AS "customerId", c.name AS "customerName", j.address_id AS "addressId",
            to_json(j.window_from) #>> '{}' AS "windowFrom", to_json(j.window_to) #>> '{}' AS "windowTo", j.notes,
            j.discount_cents AS "discountCents", j.discount_reason AS "discountReason", j.version,
            (coalesce((SELECT sum(price_cents) FROM job_lines l WHERE l.job_id = j.id), 0) - j.discount_cents)::bigint AS "totalCents",
            coalesce((SELECT json_agg(json_build_object('id', l.id, 'serviceId', s.id, 'serviceName', s.name, 'vehicleId', l.vehicle_id,
                'vehicle', concat_ws(' ', nullif(w.color, ''), w.label), 'sizeClass', l.size_class, 'priceCents', l.price_cents,
                'minutes', l.minutes, 'isFinished', l.finished_at IS NOT NULL) ORDER BY l.position)
              FROM job_lines l JOIN services s ON s.id = l.service_id LEFT JOIN vehicles w ON w.id = l.vehicle_id WHERE l.job_id = j.id), '[]') AS lines,
            (SELECT json_build_object('id', o.id, 'number', o.number) FROM jobs o WHERE o.id = j.call_back_of) AS "callBackOf",
            j.call_back_cause AS "callBackCause",
            coalesce((SELECT json_agg(json_build_object('id', b.id, 'number', b.number, 'cause', b.call_back_cause) ORDER BY b.number)
              FROM jobs b WHERE b.call_back_of = j.id), '[]') AS "callBacks",
            coalesce((SELECT json_agg(json_build_object('id', t.id, 'amountCents', t.amount_cents, 'method', t.method,
                'at', to_json(t.received_at) #>> '{}') ORDER BY t.received_at) FROM tips t WHERE t.job_id = j.id), '[]') AS tips,
            (SELECT json_agg(h ORDER BY h.at DESC) FROM (
               SELECT j.created_at AS at, coalesce((SELECT name FROM users WHERE id = j.created_by), 'Import') AS by, 'booked' AS kind, '' AS reason, false AS "isUndone"
               UNION ALL
               SELECT e.occurred_at, coalesce(p.name, u.name, ''), CASE WHEN e.kind = 'trouble' THEN 'trouble' ELSE e.kind END, e.reason, e.is_undone
                 FROM visit_events e JOIN visits v ON v.id = e.visit_id LEFT JOIN people p ON p.id = e.person_id LEFT JOIN users u ON u.id = e.user_id
                WHERE v.job_id = j.id
               UNION ALL ${changeHistory}) h) AS history
       FROM jobs j JOIN customers c ON c.id = j.customer_id WHERE j.id = :id`,
    { id },
    tx,
  );
  if (!row) return null;
  const history = row.history.map(({ at, by, kind, reason, isUndone }) => ({
    at,
    by,
    text: wordsOf(kind, reason, isUndone),
  }));
  return { ...row, visits: await readVisits({ jobId: id }, tx), history };
}

function wordsOf(kind: string, reason: string, isUndone: boolean): string {
  const what =
    kind === 'plan'
      ? reason
      : kind === 'booked'
        ? 'Booked'
        : kind === 'undo'
          ? 'Taken back'
          : [kind === 'trouble' ? 'Trouble reported' : actionNames[kind as ProgressAction], reason]
              .filter(Boolean)
              .join(': ');
  return isUndone ? `${what} (taken back)` : what;
}

export interface FoundJob {
  id: string;
  number: number;
  customerName: string;
  address: string;
  services: string;
  progress: string;
  from: string | null;
}

export function findJobs(find: string): Promise<FoundJob[]> {
  const like = `%${find.replace(/[\\%_]/g, '\\$&')}%`;
  return select<FoundJob>(
    `SELECT j.id, j.number, c.name AS "customerName", a.line AS address,
            coalesce((SELECT string_agg(DISTINCT s.name, ', ') FROM job_lines l JOIN services s ON s.id = l.service_id WHERE l.job_id = j.id), '') AS services,
            coalesce(v.progress, 'unplaced') AS progress, to_json(lower(v.planned)) #>> '{}' AS "from"
       FROM jobs j JOIN customers c ON c.id = j.customer_id JOIN addresses a ON a.id = j.address_id
       LEFT JOIN LATERAL (SELECT progress, planned FROM visits WHERE job_id = j.id ORDER BY part DESC LIMIT 1) v ON true
      WHERE j.number::text LIKE :prefix OR c.name ILIKE :like OR a.line ILIKE :like
         OR EXISTS (SELECT 1 FROM job_lines l JOIN vehicles w ON w.id = l.vehicle_id WHERE l.job_id = j.id AND replace(w.plate, ' ', '') ILIKE :tight)
      ORDER BY j.number DESC LIMIT 20`,
    { like, prefix: `${like.slice(1)}`, tight: like.replace(/ /g, '') },
  );
}
