import { beforeAll, describe, expect, it, vi } from 'vitest';
import type { Response } from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { CustomerPageDto } from '@driprail/shared/contracts/customer-page.contract';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import { JobPaid, Photo, Tip } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { storeFor } from '../../integrations/storage/index.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { useCardsApp } from '../../testing/local-cards.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';
import { issueDueInvoices } from './index.ts';

const test = useCardsApp();
let company: TestCompany;
let owner: TestAgent;
let sefa: TestAgent;
let jobId: string;
let lastNumber = 1000;

beforeAll(async () => {
  company = await aCompany(test);
  [owner, sefa] = [await company.owner(), await company.sefa()];
  await owner
    .post('/api/tax-rates')
    .send({ name: 'State sales tax', taxClass: 'standard', place: '', percent: '6.25', startsOn: '2026-01-01' })
    .expect(200);
});

const billOf = async (agent: TestAgent, id = jobId) =>
  ((await agent.get(`/api/jobs/${id}/bill`).expect(200)).body as { bill: BillDto }).bill;
const pay = (agent: TestAgent, fields: object, id = jobId) =>
  agent.post(`/api/jobs/${id}/payments`).send({ key: key(), method: 'cash', deviceAt: test.time.now, ...fields });

const faultOf = (answer: Response) => (answer.body as ErrorBody).error;

describe('the bill of a job', () => {
  it('is a draft while the work is under way, and only the desk and its crew see it', async () => {
    const { job } = await company.aJob();
    const dispatcher = await company.dispatcher();
    expect(await billOf(dispatcher, job.id)).toMatchObject({
      ...{ state: 'draft', invoice: null, netCents: 24_000, taxCents: 1500, totalCents: 25_500, owedCents: 25_500 },
    });
    const idris = await company.idris();
    await idris.get(`/api/jobs/${job.id}/bill`).expect(404);
    expect((await idris.get('/api/run-sheet/2026-05-14/bills').expect(200)).body).toEqual({ bills: [] });
    const early = await dispatcher.post(`/api/jobs/${job.id}/invoice`).expect(422);
    expect(faultOf(early).message).toContain('is not done yet');
  });

  it('gets the next number once the time to take Done back is over, and keeps its tax', async () => {
    jobId = (await aDoneJob(test, company, owner)).job.id;
    expect(await issueDueInvoices(new Date(test.time.now))).toBe(0);
    test.time.now = '2026-05-14T16:35:00Z';
    expect(await issueDueInvoices(new Date(test.time.now))).toBe(1);
    expect(await issueDueInvoices(new Date(test.time.now))).toBe(0);
    await owner
      .post('/api/tax-rates')
      .send({ name: 'State sales tax', taxClass: 'standard', place: '', percent: '9', startsOn: '2026-02-01' })
      .expect(200);
    const bill = await billOf(sefa);
    expect(bill).toMatchObject({ state: 'open', taxCents: 1500, owedCents: 25_500 });
    expect((await sefa.get('/api/run-sheet/2026-05-14/bills').expect(200)).body).toEqual({ bills: [bill] });
    expect(bill.invoice).toMatchObject({ number: ++lastNumber, dueOn: '2026-05-28' });
  });

  it('numbers invoices of many at once without a gap', async () => {
    const jobs = [];
    for (let nth = 0; nth < 4; nth += 1) jobs.push((await aDoneJob(test, company, owner)).job.id);
    await Promise.all(jobs.flatMap((id) => [0, 1].map(() => owner.post(`/api/jobs/${id}/invoice`).expect(200))));
    const numbers = await Promise.all(jobs.map(async (id) => (await billOf(owner, id)).invoice?.number));
    expect(numbers.map(Number).sort((a, b) => a - b)).toEqual([1, 2, 3, 4].map((nth) => lastNumber + nth));
    lastNumber += 4;
  });
});

