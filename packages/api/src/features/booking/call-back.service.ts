import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { JobDto, callBackJob as contract } from '@driprail/shared/contracts/jobs.contract';
import { callBackCauseNames, callBackMinutes } from '@driprail/shared/domain/board/call-back';
import { audit } from '../../db/audit.ts';
import { Job } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { readJob } from './jobs.queries.ts';
import { orderJob } from './jobs.service.ts';

type CallBackFields = z.infer<(typeof contract)['body']>;

/**
 * A job of its own that puts finished lines of a past one right: the same cars and services at no price. Who did them
 * stands in its notes, since the same crew is offered.
 * @throws 404, 422 for lines that are not finished lines of that job
 */
export function callBackJob(ctx: Ctx, jobId: string, fields: CallBackFields): Promise<JobDto> {
  return inTransaction(async (tx) => {
    const past = await readJob(jobId, tx);
    if (!past) throw notFound('That job');
    const lines = past.lines.filter((line) => fields.lineIds.includes(line.id) && line.isFinished);
    if (lines.length !== new Set(fields.lineIds).size) {
      const message = 'Choose what was finished on that job. What is still to come is changed on the job itself.';
      throw unprocessable('not_finished', message, { fields: { lineIds: message } });
    }
    const minutes = callBackMinutes(
      fields.minutes,
      lines.map((line) => line.minutes),
    );
    const id = uuid();
    await orderJob(
      tx,
      ctx,
      {
        ...{ customerId: past.customerId, addressId: past.addressId },
        ...{ windowFrom: fields.windowFrom, windowTo: fields.windowTo, discountCents: 0, discountReason: '' },
        notes: await notesOf(tx, past, fields),
        lines: lines.map(({ serviceId, vehicleId, sizeClass }, index) => ({
          ...{ serviceId, vehicleId, sizeClass, priceCents: 0, minutes: minutes[index] ?? 5 },
        })),
      },
      id,
    );
    await Job.update({ callBackOf: jobId, callBackCause: fields.cause }, { where: { id }, transaction: tx });
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    await audit(tx, by, 'job', jobId, 'called back', { jobNumber: past.number, cause: fields.cause });
    const made = await readJob(id, tx);
    if (!made) throw notFound('That job');
    return made;
  });
}

async function notesOf(tx: Transaction, past: JobDto, { cause, lineIds, notes }: CallBackFields): Promise<string> {
  const [row] = await select<{ words: string | null }>(
    `SELECT string_agg(DISTINCT p.name || coalesce(' in ' || n.name, ''), ', ') AS words
       FROM job_lines l JOIN visits v ON v.id = l.finished_visit_id JOIN visit_crew c ON c.visit_id = v.id
       JOIN people p ON p.id = c.person_id LEFT JOIN vans n ON n.id = v.van_id WHERE l.id IN (:lineIds)`,
    { lineIds },
    tx,
  );
  const crew = row?.words ? ` Done by ${row.words}.` : '';
  return [`Call-back of job ${past.number}: ${callBackCauseNames[cause].toLowerCase()}.${crew}`, notes]
    .filter(Boolean)
    .join('\n')
    .slice(0, 10_000);
}
