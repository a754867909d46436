import { beforeAll, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';

const app = useApp();
let company: TestCompany;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  dispatcher = await company.dispatcher();
});
const jobIn = (body: unknown) => (body as { job: JobDto }).job;
const order = (more: object = {}) => ({
  customerId: company.customer.id,
  addressId: first(company.customer.addresses).id,
  windowFrom: '2026-05-14T09:00:00-04:00',
  windowTo: '2026-05-14T11:00:00-04:00',
  notes: '',
  discountCents: 0,
  discountReason: '',
  lines: [{ serviceId: company.wash.id, vehicleId: first(company.customer.vehicles).id, sizeClass: 'sedan' }],
  ...more,
});
const changeOf = (job: JobDto, more: object) => ({
  ...order(),
  version: job.version,
  lines: job.lines.map(({ id, serviceId, vehicleId, sizeClass, priceCents, minutes }) => ({
    id,
    serviceId,
    vehicleId,
    sizeClass,
    priceCents,
    minutes,
  })),
  ...more,
});

test('a job takes the menu’s price and minutes, gets the next number, and lands on Unplaced', async () => {
  const one = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  const two = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  expect(two.number).toBe(one.number + 1);
  expect(one).toMatchObject({
    totalCents: 24_000,
    windowFrom: '2026-05-14T13:00:00.000Z',
    visits: [{ progress: 'unplaced', minutes: 90, part: 1 }],
  });
});

test('bad input is said at its field', async () => {
  const answer = await dispatcher
    .post('/api/jobs')
    .send(order({ windowTo: '2026-05-14T08:00:00-04:00', discountCents: 500, lines: [] }))
    .expect(400);
  expect((answer.body as { error: { fields: object } }).error.fields).toEqual({
    lines: 'Add at least one service.',
    windowTo: 'The window must end after it starts.',
    discountReason: 'Say why there is a discount.',
  });
  const unsold = await dispatcher
    .post('/api/jobs')
    .send(order({ lines: [{ serviceId: company.wash.id, vehicleId: null, sizeClass: 'van' }] }))
    .expect(422);
  expect(unsold.body).toMatchObject({
    error: { fields: { 'lines.0.serviceId': expect.stringContaining('not on the menu for van') as string } },
  });
  await dispatcher
    .post('/api/jobs')
    .send(order({ discountCents: 24_001, discountReason: 'Regular' }))
    .expect(422);
  await dispatcher
    .post('/api/jobs')
    .send(order({ notes: 'x'.repeat(10_001) }))
    .expect(400);
});

test('a new price on the menu never changes what was quoted', async () => {
  const owner = await company.owner();
  const job = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  const prices = [{ sizeClass: 'sedan', priceCents: 26_000, minutes: 100 }];
  await owner.post(`/api/services/${company.wash.id}/prices`).send({ startsOn: '2026-05-14', prices }).expect(200);
  expect(jobIn((await dispatcher.get(`/api/jobs/${job.id}`)).body).totalCents).toBe(24_000);
  const copy = jobIn((await dispatcher.post(`/api/jobs/${job.id}/copy`).expect(200)).body);
  expect(copy.totalCents).toBe(26_000);
});

test('an edit names the version it saw; what was typed comes back with the newer state', async () => {
  const job = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  const added = jobIn(
    (
      await dispatcher
        .put(`/api/jobs/${job.id}`)
        .send(
          changeOf(job, {
            notes: 'Ring first',
            lines: [
              ...changeOf(job, {}).lines,
              { serviceId: company.wash.id, vehicleId: null, sizeClass: 'sedan', priceCents: 1000, minutes: 30 },
            ],
          }),
        )
        .expect(200)
    ).body,
  );
  expect(added).toMatchObject({ notes: 'Ring first', totalCents: job.totalCents + 1000 });
  expect(added.visits[0]?.lines).toHaveLength(2);
  const stale = await dispatcher.put(`/api/jobs/${job.id}`).send(changeOf(job, {})).expect(409);
  expect(stale.body).toMatchObject({ error: { code: 'stale', hint: { current: { notes: 'Ring first' } } } });
});

test('calling off takes what was not worked off the day, once', async () => {
  const job = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  await dispatcher.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: '' }).expect(400);
  const off = jobIn(
    (
      await dispatcher
        .post(`/api/jobs/${job.id}/call-off`)
        .send({ version: job.version, reason: 'Weather' })
        .expect(200)
    ).body,
  );
  expect(off.visits[0]).toMatchObject({ progress: 'called_off', reason: 'Weather' });
  await dispatcher.post(`/api/jobs/${job.id}/call-off`).send({ version: off.version, reason: 'Weather' }).expect(409);
});

test('a second crew on one job stands at the same parking place', async () => {
  const job = jobIn((await dispatcher.post('/api/jobs').send(order()).expect(200)).body);
  const visit = first(job.visits);
  const more = jobIn(
    (
      await dispatcher
        .post(`/api/jobs/${job.id}/visits`)
        .send({ minutes: 60, lineIds: [], besideVisitId: visit.id })
        .expect(200)
    ).body,
  );
  expect(more.visits.map((v) => [v.part, v.parts, v.stopId === visit.stopId])).toEqual([
    [1, 2, true],
    [2, 2, true],
  ]);
});

