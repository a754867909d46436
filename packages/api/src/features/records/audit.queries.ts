import type { AuditEntryDto } from '@driprail/shared/contracts/records.contract';
import { select } from '../../db/sequelize.ts';

export interface AuditQuery {
  entity?: string | undefined;
  before?: number | undefined;
  limit: number;
}

/** A page of the audit trail, newest first. @returns the entries, and where the next page starts */
export async function readAudit({
  entity,
  before,
  limit,
}: AuditQuery): Promise<{ entries: AuditEntryDto[]; next: number | null }> {
  const entries = await select<AuditEntryDto>(
    `SELECT a.id, to_json(a.at) #>> '{}' AS at, coalesce(u.name, 'Driprail') AS by, a.entity, a.entity_id AS "entityId", a.action, a.details
       FROM audit_entries a LEFT JOIN users u ON u.id = a.user_id
      WHERE (:entity::text IS NULL OR a.entity = :entity) AND (:before::bigint IS NULL OR a.id < :before::bigint)
      ORDER BY a.id DESC LIMIT :limit`,
    { entity: entity ?? null, before: before ?? null, limit },
  );
  return { entries, next: entries.length === limit ? (entries.at(-1)?.id ?? null) : null };
}
