import * as api from '@driprail/shared/contracts/clock.contract';
import * as hours from '@driprail/shared/contracts/hours.contract';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { clockOfPerson, listEntries } from './clock.queries.ts';
import { addEntry, correctEntry, pressClock } from './clock.service.ts';
import { readHoursWords, sayHours } from './hours-words.service.ts';
import { askChange, decideChange, readRequests } from './requests.service.ts';

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
  route(table, hours.listClockRequests, async (_input, ctx) => ({ requests: await readRequests(ctx) }));
  route(table, hours.askClockChange, async ({ body }, ctx) => ({ request: await askChange(ctx, body) }));
  route(table, hours.decideClockChange, async ({ params, body }, ctx) => ({
    request: await decideChange(ctx, params.id, body.isAgreed, body.answer),
  }));
  route(table, hours.listHoursWords, ({ params }, ctx) => readHoursWords(ctx, params.startsOn));
  route(table, hours.sayHours, async ({ params, body }, ctx) => {
    await sayHours(ctx, params.startsOn, ctx.actor.personId, body);
    return okay;
  });
  route(table, hours.confirmHours, async ({ params, body }, ctx) => {
    await sayHours(ctx, params.startsOn, params.personId, { isRight: true, note: body.note });
    return okay;
  });
}
