import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { RefundReasonDto } from '@driprail/shared/contracts/pay-agreements.contract';
import { audit } from '../../../db/audit.ts';
import { RefundReason } from '../../../db/models/index.ts';
import { inTransaction, select } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { conflict } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';

/** Every reason with its history: by name, newest first. */
export function listRefundReasons(id: string | null = null, tx?: Transaction): Promise<RefundReasonDto[]> {
  return select<RefundReasonDto>(
    `SELECT r.id, r.name, r.lowers_commission AS "lowersCommission", r.starts_on AS "startsOn", coalesce(u.name, '') AS "setBy"
       FROM refund_reasons r LEFT JOIN users u ON u.id = r.set_by
      WHERE (:id::uuid IS NULL OR r.id = :id::uuid) ORDER BY lower(r.name), r.starts_on DESC`,
    { id },
    tx,
  );
}

export type ReasonFields = Pick<RefundReasonDto, 'name' | 'lowersCommission' | 'startsOn'>;

/** @throws 409 when the same name starts on that day already */
export function addRefundReason({ actor, now }: Ctx, fields: ReasonFields): Promise<RefundReasonDto> {
  return inTransaction(async (tx) => {
    const known = await listRefundReasons(null, tx);
    const same = (reason: ReasonFields) =>
      reason.name.toLowerCase() === fields.name.toLowerCase() && reason.startsOn === fields.startsOn;
    if (known.some(same)) throw conflict('duplicate', 'This reason starts on that day already. Choose another day.');
    const row = await RefundReason.create(
      { id: uuid(), ...fields, setBy: actor.userId, setAt: now() },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'refund_reason', row.id, 'set', { ...fields });
    hintAfterCommit(tx, ['owners'], 'pay', row.id);
    const [dto] = await listRefundReasons(row.id, tx);
    if (!dto) throw new Error('the reason was just written');
    return dto;
  });
}
