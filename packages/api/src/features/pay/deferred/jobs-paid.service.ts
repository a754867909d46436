import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import type { Transaction } from 'sequelize';
import { audit } from '../../../db/audit.ts';
import { companyOf, todayOf } from '../../../db/company.ts';
import { Job, JobPaid } from '../../../db/models/index.ts';
import { inTransaction } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../../http/errors.ts';
import { hintAfterCommit } from '../../../realtime/hints.ts';
import { weekAt } from '../weeks.service.ts';

/**
 * The customer has paid a job in full. The day is the one on which it became known: locked weeks stay as they are.
 * @throws 404, 409 when it is marked already, 422 for a day to come or in a locked week
 */
export function markJobPaid({ actor, now }: Ctx, jobId: string, paidOn: string): Promise<void> {
  return inTransaction(async (tx) => {
    const job = await Job.findByPk(jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!job) throw notFound('That job');
    if (await JobPaid.findByPk(jobId, { transaction: tx }))
      throw conflict('duplicate', `Job ${job.number} is marked as paid already.`);
    const { zone } = await companyOf(tx);
    if (paidOn > (await todayOf(now(), tx))) refuseDay('The customer can’t have paid on a day to come.');
    await refuseLockedWeek(paidOn, tx);
    const paidAt = new Date(instantOf(paidOn, '12:00', zone));
    await JobPaid.create({ jobId, paidAt, recordedBy: actor.userId, recordedAt: now() }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'job_paid', jobId, 'recorded', {
      jobNumber: job.number,
      paidOn,
    });
    hintAfterCommit(tx, ['owners'], 'pay', jobId);
  });
}

/** @throws 404, 422 when the week that settled it is locked */
export function takeBackJobPaid({ actor, now }: Ctx, jobId: string): Promise<void> {
  return inTransaction(async (tx) => {
    const paid = await JobPaid.findByPk(jobId, { transaction: tx, lock: tx.LOCK.UPDATE });
    const job = await Job.findByPk(jobId, { transaction: tx });
    if (!paid || !job) throw notFound('That payment');
    const { zone } = await companyOf(tx);
    const paidOn = dayOf(paid.paidAt.toISOString(), zone);
    await refuseLockedWeek(paidOn, tx);
    await paid.destroy({ transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'job_paid', jobId, 'taken_back', {
      jobNumber: job.number,
      paidOn,
    });
    hintAfterCommit(tx, ['owners'], 'pay', jobId);
  });
}

/** The bill of a job is settled; commission that waited for it is now earned. Known once: a later payment changes nothing. */
export async function noteJobPaid(
  tx: Transaction,
  { userId, at }: { userId: string | null; at: Date },
  job: { id: string; number: number },
): Promise<void> {
  if (await JobPaid.findByPk(job.id, { transaction: tx })) return;
  await JobPaid.create({ jobId: job.id, paidAt: at, recordedBy: userId, recordedAt: at }, { transaction: tx });
  await audit(tx, { userId, at }, 'job_paid', job.id, 'recorded', { jobNumber: job.number });
  hintAfterCommit(tx, ['owners'], 'pay', job.id);
}

async function refuseLockedWeek(day: string, tx: Transaction): Promise<void> {
  const week = await weekAt(day, tx);
  if (week.state === 'locked')
    refuseDay(`The week to ${formatDate(week.endsOn)} is locked. Give the day on which the payment became known.`);
}

function refuseDay(message: string): never {
  throw unprocessable('bad_day', message, { fields: { paidOn: message } });
}
