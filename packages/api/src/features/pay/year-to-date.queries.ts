import type { Transaction } from 'sequelize';
import type { YearToDate } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

interface Earlier {
  personId: string;
  weeks: number;
  /** Clock time is whole seconds, so a year of it is too. */
  seconds: number;
  grossCents: number;
  tipCents: number;
  overtimePremiumCents: number;
}

const NOTHING: Omit<Earlier, 'personId'> = {
  weeks: 0,
  seconds: 0,
  grossCents: 0,
  tipCents: 0,
  overtimePremiumCents: 0,
};

/**
 * What people's locked weeks of the year came to, up to and with this one; a week belongs to the year in which it
 * ends. While this week is open its figures as they stand are added.
 * @returns by person
 */
export async function yearsToDate(
  week: PayWeek,
  people: readonly PersonWeek[],
  tx?: Transaction,
): Promise<Record<string, YearToDate>> {
  if (people.length === 0) return {};
  const year = Number(week.endsOn.slice(0, 4));
  const cents = (part: string) => `sum((s.summary->'totals'->>'${part}')::bigint)::bigint`;
  const rows = await select<Earlier>(
    `SELECT s.person_id AS "personId", count(*)::int AS weeks,
            round(sum(split_part(s.summary->>'hoursWorked', '/', 1)::numeric * 3600
              / coalesce(nullif(split_part(s.summary->>'hoursWorked', '/', 2), ''), '1')::numeric))::bigint AS seconds,
            ${cents('gross')} AS "grossCents", ${cents('tips')} AS "tipCents", ${cents('overtimePremium')} AS "overtimePremiumCents"
       FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
      WHERE s.person_id IN (:ids) AND w.state = 'locked' AND w.ends_on >= :from AND w.starts_on < :startsOn
      GROUP BY s.person_id`,
    { ids: people.map((person) => person.personId), from: `${year}-01-01`, startsOn: week.startsOn },
    tx,
  );
  const earlier = new Map(rows.map((row) => [row.personId, row]));
  return Object.fromEntries(
    people.map(({ personId, hoursWorked, totals }) => {
      const before = earlier.get(personId) ?? NOTHING;
      const own: YearToDate = {
        year,
        weeks: before.weeks + 1,
        hours: exact(before.seconds).div(3600).add(exact(hoursWorked)).toFraction(),
        grossCents: before.grossCents + totals.gross,
        tipCents: before.tipCents + totals.tips,
        overtimePremiumCents: before.overtimePremiumCents + totals.overtimePremium,
      };
      return [personId, own];
    }),
  );
}
