import type { Transaction } from 'sequelize';
import { AuditEntry } from './models/index.ts';

/** Writes the audit trail in the change's own transaction. Details name customers by id only. */
export async function audit(
  tx: Transaction,
  by: { userId: string | null; at: Date },
  entity: string,
  entityId: string,
  action: string,
  details: Record<string, unknown> = {},
): Promise<void> {
  await AuditEntry.create({ at: by.at, userId: by.userId, entity, entityId, action, details }, { transaction: tx });
}
