import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayPlaceDto, PersonPlaceDto } from '@driprail/shared/contracts/pay-plans.contract';
import { OVERTIME_RULE_SETS } from '@driprail/shared/domain/pay/overtime-rule-sets';
import { ruleSetOf } from '@driprail/shared/domain/pay/own-rules';
import type { OwnRules } from '@driprail/shared/domain/pay/own-rules';
import { audit } from '../../db/audit.ts';
import { PayPlace, PayPlaceWage, Person, PersonPlaceRow } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { refuseInsideWeek, refuseLockedDay } from './start-dates.ts';

interface PlaceRow extends Omit<PayPlaceDto, 'ruleSet'> {
  ruleSetKey: string | null;
  ownRules: OwnRules | null;
}

/** The places with their rules and minimum wages, by name. */
export async function listPlaces(id: string | null = null, tx?: Transaction): Promise<PayPlaceDto[]> {
  const rows = await select<PlaceRow>(
    `SELECT pl.id, pl.name, pl.rule_set_key AS "ruleSetKey", pl.own_rules AS "ownRules",
            coalesce((SELECT json_agg(json_build_object('startsOn', w.starts_on, 'amount', trim_scale(w.amount)::text,
               'source', w.source, 'setBy', coalesce(u.name, '')) ORDER BY w.starts_on)
               FROM pay_place_wages w LEFT JOIN users u ON u.id = w.set_by WHERE w.place_id = pl.id), '[]'::json) AS "minimumWages"
       FROM pay_places pl WHERE (:id::uuid IS NULL OR pl.id = :id::uuid) ORDER BY pl.name`,
    { id },
    tx,
  );
  return rows.map(({ ruleSetKey, ownRules, ...place }) => ({
    ...place,
    ruleSet: ruleSetOf(place.id, place.name, ruleSetKey, ownRules),
  }));
}

/** Who works where from when on, the newest of each person first. */
export function listPersonPlaces(tx?: Transaction): Promise<PersonPlaceDto[]> {
  return select<PersonPlaceDto>(
    `SELECT r.id, r.person_id AS "personId", p.name AS "personName", r.place_id AS "placeId", pl.name AS "placeName",
            r.starts_on AS "startsOn", coalesce(u.name, '') AS "setBy"
       FROM person_places r JOIN people p ON p.id = r.person_id LEFT JOIN pay_places pl ON pl.id = r.place_id
       LEFT JOIN users u ON u.id = r.set_by ORDER BY p.name, r.starts_on DESC`,
    {},
    tx,
  );
}

interface WageFields {
  startsOn: string;
  amount: string;
  source: string;
}

interface PlaceFields {
  name: string;
  ruleSetKey: string | null;
  ownRules: OwnRules | null;
  minimumWages: WageFields[];
}

/** @throws 409 when a place has the name already, 422 for an unknown rule set */
export function addPlace({ actor, now }: Ctx, { minimumWages, ...fields }: PlaceFields): Promise<PayPlaceDto> {
  return inTransaction(async (tx) => {
    refuseUnknownRules(fields.ruleSetKey);
    const [taken] = await select(
      'SELECT 1 FROM pay_places WHERE lower(name) = lower(:name)',
      { name: fields.name },
      tx,
    );
    if (taken) throw conflict('duplicate', 'A place of this name exists already. Give it another name.');
    const stamp = { setBy: actor.userId, setAt: now() };
    const place = await PayPlace.create({ id: uuid(), ...fields, ...stamp }, { transaction: tx });
    for (const wage of minimumWages)
      await PayPlaceWage.create({ id: uuid(), placeId: place.id, ...wage, ...stamp }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_place', place.id, 'set', { ...fields, minimumWages });
    hintAfterCommit(tx, ['owners'], 'pay', place.id);
    return onePlace(place.id, tx);
  });
}

/** @throws 404, 409 when a wage of the place starts on that day already, 422 when it would change a locked week */
export function addWage({ actor, now }: Ctx, placeId: string, fields: WageFields): Promise<PayPlaceDto> {
  return inTransaction(async (tx) => {
    if (!(await PayPlace.findByPk(placeId, { transaction: tx }))) throw notFound('That place');
    await refuseLockedDay(fields.startsOn, tx);
    const { startsOn } = fields;
    if (await PayPlaceWage.findOne({ where: { placeId, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'A minimum wage of this place starts on that day already. Choose another day.');
    const stamp = { setBy: actor.userId, setAt: now() };
    const wage = await PayPlaceWage.create({ id: uuid(), placeId, ...fields, ...stamp }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_place', placeId, 'wage set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', wage.id);
    return onePlace(placeId, tx);
  });
}

type PersonPlaceFields = Pick<PersonPlaceDto, 'personId' | 'placeId' | 'startsOn'>;

/** @throws 404, 409 for a second place from the same day on, 422 inside a workweek or in a locked week */
export function placePerson({ actor, now }: Ctx, fields: PersonPlaceFields): Promise<PersonPlaceDto[]> {
  return inTransaction(async (tx) => {
    const { personId, placeId, startsOn } = fields;
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    if (placeId && !(await PayPlace.findByPk(placeId, { transaction: tx }))) throw notFound('That place');
    await refuseLockedDay(startsOn, tx);
    await refuseInsideWeek(startsOn, tx);
    if (await PersonPlaceRow.findOne({ where: { personId, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'A place of this person starts on that day already. Choose another day.');
    const row = await PersonPlaceRow.create(
      { id: uuid(), ...fields, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'person_place', row.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    return listPersonPlaces(tx);
  });
}

function refuseUnknownRules(key: string | null): void {
  if (key === null || OVERTIME_RULE_SETS.some((set) => set.key === key)) return;
  const message = 'Choose one of the listed rule sets.';
  throw unprocessable('unknown_rules', message, { fields: { ruleSetKey: message } });
}

async function onePlace(id: string, tx: Transaction): Promise<PayPlaceDto> {
  const [place] = await listPlaces(id, tx);
  if (!place) throw new Error('the place was just written');
  return place;
}
