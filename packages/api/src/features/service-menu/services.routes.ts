import * as checklists from '@driprail/shared/contracts/checklist.contract';
import * as api from '@driprail/shared/contracts/services.contract';
import { todayOf } from '../../db/company.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { readChecklist } from './checklists.queries.ts';
import { saveChecklist } from './checklists.service.ts';
import { listServices } from './services.queries.ts';
import { createService, setServicePrices, updateService } from './services.service.ts';
import { setSurcharge, surchargesOfDay } from './surcharges.service.ts';

export function servicesRoutes(table: RouteTable): void {
  route(table, api.listServices, async ({ query }, { now }) => {
    const day = query.on ?? (await todayOf(now()));
    return { services: await listServices(day), surcharges: await surchargesOfDay(day) };
  });
  route(table, api.setSurcharge, async ({ body }, ctx) => {
    await setSurcharge(ctx, body);
    return okay;
  });
  route(table, api.createService, async ({ body }, ctx) => ({ service: await createService(ctx, body) }));
  route(table, api.updateService, async ({ params, body }, ctx) => ({
    service: await updateService(ctx, params.id, body),
  }));
  route(table, api.setServicePrices, async ({ params, body }, ctx) => ({
    service: await setServicePrices(ctx, params.id, body.startsOn, body.prices),
  }));
  route(table, checklists.getChecklist, async ({ params }) => ({ checklist: await readChecklist(params.id) }));
  route(table, checklists.putChecklist, async ({ params, body }, ctx) => ({
    checklist: await saveChecklist(ctx, params.id, body),
  }));
}
