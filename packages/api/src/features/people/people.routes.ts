import * as api from '@driprail/shared/contracts/people.contract';
import { todayOf } from '../../db/company.ts';
import { Van } from '../../db/models/index.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { setVanCrew } from './crews.service.ts';
import { listPeople } from './people.queries.ts';
import { addTimeOff, createPerson, removeTimeOff, updatePerson } from './people.service.ts';
import { createVan, toVanDto, updateVan } from './vans.service.ts';

export function peopleRoutes(table: RouteTable): void {
  route(table, api.listPeople, async (_input, { now }) => ({ people: await listPeople(await todayOf(now())) }));
  route(table, api.createPerson, async ({ body }, ctx) => ({ person: await createPerson(ctx, body) }));
  route(table, api.updatePerson, async ({ params, body }, ctx) => ({
    person: await updatePerson(ctx, params.id, body),
  }));
  route(table, api.addTimeOff, async ({ params, body }, ctx) => ({ person: await addTimeOff(ctx, params.id, body) }));
  route(table, api.removeTimeOff, async ({ params }, ctx) => {
    await removeTimeOff(ctx, params.id);
    return okay;
  });
  route(table, api.listVans, async () => ({
    vans: (
      await Van.findAll({
        order: [
          ['isActive', 'DESC'],
          ['position', 'ASC'],
          ['name', 'ASC'],
        ],
      })
    ).map(toVanDto),
  }));
  route(table, api.createVan, async ({ body }, ctx) => ({ van: await createVan(ctx, body) }));
  route(table, api.updateVan, async ({ params, body }, ctx) => ({ van: await updateVan(ctx, params.id, body) }));
  route(table, api.setVanCrew, async ({ params, body }, ctx) => ({
    crew: await setVanCrew(ctx, params.id, params.day, body.members),
  }));
}
