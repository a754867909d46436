import * as api from '@driprail/shared/contracts/handover.contract';
import { tag } from '@driprail/shared/authz/ability';
import { authorize } from '../../../authz/authorize.ts';
import type { Ctx } from '../../../http/context.ts';
import type { RouteTable } from '../../../http/route.ts';
import { okay, route } from '../../../http/route.ts';
import { linesCsv } from '../export.ts';
import { handoverZip } from './handover-zip.ts';
import { hoursCsv } from './hours-csv.ts';
import { kindsCsv } from './kinds-csv.ts';
import { hoursBefore, jobNumbersOf, weekToHandOver, weeksOfPayday, type LockedWeek } from './locked-weeks.queries.ts';
import { listPaydayPeople, listPaydays, listWaitingWeeks, onePayday } from './paydays.queries.ts';
import { personZip } from './person-zip.ts';
import { changePayday, handOverPayday, makePayday, removePayday } from './paydays.service.ts';

/** Paydays, and the files that go to the payroll processor. */
export function handoverRoutes(table: RouteTable): void {
  route(table, api.listPaydays, async (_input, { ability }) => {
    authorize(ability, 'read', 'Payday');
    return { waiting: await listWaitingWeeks(), paydays: await listPaydays() };
  });
  route(table, api.getPayday, async ({ params: { id } }, { ability }) => {
    authorize(ability, 'read', tag('Payday', { id }));
    return { payday: await onePayday(id), people: await listPaydayPeople(id) };
  });
  route(table, api.makePayday, async ({ body }, ctx) => ({ payday: await makePayday(ctx, body) }));
  route(table, api.changePayday, async ({ params, body: { version, ...fields } }, ctx) => ({
    payday: await changePayday(ctx, params.id, fields, version),
  }));
  route(table, api.removePayday, async ({ params, query }, ctx) => {
    await removePayday(ctx, params.id, query.version);
    return okay;
  });
  route(table, api.handOverPayday, async ({ params, body }, ctx) => ({
    payday: await handOverPayday(ctx, params.id, body.version),
  }));

  const week = async (ctx: Ctx, day: string): Promise<LockedWeek[]> => [await weekToHandOver(ctx, day)];
  const kinds = async (weeks: LockedWeek[]) => kindsCsv(weeks, await hoursBefore(weeks));
  const hours = async (weeks: LockedWeek[]) => hoursCsv(weeks, await jobNumbersOf(weeks));
  route(table, api.exportPaydayKinds, async ({ params }, ctx) => kinds(await weeksOfPayday(ctx, params.id)));
  route(table, api.exportPaydayLines, async ({ params }, ctx) => linesCsv(await weeksOfPayday(ctx, params.id)));
  route(table, api.exportPaydayHours, async ({ params }, ctx) => hours(await weeksOfPayday(ctx, params.id)));
  route(table, api.exportPaydayAll, async ({ params }, ctx) => handoverZip(ctx, await weeksOfPayday(ctx, params.id)));
  route(table, api.exportWeekKinds, async ({ params }, ctx) => kinds(await week(ctx, params.startsOn)));
  route(table, api.exportWeekHours, async ({ params }, ctx) => hours(await week(ctx, params.startsOn)));
  route(table, api.exportWeekAll, async ({ params }, ctx) => handoverZip(ctx, await week(ctx, params.startsOn)));
  route(table, api.exportPersonPay, ({ params }, ctx) => personZip(ctx, params.personId));
}
