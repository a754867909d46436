import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import { CompanySettings, Message } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { NOON, useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { messageStage } from '../../testing/messages.ts';
import { queueMessage, queueTimely, sendDueMessages, takeUpLeft } from './index.ts';

const app = useApp();
let company: TestCompany;
let dispatcher: TestAgent;
let sefa: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  await CompanySettings.update({ phone: '555-0100' }, { where: { id: 1 } });
  [dispatcher, sefa] = [await company.dispatcher(), await company.sefa()];
});
beforeEach(() => {
  app.time.now = NOON;
});
const stage = messageStage(app, () => company);
const { someone, aJob, onTheVan, settle, later, deliver, mailsTo, textsTo, logOf, now } = stage;
const yesToTexts = { consents: [{ channel: 'text', isGiven: true, on: '2026-05-01', how: 'by phone' }] };

describe('booked and moved', () => {
  test('booked goes out once, after the undo time, with a calendar file; no code, no street, no picture', async () => {
    const who = await someone();
    const job = await aJob(who);
    expect(await deliver()).toBe(0);
    expect(await settle()).toBe(1);
    expect(await settle()).toBe(0);
    const mail = first(mailsTo(who));
    expect(mail.subject).toBe('Booked: Fri May 15, 10:00 to 11:00 am');
    expect(mail.calendar).toContain('DTSTART:20260515T140000Z');
    expect(mail.calendar).toContain(`UID:visit-${first(job.visits).id}@driprail`);
    expect(mail.text).toMatch(/Open your page: http:\/\/127\.0\.0\.1:4600\/c\/\S{20,}/);
    expect(mail.text).toContain('555-0100');
    expect(JSON.stringify(mail)).not.toMatch(/4471|Saltpan|Dog|555-0101|<img/);
  });

  test('a new time has the same calendar entry with a higher number; moved there and back it is not told', async () => {
    const who = await someone();
    const job = await aJob(who);
    await settle();
    const moveTo = (hour: number, version: number) =>
      dispatcher
        .put(`/api/jobs/${job.id}`)
        .send({ ...stage.fieldsOf(who, `2026-05-15T${hour}:00:00Z`, `2026-05-15T${hour + 1}:00:00Z`), version })
        .expect(200);
    await moveTo(18, job.version);
    await settle();
    const [moved, booked] = mailsTo(who);
    expect(moved?.subject).toBe('New time: Fri May 15, 2:00 to 3:00 pm');
    const find = (pattern: RegExp, text = '') => pattern.exec(text)?.[1] ?? '';
    expect(Number(find(/SEQUENCE:(\d+)/, moved?.calendar))).toBeGreaterThan(
      Number(find(/SEQUENCE:(\d+)/, booked?.calendar)),
    );
    expect(find(/UID:(.*)/, moved?.calendar)).toBe(find(/UID:(.*)/, booked?.calendar));
    await moveTo(19, job.version + 1);
    await moveTo(18, job.version + 2);
    await settle();
    expect(mailsTo(who)).toHaveLength(2);
    expect((await logOf(who)).at(-1)?.reason).toMatch(/knows this time/);
  });

  test('a job that is called off strikes the calendar entry', async () => {
    const who = await someone();
    const job = await aJob(who);
    await settle();
    await dispatcher.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: 'Rain' }).expect(200);
    await settle();
    expect(first(mailsTo(who)).subject).toBe('Called off: Fri May 15');
    expect(first(mailsTo(who)).calendar).toContain('STATUS:CANCELLED');
  });

  test('one event is told once, and nothing is promised by a change that does not stand', async () => {
    const who = await someone();
    const job = await aJob(who);
    const event = { kind: 'booked', jobId: job.id, eventKey: `job:${job.id}:v0` } as const;
    await inTransaction((tx) => queueMessage(tx, now(), event));
    expect(await Message.count({ where: { jobId: job.id } })).toBe(1);
    const failing = inTransaction(async (tx) => {
      await queueMessage(tx, now(), { ...event, eventKey: 'lost' });
      throw new Error('rolled back');
    });
    await expect(failing).rejects.toThrow('rolled back');
    expect(await Message.count({ where: { eventKey: 'lost' } })).toBe(0);
  });
});

