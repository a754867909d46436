import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { TODAY } from './support/moment.ts';
import { openPage, untilKept, useStage } from './support/stage.ts';

const stage = useStage();
let phone: BrowserContext;
let page: Page;

beforeAll(async () => {
  phone = await stage.enter('tech3', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
});

const bills = async () =>
  ((await (await phone.request.get(`/api/run-sheet/${TODAY}/bills`)).json()) as { bills: BillDto[] }).bills;
/** A visit of today that is done and owed for; what others paid meanwhile is left alone. */
const owedVisit = async (): Promise<{ visit: RunVisitDto; bill: BillDto }> => {
  const sheet = (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;
  const all = await bills();
  for (const visit of sheet.visits) {
    const bill = all.find((one) => one.jobId === visit.jobId);
    if (bill && bill.owedCents > 0) return { visit, bill };
  }
  throw new Error('the demo day has a bill that is owed');
};
const billOf = async (jobId: string) => (await bills()).find((bill) => bill.jobId === jobId);

test('cash taken in a dead zone counts at once, and arrives once when there is signal', async () => {
  const { visit, bill } = await owedVisit();
  await page.goto(`/run-sheet/${TODAY}/job/${visit.id}/pay`);
  await page.getByText('To pay').waitFor();
  await phone.setOffline(true);
  await page.getByRole('button', { name: 'Card' }).click();
  await page.getByText('A card needs it.').waitFor();
  await page.getByRole('button', { name: 'Another way' }).click();
  await page.getByRole('button', { name: 'Cash' }).click();
  await page.getByLabel('Towards the invoice').fill('9999');
  await page.getByText(/Only .* is owed/).waitFor();
  await page.getByLabel('Towards the invoice').fill('20.00');
  await page.getByRole('radio', { name: 'Else' }).click();
  await page.getByLabel('Tip in dollars').fill('3.50');
  await page.getByRole('button', { name: 'Cash 23.50' }).click();
  await page.getByRole('button', { name: 'Yes, taken' }).click();
  await page.getByText('1 change kept here').waitFor();
  await page.getByText('waiting to send', { exact: true }).waitFor();
  await page.reload();
  await page.getByText('waiting to send', { exact: true }).waitFor();
  await phone.setOffline(false);
  await page.getByText('waiting to send', { exact: true }).waitFor({ state: 'detached' });
  expect(await billOf(visit.jobId)).toMatchObject({
    ...{ owedCents: bill.owedCents - 2000, payments: [{ method: 'cash', amountCents: 2000 }] },
  });
});

test('a customer scans the code, pays with a tip on the own phone, and the crew sees it', async () => {
  const { visit } = await owedVisit();
  await page.goto(`/run-sheet/${TODAY}/job/${visit.id}/pay`);
  await page.getByRole('button', { name: 'Card' }).click();
  await page.getByRole('img', { name: /scans this/ }).waitFor();
  const answer = await phone.request.post(`/api/jobs/${visit.jobId}/pay-link`);
  const { url } = (await answer.json()) as { url: string };

  const customer = await stage.visit({ size: 'phone' });
  const own = await openPage(customer, new URL(url).pathname);
  await own.getByRole('radio', { name: 'Else' }).click();
  await own.getByLabel('Tip in dollars').fill('12');
  await own.getByText('With 12.00 tip').waitFor();
  await own.getByRole('button', { name: 'Pay by card' }).click();
  await own.getByRole('button', { name: /^Pay \$/ }).click();
  // With the 3.50 that was given in cash.
  await own.getByText('15.50 went to the crew').waitFor();
  await own.getByRole('radio', { name: 'Spotless' }).click();
  await own.getByRole('button', { name: 'Send it' }).click();
  await own.getByRole('button', { name: 'Change it' }).waitFor();
  // Back from the payments page and a reload: nothing is asked for twice.
  await own.reload();
  await own.getByRole('link', { name: 'Call us' }).waitFor();
  expect(await own.getByRole('button', { name: 'Pay by card' }).count()).toBe(0);

  await page.getByText('Nothing is owed.').waitFor();
  expect(await billOf(visit.jobId)).toMatchObject({ owedCents: 0 });
});

test('a link that was not signed here opens nothing', async () => {
  const stranger = await stage.visit({ size: 'phone' });
  const nowhere = await openPage(stranger, `/c/${'A'.repeat(43)}`);
  await nowhere.getByText('That page is not here.').waitFor();
});
