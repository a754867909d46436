import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayPlanDto } from '@driprail/shared/contracts/pay-plans.contract';
import { audit } from '../../db/audit.ts';
import { PayPlanRow, Person } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { refuseInsideWeek, refuseLockedDay } from './start-dates.ts';

/** Dated plans, the newest of each person first; they are never overwritten. */
export function listPlans(id: string | null = null, tx?: Transaction): Promise<PayPlanDto[]> {
  return select<PayPlanDto>(
    `SELECT r.id, r.person_id AS "personId", p.name AS "personName", r.starts_on AS "startsOn", r.plan,
            coalesce(u.name, '') AS "setBy", to_json(r.set_at) #>> '{}' AS "setAt"
       FROM pay_plans r JOIN people p ON p.id = r.person_id LEFT JOIN users u ON u.id = r.set_by
      WHERE (:id::uuid IS NULL OR r.id = :id::uuid) ORDER BY p.name, r.starts_on DESC`,
    { id },
    tx,
  );
}

export type PlanFields = Pick<PayPlanDto, 'personId' | 'startsOn' | 'plan'>;

/** @throws 409 when a plan starts on that day already, 422 inside a workweek or when it would change a locked week */
export function addPlan({ actor, now }: Ctx, fields: PlanFields): Promise<PayPlanDto> {
  return inTransaction(async (tx) => {
    const { personId, startsOn, plan } = fields;
    if (!(await Person.findByPk(personId, { transaction: tx }))) throw notFound('That person');
    await refuseLockedDay(startsOn, tx);
    await refuseInsideWeek(startsOn, tx);
    if (await PayPlanRow.findOne({ where: { personId, startsOn }, transaction: tx }))
      throw conflict('duplicate', 'A plan of this person starts on that day already. Choose another day.');
    const row = await PayPlanRow.create(
      { id: uuid(), personId, startsOn, plan, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_plan', row.id, 'set', { personId, startsOn, plan });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    const [dto] = await listPlans(row.id, tx);
    if (!dto) throw new Error('the plan was just written');
    return dto;
  });
}