describe('on the way', () => {
  test('waits out the undo time and names the van and the crew’s first names', async () => {
    const who = await someone();
    const { press } = await onTheVan(who, sefa);
    await settle();
    await press('set_off');
    expect(await deliver()).toBe(0);
    await settle();
    const mail = first(mailsTo(who));
    expect(mail.subject).toMatch(/^Sefa on the way, about \d+:\d\d [ap]m$/);
    expect(mail.text).toContain('Gannet');
    expect(mail.text).not.toContain('Lund');
  });

  test('taken back, it is dropped; pressed again, it is told', async () => {
    const who = await someone();
    const { press } = await onTheVan(who, sefa);
    await press('set_off');
    await press('undo');
    await settle();
    expect((await logOf(who)).filter(({ kind }) => kind === 'on_the_way')).toMatchObject([
      { state: 'dropped', reason: 'It was taken back before it went out.' },
    ]);
    await press('set_off');
    await settle();
    expect(mailsTo(who).filter(({ subject }) => subject.includes('on the way'))).toHaveLength(1);
  });

  test('after Arrived it is not told', async () => {
    const who = await someone();
    const { press } = await onTheVan(who, sefa);
    await press('set_off');
    await press('arrive');
    await settle();
    expect((await logOf(who)).at(-1)).toMatchObject({ kind: 'on_the_way', state: 'dropped' });
  });
});

describe('texts', () => {
  test('need a yes, and wait for the end of the quiet hours, over the night that loses an hour', async () => {
    const [no, yes] = [await someone(), await someone(yesToTexts)];
    // 22:00 of March 7, 2026 in New York; the clocks go on that night (15 USC 260a).
    app.time.now = '2026-03-08T03:00:00.000Z';
    for (const who of [no, yes]) await aJob(who, '2026-03-10T14:00:00.000Z', '2026-03-10T15:00:00.000Z');
    await settle();
    expect([mailsTo(no).length, mailsTo(yes).length]).toEqual([1, 1]);
    expect([textsTo(no), textsTo(yes)]).toEqual([[], []]);
    app.time.now = '2026-03-08T11:59:00.000Z';
    await deliver();
    expect(textsTo(yes)).toEqual([]);
    app.time.now = '2026-03-08T12:00:00.000Z';
    await deliver();
    expect(textsTo(yes)).toHaveLength(1);
    expect(first(textsTo(yes)).body).toMatch(/^Tern & Tide: booked for Tue Mar 10, 10:00 to 11:00 am\./);
  });
});

describe('what the customer or the company does not want', () => {
  test('is noted as dropped when the customer has no address or said no', async () => {
    const none = await someone({ email: '' });
    const no = await someone({ consents: [{ channel: 'mail', isGiven: false, on: '2026-05-01', how: 'by phone' }] });
    await aJob(none);
    await aJob(no);
    expect(await logOf(none)).toMatchObject([{ state: 'dropped', reason: 'No e-mail address is known.' }]);
    expect(await logOf(no)).toMatchObject([{ state: 'dropped', reason: 'The customer said no to mail.' }]);
  });

  test('is not queued when the kind is switched off, and dropped when that came between', async () => {
    const owner = await company.owner();
    const who = await someone();
    await aJob(who);
    const shown = await owner.get('/api/message-settings').expect(200);
    const booked = first(
      (shown.body as { kinds: { subject: string; body: string; text: string; version: number }[] }).kinds,
    );
    const set = (isOn: boolean, version: number) =>
      owner
        .put('/api/message-kinds/booked')
        .send({ isOn, subject: booked.subject, body: booked.body, text: booked.text, version })
        .expect(200);
    await set(false, booked.version);
    await aJob(who, '2026-05-16T14:00:00.000Z', '2026-05-16T15:00:00.000Z');
    await settle();
    expect(await logOf(who)).toMatchObject([{ state: 'dropped', reason: 'This kind of message is switched off.' }]);
    await set(true, booked.version + 1);
  });
});

