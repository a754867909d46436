import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { visitDto } from '@driprail/shared/contracts/visit.dto';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { isAccessOpen } from '@driprail/shared/domain/board/access-notes';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { select } from '../../db/sequelize.ts';
import { ownDay, visitFrom, visitJson } from '../board/index.ts';

interface Extras {
  gateCode: string;
  accessNotes: string;
  vanName: string;
  last: { action: ProgressAction; receivedAt: string } | null;
  times: { setOffAt: string | null; arrivedAt: string | null; startedAt: string | null; endedAt: string | null };
}

export interface RunRow {
  visit: VisitDto;
  extras: Extras;
}

/** Rows of visits with what only their crew may see; the presenter decides what of it is shown when. */
export async function readRunRows(
  where: { personId: string; day: string } | { visitId: string },
  tx?: Transaction,
): Promise<RunRow[]> {
  const condition = 'visitId' in where ? 'v.id = :visitId' : ownDay;
  const at = (kind: string) =>
    `(SELECT to_json(max(e.occurred_at)) #>> '{}' FROM visit_events e WHERE e.visit_id = v.id AND NOT e.is_undone AND e.kind IN (${kind}))`;
  const rows = await select<{ visit: z.input<typeof visitDto>; extras: Extras }>(
    `SELECT ${visitJson} AS visit, json_build_object(
        'gateCode', a.gate_code, 'accessNotes', a.access_notes, 'vanName', coalesce(n.name, ''),
        'last', (SELECT json_build_object('action', e.kind, 'receivedAt', to_json(e.received_at) #>> '{}') FROM visit_events e
           WHERE e.visit_id = v.id AND NOT e.is_undone AND e.kind IN ('set_off', 'arrive', 'start_work', 'part_done', 'finish')
           ORDER BY e.received_at DESC, e.id DESC LIMIT 1),
        'times', json_build_object('setOffAt', ${at("'set_off'")}, 'arrivedAt', ${at("'arrive'")}, 'startedAt', ${at("'start_work'")},
           'endedAt', ${at("'finish', 'part_done', 'call_off'")})) AS extras
      FROM ${visitFrom} LEFT JOIN vans n ON n.id = v.van_id CROSS JOIN company_settings s
     WHERE ${condition} ORDER BY lower(v.planned), v.id`,
    where,
    tx,
  );
  return rows.map(({ visit, extras }) => ({ visit: visitDto.parse(visit), extras }));
}

/** What the crew sees: access notes and phone only in their hours, undo only for a short while. */
export function toRunVisit(
  { visit, extras }: RunRow,
  { now, zone, undoSeconds }: { now: Date; zone: string; undoSeconds: number },
): RunVisitDto {
  const { accepted: _desk, phone, ...shown } = visit;
  const arrivesFrom =
    visit.windowFrom && dayOf(visit.windowFrom, zone) === dayOf(visit.from ?? visit.windowFrom, zone)
      ? visit.windowFrom
      : visit.from;
  const isOpen = arrivesFrom !== null && isAccessOpen(arrivesFrom, now.toISOString(), zone);
  const undoUntil = extras.last ? new Date(Date.parse(extras.last.receivedAt) + undoSeconds * 1000) : null;
  return {
    ...shown,
    phone: isOpen ? phone : null,
    gateCode: isOpen ? extras.gateCode : null,
    accessNotes: isOpen ? extras.accessNotes : null,
    vanName: extras.vanName,
    undoable:
      extras.last && undoUntil && undoUntil > now
        ? { action: extras.last.action, until: undoUntil.toISOString() }
        : null,
    times: extras.times,
  };
}
