import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { PushSubscription, User } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { fakePushService } from '../../testing/push-service.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let sefa: TestAgent;
let phone: Awaited<ReturnType<typeof fakePushService>>;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  sefa = await company.sefa();
  phone = await fakePushService();
});
afterAll(() => phone.close());

let planVersion = 0;
let visitId = '';
const place = async (from: string, to: string) => {
  const moves = [{ visitId, planVersion, vanId: company.vans.gannet.id, from, to }];
  await owner.post('/api/board/moves').send({ moves, accept: [] }).expect(200);
  planVersion += 1;
};
const heard = (count: number) => vi.waitFor(() => expect(phone.taken).toHaveLength(count));

test('a closed phone is woken when its run sheet changes, and is told nothing that a locked screen may not show', async () => {
  await sefa.post('/api/push/subscriptions').send(phone.subscription).expect(200);
  visitId = (await company.aJob()).visit.id;
  await place('2026-05-14T15:30:00Z', '2026-05-14T17:00:00Z');
  await heard(1);
  const [first] = phone.taken;
  expect(first?.message).toEqual({ kind: 'run_sheet' });
  expect(first?.headers['content-encoding']).toBe('aes128gcm');
  expect(first?.headers['authorization']).toMatch(/^vapid t=.+, k=.+/);
  expect(first?.headers['ttl']).toBe('3600');
});

test('nobody is woken on the way', async () => {
  const press = { key: '0b0e7c57-3a5c-4b8e-9d0c-0d8f5a0c9a21', kind: 'set_off', deviceAt: app.time.now };
  await sefa.post(`/api/visits/${visitId}/actions`).send(press).expect(200);
  const { job } = await company.aJob();
  await owner.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: 'Weather' }).expect(200);
  expect(phone.taken).toHaveLength(1);
  const undo = { key: '0b0e7c57-3a5c-4b8e-9d0c-0d8f5a0c9a22', kind: 'undo', deviceAt: app.time.now };
  await sefa.post(`/api/visits/${visitId}/actions`).send(undo).expect(200);
});

test('a phone that its push service no longer knows is forgotten', async () => {
  phone.answerWith(410);
  await place('2026-05-14T16:00:00Z', '2026-05-14T17:30:00Z');
  await heard(2);
  await vi.waitFor(async () => expect(await PushSubscription.count()).toBe(0));
  phone.answerWith(201);
});

test('a phone whose sessions were ended is told nothing more', async () => {
  await sefa.post('/api/push/subscriptions').send(phone.subscription).expect(200);
  const user = await User.findOne({ where: { personId: company.people.sefa.id }, rejectOnEmpty: true });
  await owner.delete(`/api/logins/${user.id}/sessions`).expect(200);
  expect(await PushSubscription.count()).toBe(0);
});

test('an address is taken out by its own login alone, and must be one', async () => {
  const idris = await company.idris();
  sefa = await company.sefa();
  await sefa.post('/api/push/subscriptions').send(phone.subscription).expect(200);
  const query = `?endpoint=${encodeURIComponent(phone.subscription.endpoint)}`;
  await idris.delete(`/api/push/subscriptions${query}`).expect(200);
  expect(await PushSubscription.count()).toBe(1);
  await sefa.delete(`/api/push/subscriptions${query}`).expect(200);
  expect(await PushSubscription.count()).toBe(0);
  await sefa
    .post('/api/push/subscriptions')
    .send({ ...phone.subscription, endpoint: 'nowhere' })
    .expect(400);
});
