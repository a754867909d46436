import { v7 as uuid } from 'uuid';
import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import { audit } from '../../db/audit.ts';
import { PayRate, PayRuleSet } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { refuseLockedDay } from './start-dates.ts';
import type { Transaction } from 'sequelize';

/** Dated rates, the newest first; they are never overwritten. */
export function listRates(id: string | null = null, tx?: Transaction): Promise<RateDto[]> {
  return select<RateDto>(
    `SELECT r.id, r.kind, r.person_id AS "personId", p.name AS "personName", r.service_id AS "serviceId", s.name AS "serviceName",
            r.clock_kind AS "clockKind", trim_scale(r.value)::text AS value, r.starts_on AS "startsOn", coalesce(u.name, '') AS "setBy"
       FROM pay_rates r LEFT JOIN people p ON p.id = r.person_id LEFT JOIN services s ON s.id = r.service_id LEFT JOIN users u ON u.id = r.set_by
      WHERE (:id::uuid IS NULL OR r.id = :id::uuid) ORDER BY p.name NULLS FIRST, r.kind, s.name NULLS FIRST, r.starts_on DESC`,
    { id },
    tx,
  );
}

export type RateFields = Pick<RateDto, 'kind' | 'personId' | 'serviceId' | 'clockKind' | 'value' | 'startsOn'>;

/** @throws 409 when a rate starts on that day already, 422 when it would change a locked week */
export function addRate({ actor, now }: Ctx, fields: RateFields): Promise<RateDto> {
  return inTransaction(async (tx) => {
    await refuseLockedDay(fields.startsOn, tx);
    const { kind, personId, serviceId, clockKind, startsOn } = fields;
    if (await PayRate.findOne({ where: { kind, personId, serviceId, clockKind, startsOn }, transaction: tx })) {
      throw conflict('duplicate', 'A rate like this starts on that day already. Choose another day.');
    }
    const rate = await PayRate.create({ id: uuid(), ...fields, setBy: actor.userId }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_rate', rate.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', rate.id);
    const [dto] = await listRates(rate.id, tx);
    if (!dto) throw new Error('the rate was just written');
    return dto;
  });
}

export function listRules(id: string | null = null, tx?: Transaction): Promise<PayRulesDto[]> {
  return select<PayRulesDto>(
    `SELECT r.id, r.starts_on AS "startsOn", r.overtime_rule_set AS "overtimeRuleSet", trim_scale(r.minimum_wage)::text AS "minimumWage",
            r.crew_split AS "crewSplit", r.meal_break_minutes AS "mealBreakMinutes",
            r.punch_rounding_minutes AS "punchRoundingMinutes", r.premium_rounding AS "premiumRounding",
            r.commission_earned AS "commissionEarned", r.tips_go_to AS "tipsGoTo", trim_scale(r.tip_card_fee_percent)::text AS "tipCardFeePercent", r.workweek_starts_on AS "workweekStartsOn",
            r.workweek_starts_at AS "workweekStartsAt", coalesce(u.name, '') AS "setBy"
       FROM pay_rules r LEFT JOIN users u ON u.id = r.set_by WHERE (:id::uuid IS NULL OR r.id = :id::uuid) ORDER BY r.starts_on DESC`,
    { id },
    tx,
  );
}

export function addRules({ actor, now }: Ctx, fields: Omit<PayRulesDto, 'id' | 'setBy'>): Promise<PayRulesDto> {
  return inTransaction(async (tx) => {
    await refuseLockedDay(fields.startsOn, tx);
    if (await PayRuleSet.findOne({ where: { startsOn: fields.startsOn }, transaction: tx })) {
      throw conflict('duplicate', 'Rules start on that day already. Choose another day.');
    }
    const rules = await PayRuleSet.create({ id: uuid(), ...fields, setBy: actor.userId }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'pay_rules', rules.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', rules.id);
    const [dto] = await listRules(rules.id, tx);
    if (!dto) throw new Error('the rules were just written');
    return dto;
  });
}
