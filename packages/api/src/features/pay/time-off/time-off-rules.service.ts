import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { ShowUpRuleDto, TimeOffRuleDto } from '@driprail/shared/contracts/time-off.contract';
import { showUpKindOf } from '@driprail/shared/domain/pay/time-off/show-up-rule';
import { audit } from '../../../db/audit.ts';
import { PayPlace, Person, ShowUpRuleRow, TimeOffRuleRow } from '../../../db/models/index.ts';
import { inTransaction, select } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { conflict, notFound } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { refuseInsideWeek, refuseLockedDay } from '../start-dates.ts';

/** Dated rules of paid time off, the newest of each first; they are never overwritten. */
export function listTimeOffRules(id: string | null = null, tx?: Transaction): Promise<TimeOffRuleDto[]> {
  return select<TimeOffRuleDto>(
    `SELECT r.id, r.kind, r.person_id AS "personId", p.name AS "personName", r.starts_on AS "startsOn", r.rule,
            coalesce(u.name, '') AS "setBy", to_json(r.set_at) #>> '{}' AS "setAt"
       FROM time_off_rules r LEFT JOIN people p ON p.id = r.person_id LEFT JOIN users u ON u.id = r.set_by
      WHERE (:id::uuid IS NULL OR r.id = :id::uuid)
      ORDER BY array_position(ARRAY['sick', 'vacation', 'holiday'], r.kind), p.name NULLS FIRST, r.starts_on DESC`,
    { id },
    tx,
  );
}

export function listShowUpRules(id: string | null = null, tx?: Transaction): Promise<ShowUpRuleDto[]> {
  return select<ShowUpRuleDto>(
    `SELECT r.id, r.place_id AS "placeId", pl.name AS "placeName", r.starts_on AS "startsOn", r.rule, r.source,
            coalesce(u.name, '') AS "setBy", to_json(r.set_at) #>> '{}' AS "setAt"
       FROM show_up_rules r LEFT JOIN pay_places pl ON pl.id = r.place_id LEFT JOIN users u ON u.id = r.set_by
      WHERE (:id::uuid IS NULL OR r.id = :id::uuid) ORDER BY r.pay_kind DESC, pl.name NULLS FIRST, r.starts_on DESC`,
    { id },
    tx,
  );
}

type TimeOffRuleFields = Pick<TimeOffRuleDto, 'kind' | 'personId' | 'startsOn' | 'rule'>;

/** @throws 404, 409 when a rule of the kind starts on that day already, 422 inside a workweek or in a locked week */
export function addTimeOffRule({ actor, now }: Ctx, fields: TimeOffRuleFields): Promise<TimeOffRuleDto> {
  return inTransaction(async (tx) => {
    const { kind, personId, startsOn } = fields;
    if (personId && !(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    await refuseLockedDay(startsOn, tx);
    await refuseInsideWeek(startsOn, tx);
    if (await TimeOffRuleRow.findOne({ where: { kind, personId, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'A rule of this kind starts on that day already. Choose another day.');
    const row = await TimeOffRuleRow.create(
      { id: uuid(), ...fields, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'time_off_rule', row.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    const [dto] = await listTimeOffRules(row.id, tx);
    if (!dto) throw new Error('the rule was just written');
    return dto;
  });
}

type ShowUpRuleFields = Pick<ShowUpRuleDto, 'placeId' | 'startsOn' | 'rule' | 'source'>;

/** @throws 404, 409 when a rule of the kind starts on that day already, 422 inside a workweek or in a locked week */
export function addShowUpRule({ actor, now }: Ctx, fields: ShowUpRuleFields): Promise<ShowUpRuleDto> {
  return inTransaction(async (tx) => {
    const { placeId, startsOn } = fields;
    const payKind = showUpKindOf(fields.rule);
    if (placeId && !(await PayPlace.findByPk(placeId, { transaction: tx }))) throw notFound('That place');
    await refuseLockedDay(startsOn, tx);
    await refuseInsideWeek(startsOn, tx);
    if (await ShowUpRuleRow.findOne({ where: { payKind, placeId, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'A rule of this kind starts on that day already. Choose another day.');
    const row = await ShowUpRuleRow.create(
      { id: uuid(), payKind, ...fields, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'show_up_rule', row.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    const [dto] = await listShowUpRules(row.id, tx);
    if (!dto) throw new Error('the rule was just written');
    return dto;
  });
}
