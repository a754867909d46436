import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { tag } from '@driprail/shared/authz/ability';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { Job, Tip } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound, unprocessable } from '../../http/errors.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** A tip as a row, in a caller's transaction; `userId` is null where the customer gave it with a card. */
export async function keepTip(
  tx: Transaction,
  by: { userId: string | null; at: Date },
  job: { id: string; number: number },
  tip: Omit<TipFields, 'key'> & { paymentId: string | null },
): Promise<void> {
  const id = uuid();
  await Tip.create({ id, jobId: job.id, ...tip, receivedAt: by.at, userId: by.userId }, { transaction: tx });
  await audit(tx, by, 'tip', id, 'recorded', { jobNumber: job.number, ...tip });
}

export interface TipFields {
  key: string;
  amountCents: number;
  method: 'card' | 'cash' | 'invoice';
  alreadyReceived: boolean;
  forPersonId: string | null;
}

/** Records a tip once; it belongs to the crew of the job's visits. */
export async function recordTip(ctx: Ctx, jobId: string, tip: TipFields): Promise<void> {
  if (tip.alreadyReceived && tip.method !== 'cash')
    throw unprocessable('not_cash', 'Only cash can be kept on the spot.');
  await takeOnce(ctx, tip.key, { jobId, ...tip }, async (tx) => {
    const job = await Job.findByPk(jobId, { transaction: tx });
    const crew = await select<{ personId: string }>(
      `SELECT DISTINCT vc.person_id AS "personId" FROM visit_crew vc JOIN visits v ON v.id = vc.visit_id WHERE v.job_id = :jobId`,
      { jobId },
      tx,
    );
    const crewPersonIds = crew.map((member) => member.personId);
    const subject = tag('Job', { id: jobId, crewPersonIds });
    if (!job || (ctx.actor.role === 'technician' && ctx.ability.cannot('tip', subject))) throw notFound('That job');
    authorize(ctx.ability, 'tip', subject);
    if (tip.forPersonId !== null && !crewPersonIds.includes(tip.forPersonId)) {
      const message = 'Choose one of the crew of this job.';
      throw unprocessable('not_in_crew', message, { fields: { forPersonId: message } });
    }
    const { key: _key, ...fields } = tip;
    await keepTip(tx, { userId: ctx.actor.userId, at: ctx.now() }, job, { ...fields, paymentId: null });
    hintAfterCommit(tx, ['desk', { personIds: crewPersonIds }], 'job', jobId, job.version);
    return { answer: { ok: true } };
  });
}
