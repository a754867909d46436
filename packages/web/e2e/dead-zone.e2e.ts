import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { TODAY } from './support/moment.ts';
import { openPage, untilKept, useStage } from './support/stage.ts';
import { startWithoutWalk } from './support/walk-round.ts';

const stage = useStage();
let phone: BrowserContext;
let page: Page;

beforeAll(async () => {
  phone = await stage.enter('tech3', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
});

const sheetAt = async () => (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;
const onSite = async (): Promise<RunVisitDto> => {
  const visit = (await sheetAt()).visits.find((other) => other.progress === 'on_site');
  if (!visit) throw new Error('the demo day has a visit on site');
  return visit;
};

test('a day in a dead zone: nothing is lost, also when the app is closed and opened again', async () => {
  const visit = await onSite();
  await phone.setOffline(true);
  await page.reload();
  await page.getByText('No signal. Every press is kept.').waitFor();
  await startWithoutWalk(page);
  await page.getByText('1 change kept here').waitFor();
  await page.close();

  page = await phone.newPage();
  await page.goto('/run-sheet');
  await page.getByRole('button', { name: 'Done', exact: true }).click();
  await page.getByRole('button', { name: 'Yes, done' }).click();
  await page.getByText('2 changes kept here').waitFor();
  expect((await phone.cookies()).length).toBeGreaterThan(0);

  await phone.setOffline(false);
  await page.getByText('kept here').waitFor({ state: 'detached' });
  const after = (await sheetAt()).visits.find((other) => other.id === visit.id);
  expect(after?.progress).toBe('done');
  expect(Date.parse(after?.times.endedAt ?? '')).toBeGreaterThanOrEqual(Date.parse(after?.times.startedAt ?? ''));
});

test('a press that has not left the phone is taken back on it', async () => {
  await phone.setOffline(true);
  await page.getByRole('button', { name: 'On my way' }).click();
  await page.getByText('1 change kept here').waitFor();
  await page.getByRole('button', { name: /^Take back “On my way/ }).click();
  await page.getByText('kept here').waitFor({ state: 'detached' });
  await page.getByRole('button', { name: 'On my way' }).waitFor();
  await phone.setOffline(false);
});

test('what the server can’t take is shown with its reason, and dropped only by a person', async () => {
  const next = (await sheetAt()).visits.find((visit) => visit.progress === 'placed');
  await phone.setOffline(true);
  await page.getByRole('button', { name: 'On my way' }).click();
  await page.getByText('1 change kept here').waitFor();
  const desk = await stage.enter('dispatch');
  const job = (await (await desk.request.get(`/api/jobs/${next?.jobId}`)).json()) as { job: { version: number } };
  const off = await desk.request.post(`/api/jobs/${next?.jobId}/call-off`, {
    data: { version: job.job.version, reason: 'Weather' },
  });
  expect(off.status()).toBe(200);
  await phone.setOffline(false);
  await page.getByText(/On my way can’t follow Called off/).waitFor();
  await page.getByRole('button', { name: 'Settled' }).click();
  await page.getByText(/can’t follow Called off/).waitFor({ state: 'detached' });
});
