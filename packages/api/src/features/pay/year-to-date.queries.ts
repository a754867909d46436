import type { Transaction } from 'sequelize';
import type { YearToDate } from '@driprail/shared/contracts/pay.contract';
import { exact, sum } from '@driprail/shared/domain/money/exact';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import type { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

type Week = Pick<PersonWeek, 'personId' | 'hoursWorked' | 'totals'>;

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
  const rows = await select<{ summary: Week }>(
    `SELECT s.summary FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
      WHERE s.person_id IN (:ids) AND w.state = 'locked' AND w.ends_on >= :from AND w.starts_on < :startsOn`,
    { ids: people.map((person) => person.personId), from: `${year}-01-01`, startsOn: week.startsOn },
    tx,
  );
  const earlier = rows.map((row) => row.summary);
  return Object.fromEntries(
    people.map((person) => {
      const weeks: Week[] = [...earlier.filter((one) => one.personId === person.personId), person];
      return [person.personId, addedUp(year, weeks)];
    }),
  );
}

function addedUp(year: number, weeks: readonly Week[]): YearToDate {
  const total = (of: (totals: Week['totals']) => number): number => weeks.reduce((all, one) => all + of(one.totals), 0);
  return {
    year,
    weeks: weeks.length,
    hours: sum(weeks.map((one) => exact(one.hoursWorked))).toFraction(),
    grossCents: total((totals) => totals.gross),
    tipCents: total((totals) => totals.tips),
    overtimePremiumCents: total((totals) => totals.overtimePremium),
  };
}
