import { beforeAll, expect, it, vi } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { useCardsApp } from '../../testing/local-cards.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';

const test = useCardsApp();
const DAY = '2026-05-14';
let company: TestCompany;
let owner: TestAgent;

const pay = async (jobId: string, fields: object): Promise<BillDto> => {
  const body = { key: key(), method: 'cash', deviceAt: test.time.now, ...fields };
  return ((await owner.post(`/api/jobs/${jobId}/payments`).send(body).expect(200)).body as { bill: BillDto }).bill;
};
const refund = (paymentId: string | undefined, fields: object) =>
  owner
    .post(`/api/payments/${paymentId}/refunds`)
    .send({ ...{ key: key(), kind: 'refund', lines: [], reasonId: null, note: 'Streaks on the hood' }, ...fields })
    .expect(200);
const close = async (day = DAY) =>
  ((await owner.get(`/api/money/days/${day}`).expect(200)).body as { close: MoneyDayDto }).close;
const lines = ({ difference }: MoneyDayDto) =>
  Object.fromEntries(difference.filter(({ cents }) => cents !== 0).map(({ kind, cents }) => [kind, cents]));
/** What is not explained; zero whatever happened. */
const unexplained = ({ invoiced, netReceivedCents, difference }: MoneyDayDto) =>
  difference.reduce((left, { cents }) => left - cents, invoiced.totalCents - netReceivedCents);

beforeAll(async () => {
  company = await aCompany(test);
  owner = await company.owner();
  await owner
    .post('/api/tax-rates')
    .send({ name: 'State sales tax', taxClass: 'standard', place: '', percent: '6.25', startsOn: '2026-01-01' })
    .expect(200);
});

it('of a day without money is zero everywhere, and only for the desk', async () => {
  const empty = await close();
  expect(empty).toMatchObject({ netReceivedCents: 0, cardTips: { count: 0 }, openPages: [] });
  expect(empty.methods.map(({ method }) => method)).toEqual(['cash', 'check', 'transfer', 'card']);
  await (await company.sefa()).get(`/api/money/days/${DAY}`).expect(403);
  await owner.get('/api/money/days/2026-02-30').expect(400);
});

it('names every cent between what was invoiced and what was received', async () => {
  // A deposit the day before, in New York still the 13th.
  const { job } = await company.aJob();
  test.time.now = '2026-05-14T03:00:00Z';
  await pay(job.id, { method: 'check', amountCents: 5000 });
  expect(lines(await close('2026-05-13'))).toEqual({ for_unbilled: -5000 });
  // A job done and billed on the 14th, paid in parts; another by card with a tip; a payment typed twice.
  const done = (await aDoneJob(test, company, owner)).job;
  await pay(done.id, { amountCents: 10_000, tipCents: 700 });
  const typed = await pay(done.id, { amountCents: 2000, method: 'transfer' });
  await refund(typed.payments.find(({ method }) => method === 'transfer')?.id, { kind: 'mistake', amountCents: 2000 });
  const carded = (await aDoneJob(test, company, owner)).job;
  const { url } = (await owner.post(`/api/jobs/${carded.id}/pay-link`).expect(200)).body as { url: string };
  const card = `/api/customer-pages/${url.split('/c/')[1]}/card`;
  const opened = await test.anonymous().post(card).send({ tipCents: 1500 }).expect(200);
  expect((await close()).openPages).toMatchObject([{ jobId: carded.id, amountCents: 25_500, tipCents: 1500 }]);
  await test.press((opened.body as { url: string }).url, 'pay');
  await vi.waitFor(async () => expect((await close()).openPages).toEqual([]));
  const day = await close();
  expect(day).toMatchObject({
    invoiced: { count: 2, netCents: 48_000, taxCents: 3000, totalCents: 51_000 },
    mistaken: { count: 1, cents: 2000 },
    cardTips: { count: 1, cents: 1500 },
    netReceivedCents: 35_500,
    cash: { takenCents: 10_700, tipCents: 700, countedCents: 0, stillOut: [{ cents: 10_700 }] },
  });
  expect(day.methods.find(({ method }) => method === 'card')).toMatchObject({ received: { count: 1, cents: 25_500 } });
  expect(lines(day)).toEqual({ owed: 15_500 });
  expect(unexplained(day)).toBe(0);
});

it('money given back and for earlier invoices is of the day it moved on', async () => {
  const { invoices } = (await owner.get('/api/invoices').query({ state: 'paid' }).expect(200)).body as {
    invoices: { jobId: string }[];
  };
  const jobId = invoices[0]?.jobId ?? '';
  const { bill } = (await owner.get(`/api/jobs/${jobId}/bill`)).body as { bill: BillDto };
  test.time.now = '2026-05-15T14:00:00Z';
  await refund(bill.payments[0]?.id, { lines: [{ id: bill.lines[0]?.id, netCents: 4800 }], amountCents: 5100 });
  const before = await close();
  expect(before.credited).toEqual({ count: 0, cents: 0 });
  const day = await close('2026-05-15');
  expect(day).toMatchObject({ credited: { count: 1, cents: 5100 }, netReceivedCents: -5100 });
  expect(lines(day)).toEqual({ for_earlier: 5100 });
  expect([unexplained(day), unexplained(before)]).toEqual([0, 0]);
});

it('is exported as rows, in which no name becomes a formula', async () => {
  const { job } = await aDoneJob(test, company, owner);
  test.time.now = '2026-05-16T14:00:00Z';
  await pay(job.id, { method: 'check', amountCents: 100, reference: '=HYPERLINK("x")' });
  const answer = await owner
    .get('/api/money/days/2026-05-16/payments.csv')
    .expect(200)
    .expect('content-type', /text\/csv/);
  const [head, row] = answer.text.split('\r\n');
  expect(head).toBe('time,kind,method,job,invoice,customer,amount,tip,by,reference,state');
  expect(row).toMatch(/^2026-05-16T10:00:00-04:00,payment,check,\d+,\d+,Nakagawa,1\.00,0\.00,Rowan Tern,/);
  expect(row).toContain(`"'=HYPERLINK(""x"")"`);
  const back = await owner.get('/api/money/days/2026-05-15/payments.csv').expect(200);
  expect(back.text).toContain(',refund,card,');
  expect(back.text).toContain(',-51.00,');
});
