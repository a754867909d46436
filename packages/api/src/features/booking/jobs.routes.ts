import * as api from '@driprail/shared/contracts/jobs.contract';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { todayOf } from '../../db/company.ts';
import { carsDue } from './due.queries.ts';
import { callBackJob } from './call-back.service.ts';
import { findJobs, readJob } from './jobs.queries.ts';
import { addVisit, callOffJob, copyJob, createJob, updateJob } from './jobs.service.ts';
import { recordTip } from './tips.service.ts';

export function jobsRoutes(table: RouteTable): void {
  route(table, api.findJobs, async ({ query }) => ({ jobs: await findJobs(query.find) }));
  route(table, api.listDue, async (_input, ctx) => ({ due: await carsDue(await todayOf(ctx.now())) }));
  route(table, api.getJob, async ({ params }, ctx) => {
    const job = await readJob(params.id);
    if (!job) throw notFound('That job');
    return { job: forAbility(ctx, job) };
  });
  route(table, api.createJob, async ({ body }, ctx) => ({ job: forAbility(ctx, await createJob(ctx, body)) }));
  route(table, api.updateJob, async ({ params, body }, ctx) => ({
    job: forAbility(ctx, await updateJob(ctx, params.id, body)),
  }));
  route(table, api.copyJob, async ({ params }, ctx) => ({ job: forAbility(ctx, await copyJob(ctx, params.id)) }));
  route(table, api.callBackJob, async ({ params, body }, ctx) => ({
    job: forAbility(ctx, await callBackJob(ctx, params.id, body)),
  }));
  route(table, api.callOffJob, async ({ params, body }, ctx) => ({
    job: forAbility(ctx, await callOffJob(ctx, params.id, body.version, body.reason)),
  }));
  route(table, api.addVisit, async ({ params, body }, ctx) => ({
    job: forAbility(ctx, await addVisit(ctx, params.id, body)),
  }));
  route(table, api.recordTip, async ({ params, body }, ctx) => {
    await recordTip(ctx, params.id, body);
    return okay;
  });
}

/** A tip is pay: whoever may not read the pay week gets the job without it. */
function forAbility({ ability }: Ctx, job: JobDto): JobDto {
  return ability.can('read', 'PayWeek') ? job : { ...job, tips: [] };
}
