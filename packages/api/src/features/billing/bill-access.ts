import type { Transaction } from 'sequelize';
import { tag } from '@driprail/shared/authz/ability';
import { authorize } from '../../authz/authorize.ts';
import { companyOf } from '../../db/company.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';
import { isTakenLate, nearness, readVisits } from '../board/index.ts';

/**
 * The desk sees every bill; a technician that of a job whose visit is near and the own crew's, others are not there.
 * @param madeAt when a press was made, corrected; it is judged by that moment too when it arrives late
 * @throws 404, 403
 */
export async function authorizeBill(
  ctx: Ctx,
  action: 'read' | 'create' | 'collect',
  jobId: string,
  { tx, madeAt }: { tx?: Transaction; madeAt?: string } = {},
): Promise<void> {
  const { zone } = await companyOf(tx);
  const now = ctx.now();
  const visits = await readVisits({ jobId }, tx);
  const seen = (at: string) => visits.map((visit) => tag('Bill', { id: jobId, ...nearness(visit, zone, at) }));
  const asOfNow = seen(now.toISOString());
  if (madeAt !== undefined && isTakenLate(madeAt, now) && seen(madeAt).some((bill) => ctx.ability.can(action, bill)))
    return;
  if (asOfNow.some((bill) => ctx.ability.can(action, bill))) return;
  const first = asOfNow[0];
  if (!first || !asOfNow.some((bill) => ctx.ability.can('read', bill))) throw notFound('That job');
  authorize(ctx.ability, action, first);
}
