import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { audit } from '../../db/audit.ts';
import { todayOf } from '../../db/company.ts';
import { Person, TimeOff, TipStanding } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { listPeople } from './people.queries.ts';

export interface PersonFields {
  name: string;
  phone: string;
  skills: string[];
  isTrainee: boolean;
  isActive: boolean;
  sharesTips: boolean;
}

export function createPerson(ctx: Ctx, fields: PersonFields, id = uuid()): Promise<PersonDto> {
  return inTransaction(async (tx) => {
    const { sharesTips, ...columns } = fields;
    await Person.create({ id, ...columns }, { transaction: tx });
    await setTipStanding(tx, ctx, id, sharesTips);
    return saved(tx, ctx, id, 'added');
  });
}

export function updatePerson(
  ctx: Ctx,
  id: string,
  { version, sharesTips, ...columns }: PersonFields & { version: number },
): Promise<PersonDto> {
  return inTransaction(async (tx) => {
    const person = await Person.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!person) throw notFound('That person');
    if (person.version !== version)
      throw conflict('stale', `Somebody changed ${person.name} meanwhile. Reload and try again.`);
    await person.update({ ...columns, version: version + 1 }, { transaction: tx });
    await setTipStanding(tx, ctx, id, sharesTips);
    return saved(tx, ctx, id, 'changed');
  });
}

/** A dated fact: from today on, never back in time. */
async function setTipStanding(tx: Transaction, { now }: Ctx, personId: string, sharesTips: boolean): Promise<void> {
  const startsOn = await todayOf(now(), tx);
  const latest = await TipStanding.findOne({ where: { personId }, order: [['startsOn', 'DESC']], transaction: tx });
  if ((latest?.sharesTips ?? true) === sharesTips) return;
  await TipStanding.upsert({ personId, startsOn, sharesTips }, { transaction: tx });
}

export function addTimeOff(
  ctx: Ctx,
  personId: string,
  off: { startsOn: string; endsOn: string; note: string },
): Promise<PersonDto> {
  return inTransaction(async (tx) => {
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    await TimeOff.create({ id: uuid(), personId, ...off }, { transaction: tx });
    return saved(tx, ctx, personId, 'time off added');
  });
}

export function removeTimeOff(ctx: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    const off = await TimeOff.findByPk(id, { transaction: tx });
    if (!off) throw notFound('That time off');
    await off.destroy({ transaction: tx });
    await saved(tx, ctx, off.personId, 'time off removed');
  });
}

async function saved(tx: Transaction, { actor, now }: Ctx, id: string, action: string): Promise<PersonDto> {
  await audit(tx, { userId: actor.userId, at: now() }, 'person', id, action);
  const [person] = await listPeople(await todayOf(now(), tx), id, tx);
  if (!person) throw notFound('That person');
  hintAfterCommit(tx, ['desk'], 'person', id, person.version);
  return person;
}
