import { createHash } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { beforeAll, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { CustomerDto, ListedCustomer, PastJobDto } from '@driprail/shared/contracts/customers.contract';
import type { CustomerData, ErasurePreview } from '@driprail/shared/contracts/customers-data.contract';
import { jpegFile } from '@driprail/shared/domain/walk-round/testing/jpeg-file';
import { queueMail } from '../../outbox/mails.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import { createJob } from '../booking/index.ts';
import { sendDueMessages } from '../messages/index.ts';
import { Enquiry } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  [owner, dispatcher] = await Promise.all([company.owner(), company.dispatcher()]);
  await select(`UPDATE services SET photo_set = 'quick'`);
});

/** Words that must be nowhere once the customer is erased. */
const SECRET = 'Quillfeather';
const secrets = {
  ...{
    name: `Ada ${SECRET}`,
    phone: '555-0177',
    email: `${SECRET.toLowerCase()}@mail.example`,
    notes: `${SECRET} note`,
  },
  ...{ mustKnow: `${SECRET} must know`, tags: [`${SECRET} tag`] },
  consents: [{ channel: 'text', isGiven: true, on: '2026-05-01', how: `${SECRET} said so` }],
};
const add = async (more: object = {}): Promise<CustomerDto> => {
  const address = {
    ...first(aCustomer('x').addresses),
    line: `9 ${SECRET} Row`,
    gateCode: SECRET,
    accessNotes: SECRET,
  };
  const vehicle = {
    ...first(aCustomer('x').vehicles),
    plate: SECRET,
    vin: `${SECRET}VIN`,
    paint: SECRET,
    notes: SECRET,
  };
  const place = { ownerConsentBy: SECRET, ownerConsentOn: '2026-05-01', permitNumber: SECRET };
  const body = { ...aCustomer('x'), ...secrets, addresses: [{ ...address, ...place }], vehicles: [vehicle], ...more };
  return ((await owner.post('/api/customers').send(body).expect(200)).body as { customer: CustomerDto }).customer;
};
const book = (customer: CustomerDto) =>
  createJob(company.ctx, {
    ...{ customerId: customer.id, addressId: first(customer.addresses).id, windowFrom: null, windowTo: null },
    ...{ notes: `${SECRET} on the job`, discountCents: 0, discountReason: '' },
    lines: [{ serviceId: company.wash.id, vehicleId: first(customer.vehicles).id, sizeClass: 'sedan' }],
  });
const erase = (customer: CustomerDto, more: object = {}, agent = owner) =>
  agent.post(`/api/customers/${customer.id}/erasure`).send({ version: customer.version, name: customer.name, ...more });
const preview = async (customer: CustomerDto) =>
  (await owner.get(`/api/customers/${customer.id}/erasure`).expect(200)).body as ErasurePreview;
const record = async (id: string) =>
  (await owner.get(`/api/customers/${id}`).expect(200)).body as {
    customer: CustomerDto;
    erasedAt: string | null;
    history: PastJobDto[];
  };
const message = (answer: { body: unknown }) => (answer.body as { error: { message: string } }).error.message;

