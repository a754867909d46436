import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { AgreementDto } from '@driprail/shared/contracts/pay-agreements.contract';
import { audit } from '../../../db/audit.ts';
import { PayAgreement, Person } from '../../../db/models/index.ts';
import { inTransaction, select } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { conflict, notFound } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { refuseInsideWeek, refuseLockedDay } from '../start-dates.ts';

/** What persons agreed to in writing, by person, newest first. */
export function listAgreements(id: string | null = null, tx?: Transaction): Promise<AgreementDto[]> {
  return select<AgreementDto>(
    `SELECT a.id, a.person_id AS "personId", p.name AS "personName", a.kind, a.starts_on AS "startsOn", a.signed_on AS "signedOn",
            a.note, coalesce(u.name, '') AS "setBy"
       FROM pay_agreements a JOIN people p ON p.id = a.person_id LEFT JOIN users u ON u.id = a.set_by
      WHERE (:id::uuid IS NULL OR a.id = :id::uuid) ORDER BY p.name, a.kind, a.starts_on DESC`,
    { id },
    tx,
  );
}

export type AgreementFields = Pick<AgreementDto, 'personId' | 'kind' | 'startsOn' | 'signedOn' | 'note'>;

/** @throws 404, 409 when one starts on that day already, 422 inside a workweek or in a locked one */
export function addAgreement({ actor, now }: Ctx, fields: AgreementFields): Promise<AgreementDto> {
  return inTransaction(async (tx) => {
    const { personId, kind, startsOn } = fields;
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    await refuseInsideWeek(startsOn, tx);
    await refuseLockedDay(startsOn, tx);
    if (await PayAgreement.findOne({ where: { personId, kind, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'One starts on that day already. Choose another week.');
    const row = await PayAgreement.create(
      { id: uuid(), ...fields, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_agreement', row.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    const [dto] = await listAgreements(row.id, tx);
    if (!dto) throw new Error('the agreement was just written');
    return dto;
  });
}

/** Whether a signed agreement of a kind holds for a person on a day. */
export async function hasAgreement(
  personId: string,
  kind: AgreementDto['kind'],
  day: string,
  tx: Transaction,
): Promise<boolean> {
  const all = await PayAgreement.findAll({ where: { personId, kind }, order: [['startsOn', 'DESC']], transaction: tx });
  const signedOn = all.find((row) => row.startsOn <= day)?.signedOn ?? null;
  return signedOn !== null;
}