describe('what is handed over', () => {
  it('is taken once per key, and no more than is owed', async () => {
    const tooMuch = await pay(sefa, { amountCents: 30_000 }).expect(422);
    expect(faultOf(tooMuch).fields?.['amountCents']).toBe(
      'Only 255.00 is owed. Give change, or record the rest as a tip.',
    );
    const once = { key: key(), method: 'cash', amountCents: 10_000, tipCents: 500, deviceAt: test.time.now };
    await Promise.all([1, 2].map(() => sefa.post(`/api/jobs/${jobId}/payments`).send(once).expect(200)));
    expect(await billOf(owner)).toMatchObject({ owedCents: 15_500, payments: [{ method: 'cash', by: 'Sefa Lund' }] });
    expect(await Tip.count({ where: { jobId, amountCents: 500 } })).toBe(1);
    expect(await JobPaid.findByPk(jobId)).toBeNull();
  });

  it('is of the crew’s own jobs only', async () => {
    await pay(await company.idris(), { amountCents: 100 }).expect(404);
  });

  it('by a phone without signal is recorded, whatever was owed when it arrived', async () => {
    const { job } = await aDoneJob(test, company, owner);
    await pay(owner, { amountCents: 25_000 }, job.id).expect(200);
    const at = test.time.now;
    test.time.now = '2026-05-14T18:00:00Z';
    await pay(sefa, { amountCents: 26_160, deviceAt: at }, job.id).expect(200);
    expect(await billOf(owner, job.id)).toMatchObject({ state: 'owes_back', owedCents: -25_000 });
    lastNumber += 1;
  });

  it('a payment for a job that was called off is refused with a sentence', async () => {
    const { job } = await company.aJob();
    await owner.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: 'Weather' }).expect(200);
    const refused = await pay(owner, { amountCents: 100 }, job.id).expect(422);
    expect(faultOf(refused).message).toMatch(/^Nothing is owed on job \d+/);
  });
});

describe('a customer’s own page', () => {
  let token: string;
  const page = async () =>
    ((await test.anonymous().get(`/api/customer-pages/${token}`).expect(200)).body as { page: CustomerPageDto }).page;
  const card = (tipCents: number) => test.anonymous().post(`/api/customer-pages/${token}/card`).send({ tipCents });
  const urlOf = (answer: Response) => (answer.body as { url: string }).url;
  const owed = async (): Promise<number> => (await billOf(owner)).owedCents;

  it('shows the job and the bill, and neither address nor gate code nor a crew’s phone', async () => {
    const { url } = (await sefa.post(`/api/jobs/${jobId}/pay-link`).expect(200)).body as { url: string };
    token = url.split('/c/')[1] ?? '';
    const shown = await page();
    expect(shown).toMatchObject({
      progress: 'done',
      name: 'Nakagawa',
      crewNames: ['Sefa'],
      bill: { owedCents: 15_500 },
    });
    // Of who took the cash, the first name alone is known here.
    expect(JSON.stringify(shown)).not.toMatch(/Saltpan|4471|555-0101|Sefa Lund/);
  });

  it('is not there for a token that was not signed here', async () => {
    const forged = `${token.slice(0, -2)}${token.endsWith('AA') ? 'BB' : 'AA'}`;
    await test.anonymous().get(`/api/customer-pages/${forged}`).expect(404);
  });

  it('pays by card with a tip: two tabs share a page, another tip ends it first', async () => {
    const [a, b] = await Promise.all([card(800), card(800)]);
    expect(urlOf(a)).toEqual(urlOf(b));
    const other = await card(1500).expect(200);
    expect(urlOf(other)).not.toBe(urlOf(a));
    expect((await test.press(urlOf(a), 'pay')).status).not.toBe(302);
    await test.press(urlOf(other), 'pay');
    await vi.waitFor(async () => expect(await owed()).toBe(0));
    expect(await Tip.count({ where: { jobId, amountCents: 1500, method: 'card' } })).toBe(1);
    expect(await JobPaid.findByPk(jobId)).toMatchObject({ recordedBy: null });
    await card(0).expect(422);
  });

  it('an event told twice or unsigned changes nothing', async () => {
    const { events } = await test.hook<{ events: { id: string; type: string }[] }>('/events');
    const paid = events.findLast(({ type }) => type === 'checkout.session.completed');
    await test.hook(`/events/${paid?.id}/send`, { times: 2 });
    const { answers } = await test.hook<{ answers: number[] }>(`/events/${paid?.id}/send`, { signature: 'wrong' });
    expect(answers).toEqual([400]);
    expect((await billOf(owner)).payments).toHaveLength(2);
  });

  it('shows before and after of its own job, and no photo of a second look or of another job', async () => {
    const store = storeFor({ dataDir: test.dataDir, s3: null });
    const other = await aDoneJob(test, company, owner);
    const visitOf = async (id: string) =>
      ((await owner.get(`/api/jobs/${id}`).expect(200)).body as { job: { visits: { id: string }[] } }).job.visits[0]
        ?.id;
    const photo = async (visitId: string, moment: 'before' | 'after' | 'second_look') => {
      const id = key();
      await store.put(`2026-05/${id}.jpg`, new Uint8Array([1, 2, 3]));
      const at = new Date(test.time.now);
      await Photo.create({
        ...{ id, visitId, view: 'front', moment, bytes: 3, sha256: id.replaceAll('-', '').padEnd(64, '0') },
        ...{ receivedBytes: 3, storageKey: `2026-05/${id}.jpg`, storedAt: at, userId: company.ctx.actor.userId },
        ...{ width: 4, height: 3, deviceAt: at, receivedAt: at, occurredAt: at },
      });
      return id;
    };
    const own = (await visitOf(jobId)) ?? '';
    const after = await photo(own, 'after');
    const look = await photo(own, 'second_look');
    const strange = await photo((await visitOf(other.job.id)) ?? '', 'after');
    expect((await page()).photos).toEqual([{ id: after, view: 'front', moment: 'after' }]);
    const get = (id: string) => test.anonymous().get(`/api/customer-pages/${token}/photos/${id}`);
    await get(after).expect(200).expect('content-type', 'image/jpeg');
    await get(look).expect(404);
    await get(strange).expect(404);
  });

  it('takes feedback once the work is done, the last word counts', async () => {
    const say = (stars: number) =>
      test.anonymous().post(`/api/customer-pages/${token}/feedback`).send({ stars, words: 'Spotless.' });
    await say(4).expect(200);
    await say(5).expect(200);
    expect((await page()).feedback).toEqual({ stars: 5, words: 'Spotless.' });
    await say(6).expect(400);
  });
});

