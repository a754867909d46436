import { expect, test } from 'vitest';
import { useApp } from '../../testing/app.ts';

const app = useApp();
const start = {
  companyName: 'Tern & Tide',
  zone: 'America/New_York',
  ownerName: 'Rowan Tern',
  email: 'Owner@ternandtide.example',
  password: 'wash-top-down',
};

test('an empty company is set up once, with the terminal’s code, and its owner is signed in', async () => {
  const browser = app.anonymous();
  await browser.get('/api/set-up').expect(200, { isNeeded: true });
  const wrong = await browser
    .post('/api/set-up')
    .send({ ...start, code: 'AAAAAAAA' })
    .expect(422);
  expect(wrong.body).toMatchObject({ error: { fields: { code: 'That is not the code in the terminal.' } } });
  const bad = await browser
    .post('/api/set-up')
    .send({ ...start, code: app.setUpCode, zone: 'Mars/Crater', email: 'x', password: 'short' })
    .expect(400);
  expect(Object.keys((bad.body as { error: { fields: object } }).error.fields).sort()).toEqual([
    'email',
    'password',
    'zone',
  ]);

  const [one, two] = await Promise.all(
    [1, 2].map(() => browser.post('/api/set-up').send({ ...start, code: ` ${app.setUpCode.toLowerCase()} ` })),
  );
  expect([one?.status, two?.status].sort()).toEqual([200, 409]);
  const session = await browser.get('/api/session').expect(200);
  expect(session.body).toMatchObject({
    user: { role: 'owner', email: 'owner@ternandtide.example' },
    company: { name: 'Tern & Tide' },
  });
  await browser.get('/api/set-up').expect(200, { isNeeded: false });
  await app
    .anonymous()
    .post('/api/set-up')
    .send({ ...start, code: app.setUpCode })
    .expect(422);
});

test('settings name the version they saw, and reach everybody’s session', async () => {
  const owner = app.anonymous();
  await owner.post('/api/session').send({ email: start.email, password: start.password }).expect(200);
  const { settings } = (await owner.get('/api/settings').expect(200)).body as { settings: { version: number } };
  await owner
    .put('/api/settings')
    .send({ ...settings, clock: '24' })
    .expect(200);
  await owner
    .put('/api/settings')
    .send({ ...settings, clock: '12' })
    .expect(409);
  expect((await owner.get('/api/session')).body).toMatchObject({ company: { clock: '24' } });
  const late = await owner
    .put('/api/settings')
    .send({ ...settings, invoiceDueDays: 121 })
    .expect(400);
  expect(late.body).toMatchObject({ error: { fields: { invoiceDueDays: 'At most 120 days.' } } });
});