/** A visit that was worked, with a walk-round signed and a photo stored. */
async function worked(customer: CustomerDto) {
  const job = await book(customer);
  const visit = first(job.visits);
  const move = {
    visitId: visit.id,
    planVersion: 0,
    vanId: company.vans.gannet.id,
    from: app.time.now,
    to: '2026-05-14T16:30:00.000Z',
  };
  await dispatcher
    .post('/api/board/moves')
    .send({ moves: [move] })
    .expect(200);
  const sefa = await company.sefa();
  const press = (kind: string, more: object = {}) =>
    sefa
      .post(`/api/visits/${visit.id}/actions`)
      .send({ key: uuid(), kind, deviceAt: app.time.now, ...more })
      .expect(200);
  for (const kind of ['set_off', 'arrive']) await press(kind);
  const photo = jpegFile({ width: 40, height: 30 });
  const sha256 = createHash('sha256').update(photo).digest('hex');
  const body = {
    key: uuid(),
    deviceAt: app.time.now,
    vehicleId: first(customer.vehicles).id,
    view: 'front',
    moment: 'before',
  };
  await sefa
    .post(`/api/visits/${visit.id}/photos`)
    .send({ ...body, bytes: photo.length, sha256 })
    .expect(200);
  await sefa
    .put(`/api/photos/${body.key}/bytes?offset=0`)
    .set('content-type', 'application/octet-stream')
    .send(Buffer.from(photo))
    .expect(200);
  await select(
    `INSERT INTO walk_rounds (id, visit_id, vehicle_id, body, initials, items_note, user_id, device_at, received_at, occurred_at)
     VALUES (:id, :visitId, :vehicleId, 'hatchback', '[[[0,0]]]', :note, :userId, :at, :at, :at)`,
    {
      ...{ id: uuid(), visitId: visit.id, vehicleId: first(customer.vehicles).id },
      ...{ note: SECRET, userId: company.ctx.actor.userId, at: app.time.now },
    },
  );
  const at = app.time.now;
  await select(`UPDATE visits SET progress = 'done', progress_since = :at WHERE id = :id`, { id: visit.id, at });
  await select(`UPDATE job_lines SET finished_visit_id = :id, finished_at = :at WHERE job_id = :jobId`, {
    ...{ id: visit.id, jobId: job.id, at },
  });
  return { job, photoId: body.key };
}

/** Every column of words in the database that still says it, but for the trail of requests. */
async function whereItStands(): Promise<string[]> {
  const columns = await select<{ at: string; sql: string }>(
    `SELECT table_name || '.' || column_name AS at,
            format('SELECT %L AS at FROM %I WHERE %I::text ILIKE %L LIMIT 1', table_name || '.' || column_name, table_name, column_name, '%${SECRET}%') AS sql
       FROM information_schema.columns JOIN information_schema.tables USING (table_schema, table_name)
      WHERE table_schema = 'public' AND table_type = 'BASE TABLE' AND data_type IN ('text', 'jsonb', 'json', 'character varying', 'ARRAY')
        AND table_name <> 'schema_migrations'`,
  );
  const found = await select<{ at: string }>(columns.map(({ sql }) => `(${sql})`).join(' UNION ALL '));
  return found.map(({ at }) => at).sort();
}