test('dispatch gives as large a discount as the owner allows, the owner any', async () => {
  const owner = await company.owner();
  const { settings } = (await owner.get('/api/settings').expect(200)).body as { settings: object };
  await owner
    .put('/api/settings')
    .send({ ...settings, deskDiscountPercent: 10 })
    .expect(200);
  const lines = order().lines.map((line) => ({ ...line, priceCents: 24_000 }));
  const asked = order({ lines, discountCents: 2401, discountReason: 'Regular' });
  const refused = await dispatcher.post('/api/jobs').send(asked).expect(422);
  expect(refused.body).toMatchObject({
    error: { fields: { discountCents: 'At most 24.00 (10 percent) without the owner.' } },
  });
  await dispatcher
    .post('/api/jobs')
    .send({ ...asked, discountCents: 2400 })
    .expect(200);
  const given = jobIn((await owner.post('/api/jobs').send(asked).expect(200)).body);
  // What the owner gave stays when dispatch changes something else.
  const kept = { discountCents: 2401, discountReason: 'Regular' };
  await dispatcher
    .put(`/api/jobs/${given.id}`)
    .send(changeOf(given, { notes: 'Side gate', ...kept }))
    .expect(200);
});

test('a job that is billed takes notes, but neither lines nor another discount', async () => {
  const { job } = await aDoneJob(app, company, await company.owner());
  await dispatcher.post(`/api/jobs/${job.id}/invoice`).expect(200);
  const now = jobIn((await dispatcher.get(`/api/jobs/${job.id}`).expect(200)).body);
  const more = changeOf(now, {}).lines.concat(order().lines as never);
  const refused = await dispatcher
    .put(`/api/jobs/${job.id}`)
    .send(changeOf(now, { lines: more }))
    .expect(422);
  expect(refused.body).toMatchObject({ error: { code: 'billed' } });
  await dispatcher
    .put(`/api/jobs/${job.id}`)
    .send(changeOf(now, { notes: 'Liked the shine' }))
    .expect(200);
});

test('a call-back puts finished lines right for nothing, and nobody is billed for it', async () => {
  const owner = await company.owner();
  const { job } = await aDoneJob(app, company, owner);
  const back = (more: object = {}) =>
    dispatcher.post(`/api/jobs/${job.id}/call-back`).send({
      ...{ cause: 'streaks', lineIds: job.lines.map((line) => line.id), minutes: 30, notes: 'Hood only' },
      ...{ windowFrom: '2026-05-15T13:00:00Z', windowTo: '2026-05-15T15:00:00Z', ...more },
    });
  await back({ windowTo: '2026-05-15T12:00:00Z' }).expect(400);
  await back({ cause: 'bad luck' }).expect(400);
  const made = jobIn((await back().expect(200)).body);
  expect(made).toMatchObject({
    ...{ totalCents: 0, callBackOf: { id: job.id, number: job.number }, callBackCause: 'streaks' },
    ...{ notes: `Call-back of job ${job.number}: streaks or haze. Done by Sefa Lund in Gannet.\nHood only` },
    visits: [{ progress: 'unplaced', minutes: 30, isCallBack: true }],
  });
  const past = jobIn((await dispatcher.get(`/api/jobs/${job.id}`).expect(200)).body);
  expect(past.callBacks).toEqual([{ id: made.id, number: made.number, cause: 'streaks' }]);
  const again = await dispatcher
    .post(`/api/jobs/${made.id}/call-back`)
    .send({
      cause: 'other',
      lineIds: made.lines.map((line) => line.id),
      minutes: 30,
      notes: '',
      windowFrom: null,
      windowTo: null,
    })
    .expect(422);
  expect(again.body).toMatchObject({ error: { code: 'not_finished' } });
});

test('a car is due again by the menu’s interval, until something is booked for it', async () => {
  const owner = await company.owner();
  const { services } = (await owner.get('/api/services').expect(200)).body as { services: ServiceDto[] };
  const wash = services.find((one) => one.id === company.wash.id);
  if (!wash) throw new Error('the wash is on the menu');
  const { name, kind, description, skills, equipment, isActive, position, version } = wash;
  const fields = { name, kind, description, skills, equipment, isActive, position, version, intervalDays: 30 };
  await owner.put(`/api/services/${wash.id}`).send(fields).expect(200);
  const due = async () =>
    ((await dispatcher.get('/api/due-again').expect(200)).body as { due: { doneOn: string; dueOn: string }[] }).due;
  // Jobs of the tests above are still to come for the same car.
  expect(await due()).toEqual([]);
  const found = await dispatcher.get('/api/jobs?find=Naka').expect(200);
  for (const { id } of (found.body as { jobs: { id: string }[] }).jobs) {
    const job = jobIn((await dispatcher.get(`/api/jobs/${id}`).expect(200)).body);
    await dispatcher.post(`/api/jobs/${id}/call-off`).send({ version: job.version, reason: 'Test' });
  }
  app.time.now = '2026-05-29T15:00:00Z';
  expect(await due()).toEqual([]);
  app.time.now = '2026-05-30T15:00:00Z';
  expect(await due()).toMatchObject([{ doneOn: '2026-05-14', dueOn: '2026-06-13', serviceName: 'Wash and wax' }]);
});
