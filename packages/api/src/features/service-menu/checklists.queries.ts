import type { Transaction } from 'sequelize';
import type { ChecklistDto } from '@driprail/shared/contracts/checklist.contract';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import { select } from '../../db/sequelize.ts';
import { notFound } from '../../http/errors.ts';

/** The newest version of a service's steps; none yet is version 0. @throws 404 */
export async function readChecklist(serviceId: string, tx?: Transaction): Promise<ChecklistDto> {
  const [row] = await select<ChecklistDto>(
    `SELECT s.id AS "serviceId", coalesce(k.version, 0) AS version, coalesce(k.asks_note, false) AS "asksNote",
            coalesce(k.steps, '[]') AS steps, to_json(k.created_at) #>> '{}' AS "savedAt", coalesce(u.name, '') AS "savedBy"
       FROM services s
       LEFT JOIN LATERAL (SELECT * FROM service_checklists WHERE service_id = s.id ORDER BY version DESC LIMIT 1) k ON true
       LEFT JOIN users u ON u.id = k.created_by
      WHERE s.id = :serviceId`,
    { serviceId },
    tx,
  );
  if (!row) throw notFound('That service');
  return row;
}

/** The steps of every other service on the menu, for rules that hold in the whole house. */
export async function stepsOfOthers(tx: Transaction, serviceId: string): Promise<CheckStep[]> {
  const rows = await select<{ steps: CheckStep[] }>(
    `SELECT DISTINCT ON (k.service_id) k.steps FROM service_checklists k JOIN services s ON s.id = k.service_id
      WHERE k.service_id <> :serviceId AND s.is_active ORDER BY k.service_id, k.version DESC`,
    { serviceId },
    tx,
  );
  return rows.flatMap((row) => row.steps);
}
