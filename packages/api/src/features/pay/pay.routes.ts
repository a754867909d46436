import type { Request } from 'express';
import * as api from '@driprail/shared/contracts/pay.contract';
import * as agreements from '@driprail/shared/contracts/pay-agreements.contract';
import * as jobsPaid from '@driprail/shared/contracts/jobs-paid.contract';
import { getPayDifference, listLateWeeks } from '@driprail/shared/contracts/pay-difference.contract';
import * as rates from '@driprail/shared/contracts/pay-rates.contract';
import * as plans from '@driprail/shared/contracts/pay-plans.contract';
import { OVERTIME_RULE_SETS } from '@driprail/shared/domain/pay/overtime-rule-sets';
import { companyOf, todayOf } from '../../db/company.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { addAdjustment, removeAdjustment } from './adjustments.service.ts';
import { addAgreement, listAgreements } from './agreements/agreements.service.ts';
import { addRefundReason, listRefundReasons } from './agreements/refund-reasons.service.ts';
import { testCommission } from './commission-test.queries.ts';
import { jobsPaidLately, jobsWaiting } from './deferred/jobs-paid.queries.ts';
import { markJobPaid, takeBackJobPaid } from './deferred/jobs-paid.service.ts';
import { linesCsv } from './export.ts';
import { handoverRoutes } from './handover/handover.routes.ts';
import { readDifference } from './difference.queries.ts';
import { lateWeeks } from './late-weeks.queries.ts';
import { setWeekState } from './lock.service.ts';
import { readPayWeek } from './pay-week.queries.ts';
import { addPlace, addWage, listPersonPlaces, listPlaces, placePerson } from './places.service.ts';
import { addPlan, listPlans } from './plans.service.ts';
import { addRate, addRules, listRates, listRules } from './rates.service.ts';
import { statementPdf } from './statement-pdf.ts';
import { listStatements, readStatement } from './statements.queries.ts';
import { readWeekSoFar } from './week-so-far.queries.ts';
import { tryWeeks } from './what-if.queries.ts';
import { listWeeks } from './week-figures.queries.ts';
import { timeOffRoutes } from './time-off/time-off.routes.ts';
import { weekAt } from './weeks.service.ts';

export interface PayOptions {
  baseUrlOf: (req: Request) => string;
}

export function payRoutes(table: RouteTable, { baseUrlOf }: PayOptions): void {
  const read = (day: string, now: Date, parts: { withTimeOff?: boolean } = {}) =>
    inTransaction(async (tx) => readPayWeek(await weekAt(day, tx), now, tx, parts));

  route(table, rates.listRates, async () => ({ rates: await listRates() }));
  route(table, rates.addRate, async ({ body }, ctx) => ({ rate: await addRate(ctx, body) }));
  route(table, rates.listPayRules, async () => ({ rules: await listRules() }));
  route(table, rates.addPayRules, async ({ body }, ctx) => ({ rules: await addRules(ctx, body) }));
  route(table, plans.listPayPlans, async () => ({ plans: await listPlans() }));
  route(table, plans.addPayPlan, async ({ body }, ctx) => ({ plan: await addPlan(ctx, body) }));
  route(table, plans.listRuleSets, () => Promise.resolve({ ruleSets: [...OVERTIME_RULE_SETS] }));
  route(table, plans.listPayPlaces, async () => ({ places: await listPlaces(), people: await listPersonPlaces() }));
  route(table, plans.addPayPlace, async ({ body }, ctx) => ({ place: await addPlace(ctx, body) }));
  route(table, plans.addPlaceWage, async ({ params, body }, ctx) => ({ place: await addWage(ctx, params.id, body) }));
  route(table, plans.setPersonPlace, async ({ body }, ctx) => ({ people: await placePerson(ctx, body) }));
  route(table, plans.getCommissionTest, ({ params }) => testCommission(params.personId));
  route(table, plans.whatIf, async ({ body }, { now }) => ({ weeks: await tryWeeks(body, now()) }));
  route(table, agreements.listAgreements, async () => ({
    agreements: await listAgreements(),
    refundReasons: await listRefundReasons(),
  }));
  route(table, agreements.addAgreement, async ({ body }, ctx) => ({ agreement: await addAgreement(ctx, body) }));
  route(table, agreements.addRefundReason, async ({ body }, ctx) => ({
    refundReason: await addRefundReason(ctx, body),
  }));
  route(table, jobsPaid.listJobsPaid, async () => ({ waiting: await jobsWaiting(), paid: await jobsPaidLately() }));
  route(table, jobsPaid.markJobPaid, async ({ body }, ctx) => {
    await markJobPaid(ctx, body.jobId, body.paidOn);
    return okay;
  });
  route(table, jobsPaid.takeBackJobPaid, async ({ params }, ctx) => {
    await takeBackJobPaid(ctx, params.jobId);
    return okay;
  });
  route(table, api.listPayWeeks, async (_input, { now }) => {
    return { weeks: await listWeeks(await todayOf(now())) };
  });
  route(table, api.getPayWeek, ({ params, query }, { now }) =>
    read(params.startsOn, now(), { withTimeOff: query.timeOff === 'all' }),
  );
  route(table, getPayDifference, ({ params, query }, { now }) => readDifference(params.startsOn, query.against, now()));
  route(table, listLateWeeks, async (_, { now }) => ({ weeks: await lateWeeks(now()) }));
  route(table, api.setPayWeekState, ({ params, body }, ctx, { req }) =>
    setWeekState(ctx, params.startsOn, body.to, body.version, baseUrlOf(req)),
  );
  route(table, api.addAdjustment, ({ params, body }, ctx) => addAdjustment(ctx, params.startsOn, body));
  route(table, api.removeAdjustment, async ({ params }, ctx) => {
    await removeAdjustment(ctx, params.id);
    return okay;
  });
  route(table, api.exportPayWeek, async ({ params }, { now }) => linesCsv([await read(params.startsOn, now())]));
  handoverRoutes(table);
  timeOffRoutes(table);
  route(table, api.getWeekSoFar, (_input, ctx) => readWeekSoFar(ctx));
  route(table, api.listStatements, async (_input, ctx) => ({ statements: await listStatements(ctx) }));
  route(table, api.getStatement, ({ params }, ctx) => readStatement(ctx, params.startsOn, params.personId));
  route(table, api.getStatementPdf, async ({ params }, ctx) => {
    const statement = await readStatement(ctx, params.startsOn, params.personId);
    return statementPdf(statement, (await companyOf()).zone);
  });
}
