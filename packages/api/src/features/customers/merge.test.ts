import { beforeAll, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { CustomerDto, ListedCustomer, PastJobDto } from '@driprail/shared/contracts/customers.contract';
import type { MergePreview, PairedCustomer } from '@driprail/shared/contracts/customers-merge.contract';
import { select } from '../../db/sequelize.ts';
import { createJob } from '../booking/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let desk: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  desk = await company.dispatcher();
});

const add = async (more: object): Promise<CustomerDto> =>
  (
    (
      await desk
        .post('/api/customers')
        .send({ ...aCustomer('x'), phone: '', vehicles: [], ...more })
        .expect(200)
    ).body as {
      customer: CustomerDto;
    }
  ).customer;
const bookFor = (customer: CustomerDto) =>
  createJob(company.ctx, {
    ...{ customerId: customer.id, addressId: first(customer.addresses).id, windowFrom: null, windowTo: null },
    ...{ notes: 'Ask for Ada', discountCents: 0, discountReason: '' },
    lines: [{ serviceId: company.wash.id, vehicleId: customer.vehicles[0]?.id ?? null, sizeClass: 'sedan' }],
  });
const preview = async (stays: CustomerDto, goes: CustomerDto) =>
  (await desk.get(`/api/customers/${stays.id}/merge/${goes.id}`).expect(200)).body as MergePreview;
const merge = (stays: CustomerDto, goes: CustomerDto, more: object = {}) =>
  desk
    .post(`/api/customers/${stays.id}/merge`)
    .send({ goesId: goes.id, version: stays.version, goesVersion: goes.version, ...more });
const record = async (id: string) =>
  (await desk.get(`/api/customers/${id}`).expect(200)).body as {
    customer: CustomerDto;
    mergedName: string | null;
    history: PastJobDto[];
  };

describe('likely duplicates', () => {
  const pairs = async () => {
    const { body } = (await desk.get('/api/customer-duplicates').expect(200)) as {
      body: { pairs: { one: PairedCustomer; other: PairedCustomer; why: string[] }[] };
    };
    return body.pairs.map(({ one, other, why }) => [[one.name, other.name].sort().join(' and '), ...why]);
  };

  test('are listed until somebody says that they are two', async () => {
    const one = await add({ name: 'Tove Achterberg', phone: '555-555-0150' });
    const other = await add({ name: 'T. Achterberg', phone: '+1 555 555 0150' });
    await add({
      name: 'Somebody Else',
      phone: '555-555-0151',
      addresses: [{ ...first(aCustomer('x').addresses), line: '2 Elsewhere' }],
    });
    expect(await pairs()).toEqual([['T. Achterberg and Tove Achterberg', 'phone', 'name']]);
    for (const ids of [
      [one.id, other.id],
      [other.id, one.id],
    ])
      await desk.post('/api/customer-duplicates/apart').send({ ids }).expect(200);
    expect(await pairs()).toEqual([]);
  });

  test('a technician sees none', async () => {
    await (await company.sefa()).get('/api/customer-duplicates').expect(403);
  });
});

