import * as api from '@driprail/shared/contracts/clock.contract';
import type { RouteTable } from '../../http/route.ts';
import { route } from '../../http/route.ts';
import { clockOfPerson, listEntries } from './clock.queries.ts';
import { addEntry, correctEntry, pressClock } from './clock.service.ts';

export function clockRoutes(table: RouteTable): void {
  route(table, api.getClock, async (_input, { actor, now }) => ({
    clock: actor.personId ? await clockOfPerson(actor.personId, now()) : null,
  }));
  route(table, api.postClockAction, ({ body }, ctx) => pressClock(ctx, body));
  route(table, api.listClock, async ({ query }, { now }) => ({
    entries: await listEntries(query.from, query.to, now(), query.personId ?? null),
  }));
  route(table, api.addClockEntry, async ({ body }, ctx) => ({ entry: await addEntry(ctx, body) }));
  route(table, api.correctClockEntry, async ({ params, body }, ctx) => ({
    entry: await correctEntry(ctx, params.id, body),
  }));
}
