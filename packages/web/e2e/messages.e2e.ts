import { v4 as uuid } from 'uuid';
import type { BrowserContext, Page } from 'playwright-core';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { beforeAll, expect, test } from 'vitest';

import { complaintsOf } from './support/browser.ts';
import { TODAY } from './support/moment.ts';
import { openPage, useStage } from './support/stage.ts';

// A job is booked at the desk, the mail with its calendar file arrives, the crew sets off, and the customer's page follows.
const stage = useStage();
let house: BrowserContext;
let desk: BrowserContext;
let owner: Page;
let placed: BoardDto['visits'][number];

async function json<T>(asked: ReturnType<BrowserContext['request']['get']>): Promise<T> {
  const answer = await asked;
  if (!answer.ok()) throw new Error(`${answer.url()} answered ${answer.status()}: ${await answer.text()}`);
  return (await answer.json()) as T;
}

beforeAll(async () => {
  house = await stage.enter('owner');
  const { settings } = await json<{ settings: object }>(house.request.get('/api/settings'));
  await json(house.request.put('/api/settings', { data: { ...settings, undoSeconds: 0 } }));
  desk = await stage.enter('dispatch');
  const { visits } = await json<BoardDto>(desk.request.get(`/api/board/${TODAY}`));
  for (const visit of visits.filter(({ progress }) => progress === 'placed')) {
    const { customer } = await json<{ customer: CustomerDto }>(desk.request.get(`/api/customers/${visit.customerId}`));
    if (customer.email) placed = visit;
  }
  owner = await openPage(house, '/local-mail');
});

const mail = (subject: RegExp) =>
  owner
    .getByRole('article')
    .filter({ has: owner.getByRole('heading', { name: subject }) })
    .first();

test('a booked job is told by mail with a calendar file', async () => {
  const { job } = await json<{ job: { customerId: string; addressId: string; lines: object[] } }>(
    desk.request.get(`/api/jobs/${placed.jobId}`),
  );
  const lines = (job.lines as { serviceId: string; vehicleId: string | null; sizeClass: string }[]).map(
    ({ serviceId, vehicleId, sizeClass }) => ({ serviceId, vehicleId, sizeClass }),
  );
  const { customerId, addressId } = job;
  const window = { windowFrom: '2026-05-19T14:00:00Z', windowTo: '2026-05-19T16:00:00Z' };
  await json(
    desk.request.post('/api/jobs', {
      data: { customerId, addressId, ...window, notes: '', discountCents: 0, discountReason: '', lines },
    }),
  );
  const file = mail(/^Booked: Tue May 19/).getByRole('link', { name: 'visit.ics' });
  await file.waitFor();
  expect(decodeURIComponent((await file.getAttribute('href')) ?? '')).toContain('DTSTART:20260519T140000Z');
});

test('after “On my way” the mail leads to a page that changes by itself, and can be stopped', async () => {
  const press = async (kind: string) => {
    const asked = await desk.request.get(`/api/board/${TODAY}`);
    const data = { key: uuid(), kind, deviceAt: asked.headers()['x-now'] };
    await json(desk.request.post(`/api/visits/${placed.id}/actions`, { data }));
  };
  await press('set_off');
  const told = mail(/on the way, about/);
  await told.waitFor();
  const link = await told.getByRole('link', { name: /\/c\// }).first().innerText();
  const phone = await stage.visit({ size: 'phone' });
  const page = await openPage(phone, new URL(link).pathname);
  const complaints = complaintsOf(page);
  await page.getByRole('heading', { name: /on the way/i }).waitFor();
  const before = await page.locator('h1').innerText();
  await press('arrive');
  await page.waitForFunction((was) => document.querySelector('h1')?.innerText !== was, before, { timeout: 15_000 });

  const stop = await told.getByRole('link', { name: /\/u\// }).innerText();
  await page.goto(new URL(stop).pathname);
  await page.getByRole('button', { name: 'No more of them' }).click();
  await page.getByRole('heading', { name: 'Stopped' }).waitFor();
  expect(complaints).toEqual([]);
});

test('the desk reads what was sent, and the record of the customer says what was stopped', async () => {
  const page = await openPage(desk, '/messages?show=sent');
  await page.getByRole('list', { name: 'Sent' }).getByText('On the way').first().waitFor();
  await page.goto(`/customers/${placed.customerId}`);
  await page.getByText('The customer stopped mail with news about your jobs').waitFor();
});

test('the owner sees how the words read, and an unknown placeholder is named at its field', async () => {
  await owner.goto('/messages/words');
  await owner.getByRole('button', { name: /^Reminder/ }).click();
  await owner.getByRole('button', { name: 'Show how it reads' }).click();
  await owner
    .frameLocator('iframe[title="The mail"]')
    .getByRole('heading', { name: /^Tomorrow/ })
    .waitFor();
  await owner.getByLabel('Words of the mail').fill('The code is {gate_code}');
  await owner.getByText('{gate_code} is not known here.').waitFor();
  await owner.getByRole('button', { name: 'Save words' }).click();
  await owner.getByRole('button', { name: 'Back to our words' }).click();
  await owner.getByRole('button', { name: 'Save words' }).click();
  await owner.getByRole('button', { name: /^Reminder on$/ }).waitFor();
});
