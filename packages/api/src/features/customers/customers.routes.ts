import * as api from '@driprail/shared/contracts/customers.contract';
import { notFound } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { route } from '../../http/route.ts';
import { findCustomer, findCustomers, historyOf } from './customers.queries.ts';
import { createCustomer, updateCustomer } from './customers.service.ts';

export function customersRoutes(table: RouteTable): void {
  route(table, api.listCustomers, ({ query }) => findCustomers(query.find, query.limit));
  route(table, api.getCustomer, async ({ params }) => {
    const customer = await findCustomer(params.id);
    if (!customer) throw notFound('That customer');
    return { customer, history: await historyOf(params.id) };
  });
  route(table, api.createCustomer, async ({ body }, ctx) => ({ customer: await createCustomer(ctx, body) }));
  route(table, api.updateCustomer, async ({ params, body }, ctx) => ({
    customer: await updateCustomer(ctx, params.id, body),
  }));
}