describe('a merge', () => {
  test('says what moves, moves it, and the old address and words lead to the record that stays', async () => {
    const text = (isGiven: boolean) => [{ channel: 'text', isGiven, on: '2026-05-01', how: 'By phone' }];
    const stays = await add({ name: 'Rhona Galloway', phone: '555-0160', consents: text(true) });
    const goes = await add({
      ...{
        name: 'R. Galloway',
        phone: '555-0161',
        email: 'rhona@quay.example',
        notes: 'No wax.',
        consents: text(false),
      },
      ...{
        addresses: [{ ...first(aCustomer('x').addresses), line: '9 Mill Reach' }],
        vehicles: aCustomer('x').vehicles,
      },
      preferredCrew: [company.people.idris.id],
    });
    const job = await bookFor(goes);
    const shown = await preview(stays, goes);
    expect(shown.moves).toEqual({ addresses: 1, vehicles: 1, jobs: 1, photos: 0 });
    expect(shown.words.join(' ')).toContain('555-0161 goes into the notes; 555-0160 stays');
    await merge(stays, goes).expect(200);

    const { customer, history, mergedName } = await record(goes.id);
    expect([customer.id, mergedName]).toEqual([stays.id, 'R. Galloway']);
    expect(customer.addresses.map(({ line }) => line)).toEqual(['14 Saltpan Lane', '9 Mill Reach']);
    expect(customer).toMatchObject({ name: 'Rhona Galloway', phone: '555-0160', email: 'rhona@quay.example' });
    expect(customer.notes).toBe('No wax.\nAlso known: R. Galloway, 555-0161.');
    expect(customer.preferredCrew).toEqual([company.people.idris.id]);
    expect(customer.consents).toMatchObject([{ channel: 'text', isGiven: false }]);
    expect(history.map(({ jobId }) => jobId)).toEqual([job.id]);
    const found = (await desk.get('/api/customers?find=5550161').expect(200)).body as { customers: ListedCustomer[] };
    expect(found.customers.map(({ id }) => id)).toEqual([stays.id]);
    const audit = await select<{ action: string }>(
      `SELECT action FROM audit_entries WHERE entity_id IN (:ids) AND action <> 'added' ORDER BY id`,
      { ids: [stays.id, goes.id] },
    );
    expect(audit.map(({ action }) => action)).toEqual(['took in another record', 'merged']);
  });

  test('of three in a row leads the first to the last', async () => {
    const [a, b, c] = await Promise.all(['A Chain', 'B Chain', 'C Chain'].map((name) => add({ name })));
    if (!a || !b || !c) throw new Error('three were made');
    await merge(b, a).expect(200);
    await merge(c, { ...b, version: 1 }).expect(200);
    expect((await record(a.id)).customer.id).toBe(c.id);
  });

  test('of what was changed meanwhile, with itself, or again is refused, and nothing moves', async () => {
    const [stays, goes] = await Promise.all([add({ name: 'Stays Here' }), add({ name: 'Goes There' })]);
    await merge(stays, goes, { goesVersion: 7 }).expect(409);
    await merge(stays, stays).expect(422);
    expect((await record(goes.id)).customer.id).toBe(goes.id);
    const twice = await Promise.all([merge(stays, goes), merge(stays, goes), merge(goes, stays)]);
    expect(twice.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });

  test('with more notes than fit says what to shorten', async () => {
    const notes = 'x'.repeat(6_000);
    const [stays, goes] = await Promise.all([
      add({ name: 'Long One', notes: `a${notes}` }),
      add({ name: 'Long Two', notes }),
    ]);
    expect((await preview(stays, goes)).problems).toHaveLength(1);
    const { body } = (await merge(stays, goes).expect(422)) as { body: { error: { message: string } } };
    expect(body.error.message).toContain('Shorten one of them first');
    expect((await record(goes.id)).customer.notes).toHaveLength(6_000);
  });
});

test('every table that names a customer has its place in a merge', async () => {
  const rows = await select<{ at: string }>(
    `SELECT conrelid::regclass || '.' || a.attname AS at FROM pg_constraint c
       JOIN pg_attribute a ON a.attrelid = c.conrelid AND a.attnum = c.conkey[1]
      WHERE c.contype = 'f' AND c.confrelid = 'customers'::regclass ORDER BY 1`,
  );
  // An invoice stays as it was issued, and its customer leads to the record that stays. All else moves, or is about one record alone.
  expect(rows.map(({ at }) => at)).toEqual([
    'addresses.customer_id',
    'customer_consents.customer_id',
    'customer_crew.customer_id',
    'customer_words.customer_id',
    'customers.merged_into',
    'customers_apart.customer_id',
    'customers_apart.other_id',
    'enquiries.customer_id',
    'invoices.customer_id',
    'jobs.customer_id',
    'mail_bounces.customer_id',
    'message_stops.customer_id',
    'messages.customer_id',
    'vehicles.customer_id',
  ]);
});
