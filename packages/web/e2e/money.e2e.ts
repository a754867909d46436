import { v4 as uuid } from 'uuid';
import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { complaintsOf } from './support/browser.ts';
import { TODAY } from './support/moment.ts';
import { openPage, useStage } from './support/stage.ts';

// A job is done: the dispatcher bills it and records a check, the owner gives a part of it back.
const stage = useStage();
let desk: BrowserContext;
let dispatcher: Page;
let owner: Page;
let visit: { id: string; jobId: string; customerName: string };
let number = '';

async function json<T>(asked: ReturnType<BrowserContext['request']['get']>): Promise<T> {
  const answer = await asked;
  if (!answer.ok()) throw new Error(`${answer.url()} answered ${answer.status()}: ${await answer.text()}`);
  return (await answer.json()) as T;
}

beforeAll(async () => {
  const house = await stage.enter('owner');
  // The bill that is issued by itself when Done can't be taken back any more must not be faster than the test.
  const { settings } = await json<{ settings: object }>(house.request.get('/api/settings'));
  await json(house.request.put('/api/settings', { data: { ...settings, undoSeconds: 600 } }));
  desk = await stage.enter('dispatch');
  const asked = await desk.request.get(`/api/board/${TODAY}`);
  const { visits } = (await asked.json()) as { visits: (typeof visit & { progress: string })[] };
  visit = visits.find(({ progress }) => progress === 'working') ?? { id: '', jobId: '', customerName: '' };
  const deviceAt = asked.headers()['x-now'];
  await json(desk.request.post(`/api/visits/${visit.id}/actions`, { data: { key: uuid(), kind: 'finish', deviceAt } }));
  dispatcher = await openPage(desk, `/board?visit=${visit.id}`);
  owner = await openPage(house, '/money');
});

const bill = (page: Page) => page.locator('.bl');

test('a dispatcher bills a job that is done from its ticket, with the next number', async () => {
  await dispatcher.getByRole('button', { name: 'Bill', exact: true }).click();
  await bill(dispatcher).getByText('The work is done and not billed yet.').waitFor();
  await bill(dispatcher).getByRole('button', { name: 'Bill now' }).click();
  const title = dispatcher.getByRole('heading', { name: /^Invoice \d+$/ });
  await title.waitFor();
  number = /\d+/.exec(await title.innerText())?.[0] ?? '';
  expect(await bill(dispatcher).getByRole('button', { name: 'Give back' }).count()).toBe(0);
});

test('a check over what is owed is refused at the amount; the right one is recorded once, pressed twice', async () => {
  await bill(dispatcher).getByRole('button', { name: 'Record a payment' }).click();
  const form = dispatcher.getByRole('form', { name: 'Record a payment' });
  const amount = form.getByLabel('Towards the invoice');
  const owed = await amount.inputValue();
  await amount.fill('9,999.00');
  await form.getByLabel('Check number').fill('1043');
  await form.getByRole('button', { name: 'Record check' }).click();
  await form.getByText(/^Only [\d,.]+ is owed\. Give change/).waitFor();
  expect(await form.getByLabel('Check number').inputValue()).toBe('1043');
  await amount.fill(owed);
  await form.getByRole('button', { name: 'Record check' }).dblclick();
  await form.waitFor({ state: 'detached' });
  await bill(dispatcher)
    .getByRole('row', { name: /^Check .*1043/ })
    .waitFor();
  const found = await json<{ bill: { payments: object[]; owedCents: number } }>(
    desk.request.get(`/api/jobs/${visit.jobId}/bill`),
  );
  expect(found.bill).toMatchObject({ owedCents: 0, payments: [{ method: 'check', reference: '1043' }] });
});

test('the owner finds the invoice and gives a part of a line back, with its tax', async () => {
  const complaints = complaintsOf(owner);
  await owner.getByRole('button', { name: 'Paid', exact: true }).click();
  await owner.getByRole('searchbox', { name: 'Find invoices' }).fill(number);
  await owner.getByRole('link', { name: number }).click();
  await bill(owner).getByRole('button', { name: 'Give back' }).click();
  const form = owner.getByRole('form', { name: 'Give back' });
  await form.getByRole('button', { name: 'Lines of the invoice' }).click();
  await form
    .getByLabel(/^Before tax, of/)
    .first()
    .fill('20');
  await form.getByRole('button', { name: /^Give back 2\d\.\d\d$/ }).click();
  await form.getByText('Say why.').waitFor();
  await form.getByLabel('Why, as the credit note says it').fill('Streaks on the hood');
  const result = await form.getByRole('status').innerText();
  expect(result).toMatch(/^20\.00 and \d\.\d\d tax are credited, (2\d\.\d\d) in all\. \1 goes back by check/);
  await form.getByRole('button', { name: /^Give back 2\d/ }).click();
  await form.waitFor({ state: 'detached' });
  await bill(owner)
    .getByRole('row', { name: /^Credit note \d+ .*Streaks on the hood/ })
    .waitFor();
  await bill(owner)
    .getByRole('row', { name: /^Given back/ })
    .waitFor();
  expect(complaints).toEqual([]);
});

test('the invoice is a file of its own, and the day’s close tells of both', async () => {
  const file = await desk.request.get(`/api/jobs/${visit.jobId}/invoice.pdf`);
  expect([file.status(), file.headers()['content-type']]).toEqual([200, 'application/pdf']);
  await owner.getByRole('link', { name: 'Day’s close' }).click();
  const methods = owner.getByRole('region', { name: 'Received and given back' });
  const check = await methods.getByRole('row', { name: /^Check/ }).innerText();
  expect(check).toMatch(/−2\d\.\d\d/);
});
