import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { isBefore } from '@driprail/shared/domain/time/zone';
import { dayBounds } from '@driprail/shared/domain/time/zone-instants';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import { rangeOf } from '../../db/models/columns.ts';
import { Van, VanCrew } from '../../db/models/index.ts';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { wakeAfterCommit } from '../../realtime/wake.ts';

export interface CrewMember {
  id: string;
  personId: string;
  name: string;
  from: string;
  to: string;
  position: number;
}

/** Sets who rides in a van on a day, in crew order. A person in two vans at once is refused by the database. */
export function setVanCrew(
  { actor, now }: Ctx,
  vanId: string,
  day: string,
  members: { personId: string; from: string; to: string }[],
): Promise<CrewMember[]> {
  return inTransaction(async (tx) => {
    const { zone } = await companyOf(tx);
    const { startsAt, endsAt } = dayBounds(day, zone);
    if (!(await Van.findByPk(vanId, { transaction: tx, lock: tx.LOCK.UPDATE }))) throw notFound('That van');
    if (members.some((m) => isBefore(m.from, startsAt) || isBefore(endsAt, m.to))) {
      throw unprocessable('outside_day', 'A crew’s hours lie inside the day.');
    }
    const before = await crewOf(vanId, startsAt, endsAt, tx);
    await run(
      'DELETE FROM van_crew WHERE van_id = :vanId AND span && tstzrange(:startsAt, :endsAt)',
      { vanId, startsAt, endsAt },
      tx,
    );
    await VanCrew.bulkCreate(
      members.map((m, position) => ({
        id: uuid(),
        personId: m.personId,
        vanId,
        span: rangeOf(m.from, m.to),
        position,
      })),
      { transaction: tx },
    );
    const after = await crewOf(vanId, startsAt, endsAt, tx);
    await audit(tx, { userId: actor.userId, at: now() }, 'crew', vanId, 'set', {
      day,
      people: after.map((m) => m.personId),
    });
    const personIds = [...new Set([...before, ...after].map((m) => m.personId))];
    hintAfterCommit(tx, ['desk', { personIds }], 'crew', vanId);
    wakeAfterCommit(tx, personIds, [startsAt]);
    return after;
  });
}

function crewOf(vanId: string, startsAt: string, endsAt: string, tx: Transaction): Promise<CrewMember[]> {
  return select<CrewMember>(
    `SELECT c.id, c.person_id AS "personId", p.name, c.position,
            to_json(lower(c.span)) #>> '{}' AS "from", to_json(upper(c.span)) #>> '{}' AS "to"
       FROM van_crew c JOIN people p ON p.id = c.person_id
      WHERE c.van_id = :vanId AND c.span && tstzrange(:startsAt, :endsAt) ORDER BY c.position`,
    { vanId, startsAt, endsAt },
    tx,
  );
}
