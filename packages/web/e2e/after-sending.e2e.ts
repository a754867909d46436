import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, test } from 'vitest';

import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { TODAY } from './support/moment.ts';
import { openPage, untilKept, useStage } from './support/stage.ts';
import { untilWalkKept } from './support/walk-round.ts';

const stage = useStage();
let phone: BrowserContext;
let page: Page;

beforeAll(async () => {
  phone = await stage.enter('tech1', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
});

test('signal lost right after a press was sent from another page: the phone still shows what was done', async () => {
  const sheet = (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;
  const next = sheet.visits.find((visit) => visit.progress === 'placed');
  if (!next) throw new Error('the demo day has a visit that is placed');
  await untilWalkKept(page, next.id);
  await phone.setOffline(true);
  for (const step of ['On my way', 'Arrived']) {
    await page.getByRole('button', { name: step, exact: true }).click();
    await page.getByRole('button', { name: step, exact: true }).waitFor({ state: 'detached' });
  }
  // The run sheet is left before anything was sent: only the walk-round's page is open when the signal is back.
  await page.goto(`/walk-round/${next.id}`);
  await page.getByText('2 changes kept here').waitFor();
  await phone.setOffline(false);
  await page.getByText('kept here').waitFor({ state: 'detached' });
  await phone.setOffline(true);
  await page.goto('/run-sheet');
  await page.getByText('No signal.').waitFor();
  await page.getByRole('article').getByText('On site').waitFor();
});
