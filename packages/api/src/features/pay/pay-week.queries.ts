import type { Transaction } from 'sequelize';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { ENGINE_VERSION, computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { PayLine, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { PayWeek } from '../../db/models/index.ts';
import { PayLineRow, PayStatement } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { payInputOf } from './pay-input.queries.ts';
import { headOf } from './weeks.service.ts';

/** A week as the owner sees it: computed while open, as it was frozen once locked. */
export async function readPayWeek(week: PayWeek, now: Date, tx?: Transaction): Promise<PayWeekDto> {
  const computed = computePayWeek(await payInputOf(week, now, tx));
  const frozen = week.state === 'locked' ? await readFrozen(week.id, null, tx) : null;
  return {
    week: await headOf(week, tx),
    people: frozen?.people ?? computed.people,
    adjustments: await adjustmentsOf(week.id, tx),
    salesCents: await salesOf(week, tx),
    lineIds: frozen?.lineIds ?? {},
    engineVersion: week.engineVersion ?? ENGINE_VERSION,
    lateDifferences: frozen ? differences(frozen.people, computed.people) : [],
  };
}

/** What arrived after the lock shows as the difference that today's records would make. */
function differences(locked: PersonWeek[], now: PersonWeek[]): PayWeekDto['lateDifferences'] {
  const everyone = new Map([...locked, ...now].map((person) => [person.personId, person.name]));
  return [...everyone].flatMap(([personId, name]) => {
    const lockedCents = locked.find((p) => p.personId === personId)?.totals.gross ?? 0;
    const nowCents = now.find((p) => p.personId === personId)?.totals.gross ?? 0;
    return lockedCents === nowCents ? [] : [{ personId, name, lockedCents, nowCents }];
  });
}

/** The stored lines of a locked week, of everybody or of one person. */
export async function readFrozen(
  weekId: string,
  personId: string | null,
  tx?: Transaction,
): Promise<{ people: PersonWeek[]; lineIds: Record<string, string> }> {
  const where = { payWeekId: weekId, ...(personId && { personId }) };
  const options = { where, transaction: tx ?? null };
  const statements = await PayStatement.findAll(options);
  const rows = await PayLineRow.findAll({ ...options, order: [['position', 'ASC']] });
  const people = statements
    .map((statement) => ({
      ...(statement.summary as Omit<PersonWeek, 'lines'>),
      lines: rows.filter((row) => row.personId === statement.personId).map((row): PayLine => row.line),
    }))
    .sort((a, b) => a.name.localeCompare(b.name));
  return { people, lineIds: Object.fromEntries(rows.map((row) => [`${row.personId}:${row.key}`, row.id])) };
}

function adjustmentsOf(weekId: string, tx?: Transaction): Promise<PayWeekDto['adjustments']> {
  return select(
    `SELECT x.id, x.person_id AS "personId", x.kind, x.amount_cents AS "amountCents", x.reason, x.corrects_line_id AS "correctsLineId",
            u.name AS by FROM pay_adjustments x JOIN users u ON u.id = x.user_id WHERE x.pay_week_id = :weekId ORDER BY x.at, x.id`,
    { weekId },
    tx,
  );
}

/** What the finished work sold for, after discounts of jobs that are wholly finished in the week's lines. */
async function salesOf(week: PayWeek, tx?: Transaction): Promise<number> {
  const [row] = await select<{ cents: number }>(
    `SELECT coalesce(sum(l.price_cents - CASE WHEN j.discount_cents = 0 THEN 0 ELSE
              round(j.discount_cents * l.price_cents::numeric / greatest(1, (SELECT sum(price_cents) FROM job_lines o WHERE o.job_id = j.id))) END), 0)::bigint AS cents
       FROM job_lines l JOIN jobs j ON j.id = l.job_id WHERE l.finished_at >= :from AND l.finished_at < :to`,
    { from: week.startsAt, to: week.endsAt },
    tx,
  );
  return row?.cents ?? 0;
}

export interface WeekRow {
  id: string;
  grossCents: number | null;
  salesCents: number;
}

/** Gross of locked weeks and sales of all, newest first. */
export function listWeekFigures(): Promise<WeekRow[]> {
  return select<WeekRow>(
    `SELECT w.id, (SELECT sum(s.gross_cents)::bigint FROM pay_statements s WHERE s.pay_week_id = w.id) AS "grossCents",
            coalesce((SELECT sum(l.price_cents) FROM job_lines l WHERE l.finished_at >= w.starts_at AND l.finished_at < w.ends_at), 0)::bigint AS "salesCents"
       FROM pay_weeks w ORDER BY w.starts_on DESC LIMIT 60`,
  );
}
