import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { tag } from '@driprail/shared/authz/ability';
import type { PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../../authz/authorize.ts';
import { PayWeek } from '../../../db/models/index.ts';
import { select } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { unprocessable } from '../../../http/errors.ts';
import { frozenInput, readFrozen } from '../frozen.queries.ts';
import { headOf, weekAt } from '../weeks.service.ts';
import { onePayday } from './paydays.queries.ts';

/** A locked week as it was paid: its lines and the records they came from. */
export interface LockedWeek {
  week: PayWeekHead;
  people: PersonWeek[];
  input: PayWeekInput;
}

/** @throws 404 without such a payday, 403 to whom paydays are closed */
export async function weeksOfPayday({ ability }: Ctx, id: string): Promise<LockedWeek[]> {
  authorize(ability, 'read', tag('Payday', { id }));
  const { weeks } = await onePayday(id);
  const rows = await PayWeek.findAll({
    where: { startsOn: weeks.map((week) => week.startsOn) },
    order: [['startsOn', 'ASC']],
  });
  return Promise.all(rows.map((row) => lockedWeek(row, null)));
}

/** The locked week that holds a day. @throws 422 while it is open */
export async function weekToHandOver({ ability }: Ctx, day: string): Promise<LockedWeek> {
  const week = await weekAt(day);
  authorize(ability, 'read', tag('PayWeek', { id: week.id }));
  if (week.state !== 'locked') {
    const number = weekNumberOf(week.startsOn);
    throw unprocessable('open_week', `Week ${number} is not locked. Lock it first, then hand it over.`);
  }
  return lockedWeek(week, null);
}

/** Every locked week in which a person was paid, oldest first, with that person’s lines alone. */
export async function weeksOfPerson(personId: string): Promise<LockedWeek[]> {
  const known = await select<{ id: string }>(
    `SELECT w.id FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
      WHERE s.person_id = :personId AND w.state = 'locked' ORDER BY w.starts_on`,
    { personId },
  );
  const rows = await PayWeek.findAll({ where: { id: known.map((one) => one.id) }, order: [['startsOn', 'ASC']] });
  return Promise.all(rows.map((row) => lockedWeek(row, personId)));
}

async function lockedWeek(row: PayWeek, personId: string | null): Promise<LockedWeek> {
  const week = await headOf(row);
  const input = frozenInput(row);
  if (!input)
    throw unprocessable(
      'unknown_engine',
      `Week ${week.number} was locked by a draft of this program whose records are not kept. Its statements and lines can still be printed.`,
    );
  const { people } = await readFrozen(row.id, personId);
  return { week, people, input };
}

/** Job numbers of visits, for clock entries; they never change. */
export async function jobNumbersOf(weeks: readonly LockedWeek[]): Promise<Map<string, number>> {
  const ids = new Set(weeks.flatMap(({ input }) => input.entries.flatMap((entry) => entry.visitId ?? [])));
  if (ids.size === 0) return new Map();
  const rows = await select<{ id: string; number: number }>(
    'SELECT v.id, j.number FROM visits v JOIN jobs j ON j.id = v.job_id WHERE v.id IN (:ids)',
    { ids: [...ids] },
  );
  return new Map(rows.map(({ id, number }) => [id, number]));
}

/** Exact hours worked by a person in the workweek that starts on a day; for settled commission. */
export type HoursBefore = (personId: string, startsOn: string) => string | undefined;

/** Hours of locked weeks that late commission names. */
export async function hoursBefore(weeks: readonly LockedWeek[]): Promise<HoursBefore> {
  const personIds = [...new Set(weeks.flatMap(({ people }) => people.map((person) => person.personId)))];
  if (personIds.length === 0) return () => undefined;
  const rows = await select<{ key: string; hours: string }>(
    `SELECT s.person_id || ' ' || w.starts_on AS key, s.summary->>'hoursWorked' AS hours
       FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id WHERE s.person_id IN (:personIds) AND w.state = 'locked'`,
    { personIds },
  );
  const known = new Map(rows.map(({ key, hours }) => [key, hours]));
  return (personId, startsOn) => known.get(`${personId} ${startsOn}`);
}
