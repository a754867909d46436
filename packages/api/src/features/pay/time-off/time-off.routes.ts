import * as api from '@driprail/shared/contracts/time-off.contract';
import type { RouteTable } from '../../../http/route.ts';
import { route } from '../../../http/route.ts';
import { adjustTimeOff } from './adjust.service.ts';
import { readBalances } from './balances.queries.ts';
import { quoteTimeOff } from './quote.queries.ts';
import { readWeekTimeOff } from './week-time-off.queries.ts';
import { takeTimeOff } from './take.service.ts';
import { addShowUpRule, addTimeOffRule, listShowUpRules, listTimeOffRules } from './time-off-rules.service.ts';

export function timeOffRoutes(table: RouteTable): void {
  route(table, api.listTimeOffRules, async () => ({
    timeOff: await listTimeOffRules(),
    showUp: await listShowUpRules(),
  }));
  route(table, api.addTimeOffRule, async ({ body }, ctx) => ({ rule: await addTimeOffRule(ctx, body) }));
  route(table, api.addShowUpRule, async ({ body }, ctx) => ({ rule: await addShowUpRule(ctx, body) }));
  route(table, api.getTimeOffBalances, ({ params }, ctx) => readBalances(ctx, params.personId));
  route(table, api.adjustTimeOff, ({ body }, ctx) => adjustTimeOff(ctx, body));
  route(table, api.getWeekTimeOff, async ({ params }, { now }) => ({
    timeOff: await readWeekTimeOff(params.startsOn, params.personId, now()),
  }));
  route(table, api.quoteTimeOff, ({ params, query }) => quoteTimeOff(params.startsOn, query));
  route(table, api.takeTimeOff, ({ params, body }, ctx) => takeTimeOff(ctx, params.startsOn, body));
}
