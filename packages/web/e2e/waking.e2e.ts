import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test, vi } from 'vitest';

import { openPage, useStage } from './support/stage.ts';

const stage = useStage();
let phone: BrowserContext;
let page: Page;

beforeAll(async () => {
  phone = await stage.enter('tech3', { size: 'phone', serviceWorkers: 'allow' });
  await phone.grantPermissions(['notifications'], { origin: stage.server.url });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await page.evaluate(async () => (await navigator.serviceWorker.ready).active?.state);
});

/** Hands the worker what a push service would, through the browser's debugging protocol. */
async function deliver(message: object): Promise<void> {
  const debug = await phone.newCDPSession(page);
  const registration = new Promise<string>((resolve) => {
    debug.on('ServiceWorker.workerRegistrationUpdated', ({ registrations }) => {
      const [first] = registrations;
      if (first) resolve(first.registrationId);
    });
  });
  await debug.send('ServiceWorker.enable');
  await debug.send('ServiceWorker.deliverPushMessage', {
    origin: stage.server.url,
    registrationId: await registration,
    data: JSON.stringify(message),
  });
}

test('a push shows that the run sheet changed, and nothing of whom, where or when', async () => {
  await deliver({ kind: 'run_sheet' });
  const shown = () =>
    page.evaluate(async () => {
      const worker = await navigator.serviceWorker.ready;
      return (await worker.getNotifications()).map(({ title, body }) => ({ title, body }));
    });
  await vi.waitFor(async () => expect(await shown()).toHaveLength(1));
  expect(await shown()).toEqual([{ title: 'Your run sheet changed', body: 'Open it to see what is new.' }]);
});

test('the switch says what to do where the browser will not', async () => {
  const strict = await stage.enter('tech5', { size: 'phone', serviceWorkers: 'allow' });
  const account = await openPage(strict, '/account');
  await account.getByLabel(/Tell me when my run sheet changes/).click();
  await account.getByText('Allow them in its settings for this site.').waitFor();
  expect(await account.getByLabel(/Tell me when my run sheet changes/).isChecked()).toBe(false);
});
