import type { Transaction } from 'sequelize';
import type { HandoverWeek, PaydayDto, PaydayPerson } from '@driprail/shared/contracts/handover.contract';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { select } from '../../../db/sequelize.ts';
import { notFound } from '../../../http/errors.ts';

type Week = Omit<HandoverWeek, 'number'>;
type Row = Omit<PaydayDto, 'weeks'> & { weeks: Week[] };

/** What a list tells of a locked week `w`. */
const weekJson = `json_build_object('startsOn', w.starts_on, 'endsOn', w.ends_on,
  'people', (SELECT count(*) FROM pay_statements s WHERE s.pay_week_id = w.id),
  'grossCents', (SELECT coalesce(sum(s.gross_cents), 0)::bigint FROM pay_statements s WHERE s.pay_week_id = w.id))`;

/** Newest first; with an id, that one alone. */
export async function listPaydays(id: string | null = null, tx?: Transaction): Promise<PaydayDto[]> {
  const rows = await select<Row>(
    `SELECT p.id, p.pays_on AS "paysOn", p.note, maker.name AS "madeBy", to_json(p.handed_over_at) #>> '{}' AS "handedOverAt",
            giver.name AS "handedOverBy", p.version,
            coalesce((SELECT json_agg(${weekJson} ORDER BY w.starts_on) FROM payday_weeks pw JOIN pay_weeks w ON w.id = pw.pay_week_id
               WHERE pw.payday_id = p.id), '[]'::json) AS weeks
       FROM paydays p JOIN users maker ON maker.id = p.made_by LEFT JOIN users giver ON giver.id = p.handed_over_by
      WHERE :id::uuid IS NULL OR p.id = :id::uuid ORDER BY p.pays_on DESC, p.id DESC`,
    { id },
    tx,
  );
  return rows.map((row) => ({ ...row, weeks: row.weeks.map(numbered) }));
}

/** @throws 404 when there is none */
export async function onePayday(id: string, tx?: Transaction): Promise<PaydayDto> {
  const [payday] = await listPaydays(id, tx);
  if (!payday) throw notFound('That payday');
  return payday;
}

/** Locked weeks on no payday yet, oldest first. */
export async function listWaitingWeeks(): Promise<HandoverWeek[]> {
  const rows = await select<{ week: Week }>(
    `SELECT ${weekJson} AS week FROM pay_weeks w
      WHERE w.state = 'locked' AND NOT EXISTS (SELECT 1 FROM payday_weeks pw WHERE pw.pay_week_id = w.id) ORDER BY w.starts_on`,
  );
  return rows.map(({ week }) => numbered(week));
}

/** Everybody's weeks on a payday, by name; sums are those of the locked statements. */
export function listPaydayPeople(id: string): Promise<PaydayPerson[]> {
  return select<PaydayPerson>(
    `SELECT s.person_id AS "personId", max(s.summary->>'name') AS name,
            json_agg(json_build_object('startsOn', w.starts_on, 'grossCents', s.gross_cents,
              'tipCents', (s.summary->'totals'->>'tips')::bigint,
              'reimbursementCents', (SELECT coalesce(sum(l.amount_cents), 0)::bigint FROM pay_lines l
                 WHERE l.pay_week_id = s.pay_week_id AND l.person_id = s.person_id AND l.line->>'kind' = 'reimbursement'))
              ORDER BY w.starts_on) AS weeks
       FROM payday_weeks pw JOIN pay_weeks w ON w.id = pw.pay_week_id JOIN pay_statements s ON s.pay_week_id = w.id
      WHERE pw.payday_id = :id GROUP BY s.person_id ORDER BY name, s.person_id`,
    { id },
  );
}

function numbered(week: Week): HandoverWeek {
  return { ...week, number: weekNumberOf(week.startsOn) };
}
