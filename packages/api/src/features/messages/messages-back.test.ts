import { createHmac } from 'node:crypto';
import { beforeAll, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { HOOKS, useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { messageStage } from '../../testing/messages.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  [owner, dispatcher] = [await company.owner(), await company.dispatcher()];
});
const { someone, aJob, settle, mailsTo, logOf } = messageStage(app, () => company);
type Someone = Awaited<ReturnType<typeof someone>>;

const post = (path: string, secret: string, event: object) => {
  const body = JSON.stringify(event);
  const signature = createHmac('sha256', secret).update(body).digest('hex');
  return app
    .anonymous()
    .post(path)
    .set('content-type', 'application/json')
    .set('x-driprail-signature', signature)
    .send(body);
};
const historyOf = async ({ customer }: Someone) =>
  (await dispatcher.get(`/api/customers/${customer.id}/messages`).expect(200)).body as {
    messages: { id: string; bouncedAt: string | null }[];
    enquiries: { body: string }[];
    stops: { what: string }[];
    bounces: { address: string; reason: string }[];
  };

test('a link in a mail stops its group of mails without an account, and takes the stop back', async () => {
  const who = await someone();
  await aJob(who);
  await settle();
  const url = new URL(first(mailsTo(who)).unsubscribeUrl ?? '').pathname;
  const anyone = app.anonymous();
  expect((await anyone.get(url).expect(200)).body).toMatchObject({ what: 'news about your jobs', isStopped: false });
  // As mail programs post it, RFC 8058 section 3.1.
  await anyone.post(url).type('form').send('List-Unsubscribe=One-Click').expect(200);
  await aJob(who, '2026-05-16T14:00:00.000Z', '2026-05-16T15:00:00.000Z');
  expect((await logOf(who)).at(-1)?.reason).toMatch(/stopped such mails/);
  expect((await historyOf(who)).stops).toMatchObject([{ what: 'mail with news about your jobs' }]);
  expect((await anyone.delete(url).expect(200)).body).toMatchObject({ isStopped: false });
  await anyone.get(`${url.slice(0, -2)}xx`).expect(404);
});

test('a bounce is noted on the customer, once and only with the right signature', async () => {
  const who = await someone();
  await aJob(who);
  await settle();
  const { id } = first((await historyOf(who)).messages);
  const event = { kind: 'bounce', messageId: `<${id}@driprail>`, reason: 'no such mailbox' };
  await post('/api/webhooks/mail', 'another secret altogether', event).expect(404);
  expect((await historyOf(who)).bounces).toEqual([]);
  for (let time = 0; time < 2; time += 1) await post('/api/webhooks/mail', HOOKS.mail, event).expect(200);
  await post('/api/webhooks/mail', HOOKS.mail, { kind: 'other' }).expect(400);
  expect((await historyOf(who)).bounces).toMatchObject([{ address: who.email, reason: 'no such mailbox' }]);
});

test('a reply lands once on its customer and among what waits, until somebody answers', async () => {
  const who = await someone();
  const event = { key: 'r1', from: `+1 ${who.phone}`, body: 'Could you come at noon?' };
  for (let time = 0; time < 2; time += 1) await post('/api/webhooks/texts', HOOKS.texts, event).expect(200);
  await post('/api/webhooks/texts', HOOKS.texts, { key: 'r2', from: '+1 555 0199', body: 'Who is this?' }).expect(200);
  const waiting = async () =>
    (
      (await dispatcher.get('/api/messages').expect(200)).body as {
        enquiries: { id: string; body: string; customerId: string | null }[];
      }
    ).enquiries;
  expect(await waiting()).toMatchObject([
    { body: 'Could you come at noon?', customerId: who.customer.id },
    { body: 'Who is this?', customerId: null },
  ]);
  for (const { id } of await waiting()) await dispatcher.post(`/api/enquiries/${id}/settle`).expect(200);
  expect(await waiting()).toEqual([]);
  expect((await historyOf(who)).enquiries).toMatchObject([{ body: 'Could you come at noon?' }]);
  await post('/api/webhooks/texts', HOOKS.texts, { key: 'r3', from: who.phone, body: ' Stop ' }).expect(200);
  expect((await historyOf(who)).stops).toMatchObject([{ what: 'texts' }]);
});

test('words with an unknown placeholder are refused at the field; own words are sent; ours come back', async () => {
  const words = { subject: 'See you {day}', body: 'Hello {name}', text: '{company}' };
  const put = (more: object, version: number) =>
    owner.put('/api/message-kinds/booked').send({ isOn: true, ...words, ...more, version });
  const refused = await put({ body: 'The code is {gate_code}' }, 1).expect(400);
  expect((refused.body as { error: { fields: object } }).error.fields).toMatchObject({
    body: expect.stringMatching(/^\{gate_code\} is not known here\. Use \{name\}/) as string,
  });
  await put({}, 1).expect(200);
  await put({}, 1).expect(409);
  const who = await someone();
  await aJob(who);
  await settle();
  expect(first(mailsTo(who)).subject).toBe('See you Fri May 15');
  const preview = await owner.post('/api/message-kinds/done/preview').send(words).expect(200);
  expect(preview.body).toMatchObject({
    subject: 'See you Fri May 15',
    html: expect.stringContaining('Hello Hana') as string,
  });
  await dispatcher
    .put('/api/message-kinds/booked')
    .send({ isOn: false, ...words, version: 2 })
    .expect(403);
});
