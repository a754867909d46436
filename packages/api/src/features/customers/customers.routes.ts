import * as api from '@driprail/shared/contracts/customers.contract';
import * as data from '@driprail/shared/contracts/customers-data.contract';
import * as merge from '@driprail/shared/contracts/customers-merge.contract';
import { notFound } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import type { Geocoder } from '../../integrations/maps/index.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import { findCustomer, findCustomers, leadingTo, vehicleWords } from './customers.queries.ts';
import { createCustomer, updateCustomer } from './customers.service.ts';
import { readCustomerData } from './data.queries.ts';
import { findDuplicates } from './duplicates.queries.ts';
import { eraseCustomer, previewErasure } from './erasure.service.ts';
import { customerSince, historyOf } from './history.queries.ts';
import { keepApart } from './keep-apart.service.ts';
import { mergeCustomers, previewOf } from './merge.service.ts';
import { placeOf } from './places.queries.ts';

interface CustomerParts {
  geocoder: Geocoder | null;
  store: FileStore;
}

export function customersRoutes(table: RouteTable, { geocoder, store }: CustomerParts): void {
  route(table, api.listCustomers, ({ query }) => findCustomers(query));
  route(table, api.getVehicleWords, () => vehicleWords());
  route(table, api.findPlace, ({ body }) => placeOf(geocoder, body));
  route(table, api.getCustomer, async ({ params }) => {
    const found = await leadingTo(params.id);
    const customer = found && (await findCustomer(found.id));
    if (!customer) throw notFound('That customer');
    const [since, history] = await Promise.all([customerSince(customer.id), historyOf(customer.id)]);
    const { mergedName, erasedAt } = found;
    return { customer, mergedName, erasedAt, since, history };
  });
  route(table, api.createCustomer, async ({ body }, ctx) => ({ customer: await createCustomer(ctx, body) }));
  route(table, api.updateCustomer, async ({ params, body }, ctx) => ({
    customer: await updateCustomer(ctx, params.id, body),
  }));
  route(table, merge.listDuplicates, async () => ({ pairs: await findDuplicates() }));
  route(table, merge.keepApart, async ({ body }, ctx) => {
    await keepApart(ctx, body.ids);
    return okay;
  });
  route(table, merge.previewMerge, ({ params }) => previewOf(params.id, params.goesId));
  route(table, merge.mergeCustomers, ({ params, body }, ctx) => mergeCustomers(ctx, params.id, body));
  route(table, data.getCustomerData, async ({ params }, ctx, { res }) => {
    const copy = await readCustomerData(ctx, params.id);
    res.setHeader('content-disposition', 'attachment; filename="customer-data.json"');
    res.setHeader('cache-control', 'private, no-store');
    return copy;
  });
  route(table, data.previewErasure, ({ params }, ctx) => previewErasure(ctx, params.id));
  route(table, data.eraseCustomer, async ({ params, body }, ctx) => {
    await eraseCustomer(ctx, store, params.id, body);
    return okay;
  });
}
