import type { Request } from 'express';
import * as api from '@driprail/shared/contracts/billing.contract';
import { countCash, getCash } from '@driprail/shared/contracts/cash.contract';
import { exportMoneyDay, getMoneyDay } from '@driprail/shared/contracts/money-day.contract';
import { addTaxRate, listTaxRates } from '@driprail/shared/contracts/taxes.contract';
import { inTransaction } from '../../db/sequelize.ts';
import { badRequest } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, publicRoute, route } from '../../http/route.ts';
import { PaymentSignatureError } from '../../integrations/payments/index.ts';
import type { PaymentEvent, Payments } from '../../integrations/payments/index.ts';
import { authorizeBill } from './bill-access.ts';
import { readBill } from './bill.presenter.ts';
import type { BillingParts } from './billing-parts.ts';
import { readCounts, readHolders } from './cash.queries.ts';
import * as cash from './cash.service.ts';
import { customerPageRoutes } from './customer-page.routes.ts';
import { readDayBills } from './day-bills.queries.ts';
import { readInvoicePdf } from './invoice-pdf.ts';
import { billFee } from './fees.service.ts';
import { moneyHeld } from './held.queries.ts';
import { findInvoices } from './invoices.queries.ts';
import { issueInvoice } from './issue-invoice.service.ts';
import { moneyDayCsv } from './money-day-csv.ts';
import { readMoneyDay } from './money-day.queries.ts';
import { takeEvent } from './payment-events.service.ts';
import { recordPayment } from './payments.service.ts';
import { creditBill, refundPayment } from './refunds.service.ts';
import * as taxes from './taxes.service.ts';

export function billingRoutes(table: RouteTable, parts: BillingParts): void {
  const { payments, links, baseUrlOf } = parts;
  route(table, api.getBill, async ({ params }, ctx) => {
    await authorizeBill(ctx, 'read', params.id);
    return { bill: await readBill(params.id, ctx.now()) };
  });
  route(table, api.getDayBills, async ({ params }, ctx) => ({ bills: await readDayBills(ctx, params.day) }));
  route(table, api.issueInvoice, async ({ params }, ctx) => {
    await authorizeBill(ctx, 'create', params.id);
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    await inTransaction((tx) => issueInvoice(tx, params.id, by));
    return { bill: await readBill(params.id, ctx.now()) };
  });
  route(table, api.getInvoicePdf, async ({ params }, ctx) => {
    await authorizeBill(ctx, 'read', params.id);
    return readInvoicePdf(params.id, ctx.now());
  });
  route(table, api.billFee, async ({ params, body }, ctx) => {
    await billFee(ctx, params.id, body);
    return { bill: await readBill(params.id, ctx.now()) };
  });
  route(table, api.recordPayment, async ({ params, body }, ctx) => ({
    bill: await recordPayment(ctx, params.id, body),
  }));
  route(table, api.openPayLink, async ({ params }, ctx, { req }) => {
    await authorizeBill(ctx, 'collect', params.id);
    const token = await inTransaction((tx) => links.tokenFor(tx, params.id, ctx.now()));
    return { url: `${baseUrlOf(req)}/c/${token}` };
  });
  route(table, api.refundPayment, async ({ params, body }, ctx) => ({
    bill: await refundPayment(payments, ctx, params.id, body),
  }));
  route(table, api.creditBill, async ({ params, body }, ctx) => ({ bill: await creditBill(ctx, params.id, body) }));
  route(table, api.listHeld, async () => ({ held: await moneyHeld() }));
  route(table, api.listInvoices, ({ query }, ctx) => findInvoices(query, ctx.now()));
  route(table, getCash, readCash);
  route(table, countCash, async ({ body }, ctx) => {
    await cash.countCash(ctx, body);
    return readCash();
  });
  route(table, getMoneyDay, async ({ params }) => ({ close: await readMoneyDay(params.day) }));
  route(table, exportMoneyDay, ({ params }) => moneyDayCsv(params.day));
  route(table, listTaxRates, async () => ({ taxRates: await taxes.listTaxRates() }));
  route(table, addTaxRate, async ({ body }, ctx) => {
    await taxes.addTaxRate(ctx, body);
    return okay;
  });
  publicRoute(table, api.takePaymentEvent, async (_input, now, { req }) => {
    await takeEvent(readSigned(payments, req), now());
    return okay;
  });
  customerPageRoutes(table, parts);
}

/** The body as it came: the signature is over its bytes. @throws 400 for a wrong, missing or stale signature */
function readSigned(payments: Payments, req: Request): PaymentEvent {
  try {
    return payments.readEvent(req.body as Buffer, req.get('stripe-signature'));
  } catch (error) {
    if (error instanceof PaymentSignatureError) throw badRequest('This event is not signed by the payments service.');
    throw error;
  }
}

async function readCash() {
  return { holders: await readHolders(), counts: await readCounts() };
}
