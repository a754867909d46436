import * as api from '@driprail/shared/contracts/job-work.contract';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { answerChange, changeJob } from './changes.service.ts';
import { readDayWork, readOpenWork, readVisitWork } from './job-work.queries.ts';
import { actAtWork } from './work.service.ts';

export function jobWorkRoutes(table: RouteTable): void {
  route(table, api.getDayWork, ({ params }, ctx) => readDayWork(ctx, params.day));
  route(table, api.getVisitWork, async ({ params }, ctx) => ({ work: await readVisitWork(ctx, params.id) }));
  route(table, api.postWorkAction, ({ params, body }, ctx) => actAtWork(ctx, params.id, body));
  route(table, api.postJobChange, ({ params, body }, ctx) => changeJob(ctx, params.id, body));
  route(table, api.answerJobChange, async ({ params, body }, ctx) => {
    await answerChange(ctx, params.id, body);
    return okay;
  });
  route(table, api.getOpenWork, () => readOpenWork());
}