describe('an erasure', () => {
  test('leaves the name nowhere, and keeps jobs and money', async () => {
    app.time.now = '2026-05-14T15:00:00.000Z';
    const twin = await add({ name: `Also ${SECRET}`, vehicles: [] });
    const fresh = await add();
    await owner
      .post(`/api/customers/${fresh.id}/merge`)
      .send({ goesId: twin.id, version: fresh.version, goesVersion: twin.version })
      .expect(200);
    const { customer } = await record(fresh.id);
    const { job, photoId } = await worked(customer);
    expect((await record(customer.id)).history).toMatchObject([
      { jobId: job.id, photoCount: 1, photos: [{ id: photoId, moment: 'before' }], progress: 'done' },
    ]);
    await owner.post(`/api/jobs/${job.id}/invoice`).send({}).expect(200);
    await inTransaction((tx) =>
      queueMail(tx, new Date(app.time.now), { to: secrets.email, subject: SECRET, body: SECRET }),
    );
    // What was written to the customer, with words and address, and what came back.
    const afterUndo = new Date(Date.parse(app.time.now) + 600_000);
    expect(await sendDueMessages(app.deliveries, () => afterUndo)).toBeGreaterThan(0);
    await Enquiry.create({
      ...{ id: uuid(), customerId: fresh.id, sender: SECRET, body: SECRET, providerKey: 'reply-1' },
      receivedAt: afterUndo,
    });
    const photos = async () =>
      (await readdir(join(app.dataDir, 'photos'), { recursive: true })).filter((name) => name.includes(photoId));
    expect(await photos()).toHaveLength(1);
    expect(await whereItStands()).toContain('customers.name');
    expect(await preview(customer)).toMatchObject({
      nameAfter: 'Customer erased May 14, 2026',
      goes: { addresses: 2, vehicles: 1, photos: 1 },
      stays: { jobs: 1 },
      hindrance: null,
    });

    await erase(customer).expect(200);
    expect(await whereItStands()).toEqual([]);
    expect(await photos()).toEqual([]);
    await owner.get(`/api/photos/${photoId}`).expect(404);
    const after = await record(customer.id);
    expect(after.customer).toMatchObject({
      name: 'Customer erased May 14, 2026',
      phone: '',
      addresses: [],
      vehicles: [],
    });
    expect(after.history).toMatchObject([{ jobNumber: job.number, totalCents: job.totalCents, photoCount: 0 }]);
    const { body } = (await owner.get('/api/customers?find=erased').expect(200)) as {
      body: { customers: ListedCustomer[] };
    };
    expect(body.customers).toEqual([]);
    expect(
      await select(`SELECT action FROM audit_entries WHERE entity_id = :id AND action = 'erased'`, { id: customer.id }),
    ).toHaveLength(1);
    expect(message(await erase(after.customer).expect(409))).toContain('was erased');
    await owner
      .put(`/api/customers/${customer.id}`)
      .send({ ...aCustomer('x'), version: after.customer.version })
      .expect(409);
  });

  test('waits while work is open, and says which', async () => {
    const customer = await add({ name: 'Still Waiting' });
    const job = await book(customer);
    const sentence = `Job ${job.number} is still to be done. Finish or call off what is open first, then erase.`;
    expect((await preview(customer)).hindrance).toBe(sentence);
    expect(message(await erase(customer).expect(422))).toBe(sentence);
    expect((await record(customer.id)).erasedAt).toBeNull();
  });

  test('is the owner’s alone, asks for the name once more, and for what was last seen', async () => {
    const customer = await add({ name: 'Máire Typed' });
    await erase(customer, {}, dispatcher).expect(403);
    await dispatcher.get(`/api/customers/${customer.id}/erasure`).expect(403);
    expect(message(await erase(customer, { name: 'Somebody' }).expect(422))).toContain('Type the name');
    await erase(customer, { version: 9 }).expect(409);
    await erase(customer, { name: ' maire typed ' }).expect(200);
  });

  test('of two at once is done once, and no booking slips in after it', async () => {
    const customer = await add({ name: 'Twice Pressed' });
    const answers = await Promise.all([erase(customer), erase(customer)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    await expect(book(customer)).rejects.toThrow(/was erased/);
  });
});

describe('a copy of the data', () => {
  test('holds all that is kept of the customer, and nothing of who works here', async () => {
    const customer = await add({ name: 'Copy Please', preferredCrew: [company.people.idris.id] });
    const job = await book(customer);
    const answer = await dispatcher.get(`/api/customers/${customer.id}/data`).expect(200);
    expect(answer.headers['content-disposition']).toContain('customer-data.json');
    const data = answer.body as CustomerData;
    expect(data.customer).toMatchObject({ name: 'Copy Please', phone: '555-0177' });
    expect(data.addresses).toMatchObject([{ gateCode: SECRET, isKept: true }]);
    expect(data.consents).toMatchObject([{ channel: 'text', how: `${SECRET} said so` }]);
    expect(data.jobs).toMatchObject([{ number: job.number, lines: [{ service: 'Wash and wax', priceCents: 24_000 }] }]);
    expect(JSON.stringify(data)).not.toMatch(/Idris|Sefa/);
    await (await company.sefa()).get(`/api/customers/${customer.id}/data`).expect(403);
  });
});