describe('money back', () => {
  const refund = (agent: TestAgent, paymentId: string, fields: object) =>
    agent
      .post(`/api/payments/${paymentId}/refunds`)
      .send({ key: key(), kind: 'refund', lines: [], reasonId: null, note: 'Streaks on the hood', ...fields });

  it('goes back by a numbered credit note with its tax, through the payments service', async () => {
    const bill = await billOf(owner);
    const paid = bill.payments.find(({ method }) => method === 'card');
    const lines = [{ id: bill.lines[0]?.id, netCents: 4800 }];
    await refund(await company.dispatcher(), paid?.id ?? '', { lines, amountCents: 5100 }).expect(403);
    const tooMuch = await refund(owner, paid?.id ?? '', { lines, amountCents: 5101 }).expect(422);
    expect(faultOf(tooMuch).fields?.['amountCents']).toContain('51.00 was paid too much');
    await refund(owner, paid?.id ?? '', { lines, amountCents: 5100 }).expect(200);
    await vi.waitFor(async () =>
      expect(await billOf(owner)).toMatchObject({
        ...{
          owedCents: 0,
          creditedCents: 5100,
          refunds: [{ state: 'done', amountCents: 5100, creditNoteNumber: 101 }],
        },
      }),
    );
  });

  it('lines are credited without money too: that lowers what is owed, with their tax, and pays the bill at last', async () => {
    const { job } = await aDoneJob(test, company, owner);
    await owner.post(`/api/jobs/${job.id}/invoice`).expect(200);
    const { lines } = await billOf(owner, job.id);
    const credit = (agent: TestAgent, netCents: number, note = 'Goodwill') =>
      agent
        .post(`/api/jobs/${job.id}/credit-notes`)
        .send({ key: key(), lines: [{ id: lines[0]?.id, netCents }], reasonId: null, note });
    await credit(await company.dispatcher(), 4000).expect(403);
    await credit(owner, 4000, '').expect(400);
    expect(faultOf(await credit(owner, 24_001).expect(422)).fields).toHaveProperty('lines');
    await credit(owner, 4000).expect(200);
    expect(await billOf(owner, job.id)).toMatchObject({ creditedCents: 4360, owedCents: 26_160 - 4360, refunds: [] });
    await credit(owner, 20_000).expect(200);
    expect(await billOf(owner, job.id)).toMatchObject({ creditedCents: 26_160, owedCents: 0, state: 'paid' });
    expect(await JobPaid.findByPk(job.id)).not.toBeNull();
    lastNumber += 1;
  });

  it('takes back whole what was recorded by mistake, and never more than was received', async () => {
    const { job } = await aDoneJob(test, company, owner);
    await pay(owner, { amountCents: 10_000, method: 'check' }, job.id).expect(200);
    const [payment] = (await billOf(owner, job.id)).payments;
    await refund(owner, payment?.id ?? '', { kind: 'mistake', amountCents: 9000 }).expect(422);
    await refund(owner, payment?.id ?? '', { kind: 'mistake', amountCents: 10_000 }).expect(200);
    await refund(owner, payment?.id ?? '', { kind: 'mistake', amountCents: 10_000 }).expect(422);
    expect(await billOf(owner, job.id)).toMatchObject({ owedCents: 26_160 });
  });
});

