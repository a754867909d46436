import type { Transaction } from 'sequelize';
import type { ClockRequestDto } from '@driprail/shared/contracts/hours.contract';
import { select } from '../../db/sequelize.ts';

/** Requests, open ones first; `personId` narrows to one person's, `id` to one. */
export function listRequests(
  { personId = null, id = null }: { personId?: string | null; id?: string | null },
  tx?: Transaction,
): Promise<Omit<ClockRequestDto, 'isMine'>[]> {
  return select(
    `SELECT r.id, r.person_id AS "personId", p.name AS "personName", r.entry_id AS "entryId", r.direction, u.name AS by,
            to_json(r.at) #>> '{}' AS at, r.before, r.after, r.reason, r.state, d.name AS "decidedBy", r.answer
       FROM clock_requests r JOIN people p ON p.id = r.person_id JOIN users u ON u.id = r.user_id LEFT JOIN users d ON d.id = r.decided_by
      WHERE (:personId::uuid IS NULL OR r.person_id = :personId::uuid) AND (:id::uuid IS NULL OR r.id = :id::uuid)
      ORDER BY r.state <> 'open', r.at DESC LIMIT 100`,
    { personId, id },
    tx,
  );
}