describe('a crash and a refusal', () => {
  const halted = (mailKnowsRepeats: boolean) => ({
    ...{ ...app.deliveries, mailKnowsRepeats },
    sendMail: async (mail: Parameters<typeof app.send>[0]) => {
      await app.send(mail);
      await new Promise(() => undefined);
    },
  });
  async function leftBetween(mailKnowsRepeats: boolean) {
    const who = await someone();
    await aJob(who);
    later(300);
    // The mail is handed over, and the server stops before it can note that.
    void sendDueMessages(halted(mailKnowsRepeats), now);
    await expect.poll(() => mailsTo(who).length).toBe(1);
    await deliver();
    later(20 * 60);
    await takeUpLeft({ mailKnowsRepeats }, now());
    await deliver();
    return who;
  }
  test('between hand-over and commit never sends twice: a service that knows repeats is asked again', async () => {
    const who = await leftBetween(true);
    expect(mailsTo(who)).toHaveLength(1);
    expect(await logOf(who)).toMatchObject([{ state: 'sent' }]);
  });
  test('by SMTP it rests until somebody decides', async () => {
    const who = await leftBetween(false);
    expect(mailsTo(who)).toHaveLength(1);
    expect(await logOf(who)).toMatchObject([{ state: 'dead' }]);
  });

  test('what is refused is tried later and later, rests after the last try, and goes out when tried again', async () => {
    const who = await someone();
    await aJob(who);
    const refusing = { ...app.deliveries, sendMail: () => Promise.reject(new Error('451 try later')) };
    later(300);
    for (const wait of [0, 30, 120, 600, 3600, 21_600]) {
      expect(await logOf(who)).toMatchObject([{ state: 'waiting' }]);
      later(wait);
      await sendDueMessages(refusing, now);
    }
    const shown = await dispatcher.get('/api/messages?show=dead').expect(200);
    const dead = (shown.body as { messages: { id: string; customerId: string; lastError: string }[] }).messages.find(
      ({ customerId }) => customerId === who.customer.id,
    );
    expect(dead?.lastError).toBe('451 try later');
    await dispatcher.post(`/api/messages/${dead?.id}/retry`).expect(200);
    expect(await deliver()).toBe(1);
    await dispatcher.post(`/api/messages/${dead?.id}/drop`).expect(409);
  });

  test('a mailbox that does not exist is not tried again, and nothing more goes there', async () => {
    const who = await someone();
    await aJob(who);
    later(300);
    const gone = Object.assign(new Error('550 no such user'), { responseCode: 550 });
    await sendDueMessages({ ...app.deliveries, sendMail: () => Promise.reject(gone) }, now);
    expect(await logOf(who)).toMatchObject([{ state: 'dead' }]);
    await aJob(who, '2026-05-16T14:00:00.000Z', '2026-05-16T15:00:00.000Z');
    expect((await logOf(who)).at(-1)?.reason).toMatch(/came back/);
  });
});

describe('what the time causes', () => {
  test('a reminder the day before, at the hour set, once', async () => {
    const who = await someone();
    await aJob(who);
    await settle();
    await queueTimely(now());
    expect(mailsTo(who)).toHaveLength(1);
    // 17:00 in New York.
    app.time.now = '2026-05-14T21:00:00.000Z';
    for (let time = 0; time < 2; time += 1) await queueTimely(now());
    await deliver();
    expect(mailsTo(who).map(({ subject }) => subject)).toEqual(['Tomorrow: 10:00 to 11:00 am', expect.any(String)]);
  });

  test('asks how it went some hours after the work; the invoice, a payment and a refund are told', async () => {
    const who = await someone();
    const { job, press } = await onTheVan(who, sefa);
    for (const kind of ['set_off', 'arrive', 'start_work', 'finish']) await press(kind);
    await settle();
    await dispatcher.post(`/api/jobs/${job.id}/invoice`).send({}).expect(200);
    await deliver();
    expect(first(mailsTo(who)).text).toContain('To pay: 240.00');
    const pay = (key: string, amountCents: number) =>
      dispatcher
        .post(`/api/jobs/${job.id}/payments`)
        .send({ key, method: 'check', amountCents, reference: '1043', deviceAt: app.time.now })
        .expect(200);
    await pay(uuid(), 14_000);
    const paid = await pay(uuid(), 10_000);
    await settle();
    expect(mailsTo(who).filter(({ subject }) => subject.startsWith('Received: '))).toHaveLength(2);
    const { payments, lines } = (paid.body as { bill: { payments: { id: string }[]; lines: { id: string }[] } }).bill;
    await (
      await company.owner()
    )
      .post(`/api/payments/${first(payments).id}/refunds`)
      .send({
        ...{ key: uuid(), kind: 'refund', amountCents: 2000, reasonId: null, note: 'A spot stayed' },
        lines: [{ id: first(lines).id, netCents: 2000 }],
      })
      .expect(200);
    await deliver();
    expect(first(mailsTo(who)).subject).toBe('Given back: 20.00');
    later(4 * 3600);
    await queueTimely(now());
    await deliver();
    expect(first(mailsTo(who)).subject).toBe('How did it go?');
  });
});