describe('a deposit', () => {
  it('is asked by the menu’s percent until it has come in, and stands against the bill', async () => {
    await select(`UPDATE services SET deposit_percent = 25 WHERE id = :id RETURNING id`, { id: company.wash.id });
    const { job } = await company.aJob();
    expect(await billOf(owner, job.id)).toMatchObject({ depositCents: 6000, owedCents: 26_160 });
    const { url } = (await owner.post(`/api/jobs/${job.id}/pay-link`).expect(200)).body as { url: string };
    const own = `/api/customer-pages/${url.split('/c/')[1]}`;
    const card = await test.anonymous().post(`${own}/card`).send({ part: 'deposit', tipCents: 0 }).expect(200);
    await test.press((card.body as { url: string }).url, 'pay');
    await vi.waitFor(async () =>
      expect(await billOf(owner, job.id)).toMatchObject({ depositCents: 0, owedCents: 20_160, invoice: null }),
    );
    await test.anonymous().post(`${own}/card`).send({ part: 'deposit', tipCents: 0 }).expect(422);
    await select(`UPDATE services SET deposit_percent = 0 WHERE id = :id RETURNING id`, { id: company.wash.id });
  });
});

describe('money of a job that is called off', () => {
  it('is named until it went back', async () => {
    const { job } = await company.aJob();
    await pay(owner, { amountCents: 5000, method: 'check' }, job.id).expect(200);
    const held = async () =>
      ((await owner.get('/api/bills/held').expect(200)).body as { held: { jobId: string; cents: number }[] }).held;
    expect(await held()).toEqual([]);
    await owner.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: 'Weather' }).expect(200);
    expect(await held()).toMatchObject([{ jobId: job.id, cents: 5000 }]);
    const [payment] = (await billOf(owner, job.id)).payments;
    const back = { key: key(), kind: 'refund', lines: [], amountCents: 5000, reasonId: null, note: 'Called off' };
    await owner.post(`/api/payments/${payment?.id}/refunds`).send(back).expect(200);
    expect(await held()).toEqual([]);
  });
});

describe('a fee', () => {
  const fee = { kind: 'no_show', amountCents: 4000, taxClass: 'untaxed', note: 'Waited 15 minutes' };

  it('is billed for a job that was called off, once, and paid like any bill', async () => {
    const { job } = await company.aJob();
    await owner.post(`/api/jobs/${job.id}/fee`).send(fee).expect(422);
    await owner.post(`/api/jobs/${job.id}/call-off`).send({ version: job.version, reason: 'Nobody home' }).expect(200);
    await owner
      .post(`/api/jobs/${job.id}/fee`)
      .send({ ...fee, amountCents: 0 })
      .expect(400);
    const answers = await Promise.all([1, 2].map(() => owner.post(`/api/jobs/${job.id}/fee`).send(fee)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await billOf(owner, job.id)).toMatchObject({
      state: 'open',
      owedCents: 4000,
      taxCents: 0,
      isCalledOff: true,
    });
    await pay(owner, { amountCents: 4000 }, job.id).expect(200);
    expect(await billOf(owner, job.id)).toMatchObject({ state: 'paid', owedCents: 0 });
    lastNumber += 1;
  });
});

describe('the list of invoices', () => {
  it('finds by number and customer, and sums what is owed', async () => {
    const all = await owner.get('/api/invoices').query({ state: 'all', find: 'naka' }).expect(200);
    expect((all.body as { total: number; owedCents: number }).total).toBe(lastNumber - 1000 + 1);
    const unpaid = await owner.get('/api/invoices').expect(200);
    expect((unpaid.body as { total: number; owedCents: number }).owedCents).toBe(4 * 26_160 + 26_160);
    await sefa.get('/api/invoices').expect(403);
    const page = async (before?: number) =>
      (await owner.get('/api/invoices').query({ state: 'all', limit: 2, ...(before && { before }) })).body as {
        total: number;
        invoices: { number: number }[];
      };
    const one = await page();
    const two = await page(one.invoices[0]?.number);
    expect([one.total, two.total]).toEqual([lastNumber - 1000 + 1, lastNumber - 1000 + 1]);
    expect(two.invoices[0]?.number).toBe(one.invoices[1]?.number);
  });

  it('Done can’t be taken back once its invoice has gone out', async () => {
    const { job, visit } = await aDoneJob(test, company, owner);
    await owner.post(`/api/jobs/${job.id}/invoice`).expect(200);
    const undo = { key: key(), kind: 'undo', deviceAt: test.time.now };
    const answer = await sefa.post(`/api/visits/${visit.id}/actions`).send(undo).expect(409);
    expect(faultOf(answer).message).toMatch(/^Invoice \d+ has gone out/);
  });
});
