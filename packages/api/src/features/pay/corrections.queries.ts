import type { Transaction } from 'sequelize';
import type { CorrectedLine, PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { select } from '../../db/sequelize.ts';

/** The locked lines that people's corrections name. */
export async function correctedLinesOf(
  people: readonly PersonWeek[],
  tx?: Transaction,
): Promise<Record<string, CorrectedLine>> {
  const ids = people.flatMap((person) => person.lines.flatMap((line) => line.correctsLineId ?? []));
  if (ids.length === 0) return {};
  const rows = await select<Omit<CorrectedLine, 'number'> & { id: string }>(
    `SELECT l.id, w.starts_on AS "startsOn", l.key, l.line->>'label' AS label, l.position
       FROM pay_lines l JOIN pay_weeks w ON w.id = l.pay_week_id WHERE l.id IN (:ids)`,
    { ids },
    tx,
  );
  return Object.fromEntries(rows.map(({ id, ...row }) => [id, { ...row, number: weekNumberOf(row.startsOn) }]));
}

/** What corrections in other weeks pay for a locked week's lines, cents by person. */
export async function correctionsOfWeek(weekId: string, tx?: Transaction): Promise<Record<string, number>> {
  const rows = await select<{ personId: string; cents: number }>(
    `SELECT x.person_id AS "personId", sum(x.amount_cents)::bigint AS cents
       FROM pay_adjustments x JOIN pay_lines l ON l.id = x.corrects_line_id
      WHERE l.pay_week_id = :weekId AND x.kind = 'correction' GROUP BY x.person_id`,
    { weekId },
    tx,
  );
  return Object.fromEntries(rows.map((row) => [row.personId, row.cents]));
}

/** What arrived after the lock shows as the difference that today's records would make, less what was corrected. */
export function differences(
  locked: readonly PersonWeek[],
  now: readonly PersonWeek[],
  corrected: Record<string, number>,
): PayWeekDto['lateDifferences'] {
  const everyone = new Map([...locked, ...now].map((person) => [person.personId, person.name]));
  return [...everyone].flatMap(([personId, name]) => {
    const lockedCents = locked.find((p) => p.personId === personId)?.totals.gross ?? 0;
    const nowCents = now.find((p) => p.personId === personId)?.totals.gross ?? 0;
    const correctedCents = corrected[personId] ?? 0;
    return lockedCents + correctedCents === nowCents ? [] : [{ personId, name, lockedCents, nowCents, correctedCents }];
  });
}
