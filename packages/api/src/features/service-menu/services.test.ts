import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
});

const service = (more: object = {}) => ({
  ...{
    name: 'Ceramic coating',
    kind: 'single',
    description: '',
    skills: [],
    equipment: [],
    isActive: true,
    position: 1,
  },
  ...{ startsOn: '2026-01-01', prices: [{ sizeClass: 'sedan', priceCents: 90_000, minutes: 360 }] },
  ...more,
});
const needs = {
  ...{ water: false, power: true, dry: true, daylight: false, coldestTenths: 100, hottestTenths: 322 },
};
const add = (more: object) => owner.post('/api/services').send(service(more));
const serviceIn = (body: unknown) => (body as { service: ServiceDto }).service;

test('a service keeps what it needs, and an older form that leaves it out changes nothing of it', async () => {
  const facts = { needs, cureHours: 24, intervalDays: 365, depositPercent: 30 };
  const made = serviceIn((await add(facts).expect(200)).body);
  expect(made).toMatchObject(facts);
  const { name, kind, description, skills, equipment, isActive, position, version } = made;
  const older = { name, kind, description, skills, equipment, isActive, position, version };
  expect(serviceIn((await owner.put(`/api/services/${made.id}`).send(older).expect(200)).body)).toMatchObject(facts);
});

test('bad input is said at its field', async () => {
  const upsideDown = await add({ name: 'A', needs: { ...needs, hottestTenths: 90 } }).expect(400);
  expect(upsideDown.body).toMatchObject({
    error: { fields: { 'needs.hottestTenths': 'The hottest must be above the coldest.' } },
  });
  const deposit = await add({ name: 'B', depositPercent: 101 }).expect(400);
  expect(deposit.body).toMatchObject({ error: { fields: { depositPercent: 'At most 100 percent.' } } });
  const nested = await add({ name: 'C', kind: 'package', includes: [company.wash.id] }).expect(422);
  expect(nested.body).toMatchObject({ error: { code: 'bad_package' } });
});

test('a package holds single services, each once', async () => {
  const part = serviceIn((await add({ name: 'Pet hair', kind: 'add_on' }).expect(200)).body);
  const made = await add({ name: 'Inside', kind: 'package', includes: [part.id, part.id] }).expect(200);
  expect(serviceIn(made.body).includes).toEqual([part.id]);
});

test('surcharges start on a day, are the owner’s alone, and one a day', async () => {
  const set = (agent: TestAgent, more: object = {}) =>
    agent
      .post('/api/condition-surcharges')
      .send({ condition: 'dirty', pricePercent: 30, minutesPercent: 10, startsOn: '2026-05-14', ...more });
  await set(await company.dispatcher()).expect(403);
  await set(owner, { pricePercent: 301 }).expect(400);
  await set(owner).expect(200);
  await set(owner).expect(422);
  const listed = async (on: string) =>
    ((await owner.get('/api/services').query({ on }).expect(200)).body as { surcharges: { dirty: object } }).surcharges
      .dirty;
  expect(await listed('2026-05-13')).toEqual({ pricePercent: 20, minutesPercent: 20 });
  expect(await listed('2026-05-14')).toEqual({ pricePercent: 30, minutesPercent: 10 });
});
