import { v7 as uuid } from 'uuid';
import { workweekOf } from '@driprail/shared/domain/time/workweek';
import { audit } from '../../db/audit.ts';
import { HoursWord, Person } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { workweekRuleOn } from '../pay/index.ts';

interface HoursWordRow {
  personId: string;
  personName: string;
  isRight: boolean | null;
  note: string;
  by: string | null;
  at: string | null;
}

/** What people with time in a workweek say of it; a technician gets the own word only. */
export async function readHoursWords({ actor, ability }: Ctx, day: string) {
  const { startsOn, endsOn, startsAt, endsAt } = workweekOf(day, await workweekRuleOn(day));
  const isDesk = ability.can('update', 'ClockEntry');
  const words = await select<HoursWordRow>(
    `SELECT p.id AS "personId", p.name AS "personName", w.is_right AS "isRight", coalesce(w.note, '') AS note, u.name AS by,
            to_json(w.at) #>> '{}' AS at
       FROM people p LEFT JOIN LATERAL (SELECT * FROM hours_words h WHERE h.person_id = p.id AND h.week_starts_on = :startsOn
              ORDER BY h.at DESC, h.id DESC LIMIT 1) w ON true LEFT JOIN users u ON u.id = w.user_id
      WHERE (:personId::uuid IS NULL OR p.id = :personId::uuid)
        AND EXISTS (SELECT 1 FROM clock_entries e WHERE e.person_id = p.id AND e.started_at < :endsAt AND coalesce(e.ended_at, now()) > :startsAt)
      ORDER BY p.name`,
    { startsOn, startsAt, endsAt, personId: isDesk ? null : (actor.personId ?? uuid()) },
  );
  return { startsOn, endsOn, words };
}

/** A person's own word; or the desk's for somebody, marked as such. The newest counts, all stay. */
export function sayHours(
  { actor, now }: Ctx,
  day: string,
  personId: string | null,
  said: { isRight: boolean; note: string },
): Promise<void> {
  return inTransaction(async (tx) => {
    if (!personId) throw unprocessable('no_person', 'This login belongs to nobody on the crew, so it has no hours.');
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    const { startsOn } = workweekOf(day, await workweekRuleOn(day, tx));
    const row = await HoursWord.create(
      { id: uuid(), personId, weekStartsOn: startsOn, ...said, userId: actor.userId, at: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'hours', row.id, said.isRight ? 'right' : 'not right', {
      personId,
      startsOn,
      note: said.note,
    });
    hintAfterCommit(tx, ['desk', { personIds: [personId] }], 'clock', personId);
  });
}
