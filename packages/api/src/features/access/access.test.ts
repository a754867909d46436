import type { AddressInfo } from 'node:net';
import { beforeAll, expect, test } from 'vitest';
import { io } from 'socket.io-client';
import { User } from '../../db/models/index.ts';
import { sendWaitingMails } from '../../outbox/send-mails.ts';
import { useApp } from '../../testing/app.ts';
import { PASSWORD, aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(app);
});
const now = () => new Date(app.time.now);
const linkIn = (text: string) => /\/link\/(\S+)/.exec(text)?.[1] ?? '';

test('a wrong password and an unknown address get the same sentence', async () => {
  const wrong = await app
    .anonymous()
    .post('/api/session')
    .send({ email: 'owner@ternandtide.example', password: 'nope nope nope' })
    .expect(401);
  const unknown = await app
    .anonymous()
    .post('/api/session')
    .send({ email: 'nobody@ternandtide.example', password: 'nope nope nope' })
    .expect(401);
  expect(wrong.body).toEqual(unknown.body);
});

test('an invitation goes out by mail, works once, and signs in', async () => {
  const owner = await company.owner();
  const invitation = { email: 'New.Hand@ternandtide.example', role: 'technician', personId: null, name: 'New Hand' };
  await owner.post('/api/logins').send(invitation).expect(200);
  await owner.post('/api/logins').send(invitation).expect(422);
  expect(await sendWaitingMails(app.send, now)).toBe(1);
  const mails = await owner.get('/api/local-mail').expect(200);
  const token = linkIn((mails.body as { mails: { text: string }[] }).mails[0]?.text ?? '');
  const hand = app.anonymous();
  await hand
    .get(`/api/links/${token}`)
    .expect(200, { kind: 'invitation', email: 'new.hand@ternandtide.example', companyName: 'Tern & Tide' });
  await hand.post(`/api/links/${token}`).send({ password: 'short' }).expect(400);
  const tries = await Promise.all(
    [1, 2].map(() => app.anonymous().post(`/api/links/${token}`).send({ password: 'rinse top to bottom' })),
  );
  expect(tries.map((answer) => answer.status).sort()).toEqual([200, 404]);
  await hand
    .post('/api/session')
    .send({ email: 'new.hand@ternandtide.example', password: 'rinse top to bottom' })
    .expect(200);
});

test('a reset answers the same for everybody, and its link grows old', async () => {
  await app.anonymous().post('/api/password/reset-requests').send({ email: 'nobody@ternandtide.example' }).expect(200);
  await app.anonymous().post('/api/password/reset-requests').send({ email: 'idris@ternandtide.example' }).expect(200);
  await sendWaitingMails(app.send, now);
  const mail = app.taken().find((m) => m.to === 'idris@ternandtide.example');
  const token = linkIn(mail?.text ?? '');
  await app.anonymous().get(`/api/links/${token}`).expect(200);
  app.time.now = '2026-05-14T18:00:00.000Z';
  await app.anonymous().get(`/api/links/${token}`).expect(404);
  app.time.now = '2026-05-14T15:00:00.000Z';
});

test('changing the password ends the other sessions', async () => {
  const here = await company.idris();
  const there = await company.idris();
  await here.post('/api/password').send({ current: 'wrong one here', next: 'another long one' }).expect(422);
  await here.post('/api/password').send({ current: PASSWORD, next: 'another long one' }).expect(200);
  await here.get('/api/session').expect(200);
  // The same person's other phone keeps what it has not sent.
  const refused = await there.get('/api/session').expect(401);
  expect(refused.body).toMatchObject({ error: { code: 'unauthorized' } });
  await here.post('/api/password').send({ current: 'another long one', next: PASSWORD }).expect(200);
});

test('one ends one’s own sessions by reference, never another’s', async () => {
  const here = await company.idris();
  const there = await company.idris();
  const { sessions } = (await here.get('/api/sessions').expect(200)).body as {
    sessions: { ref: string; isCurrent: boolean }[];
  };
  const others = sessions.filter((session) => !session.isCurrent).map((session) => session.ref);
  const sefa = await company.sefa();
  for (const ref of others) await sefa.delete(`/api/sessions/${ref}`).expect(404);
  for (const ref of others) await here.delete(`/api/sessions/${ref}`).expect(200);
  const refused = await there.get('/api/session').expect(401);
  expect(refused.body).toMatchObject({ error: { code: 'session_ended' } });
});

test('switching a login off ends it at once, open sockets included; the last owner stays', async () => {
  const owner = await company.owner();
  const dispatcher = await company.dispatcher();
  const own = await owner.get('/api/session').expect(200);
  await owner
    .patch(`/api/logins/${(own.body as { user: { id: string } }).user.id}`)
    .send({ isActive: false })
    .expect(422);

  const { port } = await listening();
  const cookie = (
    await app.anonymous().post('/api/session').send({ email: 'dispatch@ternandtide.example', password: PASSWORD })
  ).headers['set-cookie'] as unknown as string[];
  const socket = io(`http://127.0.0.1:${port}`, {
    transports: ['websocket'],
    extraHeaders: { cookie: cookie.join('; ') },
  });
  await new Promise<void>((resolve, reject) => {
    socket.once('connect', resolve);
    socket.once('connect_error', reject);
  });
  const cut = new Promise<string>((resolve) => socket.once('disconnect', resolve));
  const login = await User.findOne({ where: { email: 'dispatch@ternandtide.example' }, rejectOnEmpty: true });
  await owner.patch(`/api/logins/${login.id}`).send({ isActive: false }).expect(200);
  expect(await cut).toBe('io server disconnect');
  const refused = await dispatcher.get('/api/session').expect(401);
  expect(refused.body).toMatchObject({ error: { code: 'session_ended', hint: { endedFor: login.id } } });
  socket.disconnect();
  await owner.patch(`/api/logins/${login.id}`).send({ isActive: true }).expect(200);
});

test('a socket without a session, or from another site, is refused', async () => {
  const { port } = await listening();
  const refused = (options: object) =>
    new Promise<string>((resolve) => {
      const socket = io(`http://127.0.0.1:${port}`, { transports: ['websocket'], reconnection: false, ...options });
      socket.once('connect_error', (error) => {
        socket.disconnect();
        resolve(error.message);
      });
      socket.once('connect', () => resolve('connected'));
    });
  expect(await refused({})).toBe('unauthorized');
  expect(await refused({ extraHeaders: { origin: 'https://elsewhere.example' } })).not.toBe('connected');
});

test('a dispatcher may touch no login', async () => {
  const dispatcher = await company.dispatcher();
  const login = await User.findOne({ where: { email: 'sefa@ternandtide.example' }, rejectOnEmpty: true });
  await dispatcher.post(`/api/logins/${login.id}/reset`).expect(403);
  await dispatcher.patch(`/api/logins/${login.id}`).send({ email: 'mine@ternandtide.example' }).expect(403);
  await dispatcher.delete(`/api/logins/${login.id}/sessions`).expect(403);
});

async function listening(): Promise<AddressInfo> {
  const { server } = app.app;
  if (!server.listening) await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return server.address() as AddressInfo;
}
