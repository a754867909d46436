import type { Transaction } from 'sequelize';
import { missingForDone, stillMissing } from '@driprail/shared/domain/job-work/missing';
import { mustKnowsOf, unconfirmed } from '@driprail/shared/domain/job-work/must-knows';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { minutesBetween } from '@driprail/shared/domain/time/zone';
import { run } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { foldOf, linesOf } from './work-state.ts';
import type { WorkRow } from './work-rows.queries.ts';
import { readWorkRows } from './work-rows.queries.ts';

/** A press that comes this much later was made without signal: what happened is recorded, nothing new is demanded of it. */
const WAITED_MINUTES = 2;

/**
 * The must-knows come before Start work, for those at the car; the desk records what it was told.
 * @throws 422 with the list that nobody has confirmed
 */
export async function refuseUnconfirmed(
  tx: Transaction,
  ctx: Ctx,
  visitId: string,
  times: StampedTimes,
): Promise<void> {
  const row = await rowAtTheCar(tx, ctx, visitId);
  if (!row) return;
  const state = foldOf(row);
  const hasWaited = minutesBetween(times.occurredAt, times.receivedAt) >= WAITED_MINUTES;
  // Confirmed on the phone in a dead zone: what the desk added meanwhile could not be seen there.
  if (hasWaited && state.confirmed) return;
  const open = unconfirmed(mustKnowsOf(row.extras.mustKnow), state.confirmedKeys);
  if (open.length === 0) return;
  const words = `Confirm first: ${open.map((one) => one.words).join(' ')}`;
  throw unprocessable('must_knows', words, { hint: { current: { missing: open } } });
}

/**
 * Done demands what the services demand, or a reason to go on without.
 * @throws 422 with the list of what is missing
 */
export async function refuseUnfinished(tx: Transaction, ctx: Ctx, visitId: string, times: StampedTimes): Promise<void> {
  if (minutesBetween(times.occurredAt, times.receivedAt) >= WAITED_MINUTES) return;
  const row = await rowAtTheCar(tx, ctx, visitId);
  if (!row) return;
  const state = foldOf(row);
  const missing = stillMissing(missingForDone(linesOf(row), state), state.wentOn?.keys ?? []);
  if (missing.length === 0) return;
  const words = `Still missing: ${missing.map((one) => one.words).join(', ')}. Tick it, or say why the job goes on without.`;
  throw unprocessable('missing_steps', words, { hint: { current: { missing } } });
}

/** Fixes which version of each checklist the visit goes by; what was fixed before stays, a swapped service is fixed anew. */
export async function fixChecklists(tx: Transaction, visitId: string): Promise<void> {
  await run(
    `INSERT INTO visit_checklists (visit_id, job_line_id, service_id, version)
     SELECT vl.visit_id, l.id, l.service_id, max(k.version)
       FROM visit_lines vl JOIN job_lines l ON l.id = vl.job_line_id JOIN service_checklists k ON k.service_id = l.service_id
      WHERE vl.visit_id = :visitId GROUP BY vl.visit_id, l.id, l.service_id
     ON CONFLICT (visit_id, job_line_id) DO UPDATE SET service_id = excluded.service_id, version = excluded.version
      WHERE visit_checklists.service_id <> excluded.service_id`,
    { visitId },
    tx,
  );
}

/** Null for a login that is not of the visit's crew. */
async function rowAtTheCar(tx: Transaction, { actor }: Ctx, visitId: string): Promise<WorkRow | null> {
  const [row] = await readWorkRows({ visitId }, tx);
  if (!row) throw notFound('That visit');
  const isAtTheCar = row.visit.crew.some((person) => person.personId === actor.personId);
  return actor.role === 'technician' || isAtTheCar ? row : null;
}
