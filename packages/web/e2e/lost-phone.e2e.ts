import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test, vi } from 'vitest';

import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { emailOf, signIn } from './support/browser.ts';
import { TODAY } from './support/moment.ts';
import { PATIENCE, openPage, untilKept, useStage } from './support/stage.ts';
import { cameraPhoto, takePhoto, untilWalkKept } from './support/walk-round.ts';

// What a phone still holds after its session expired, and after somebody ended it.
const stage = useStage();
let phone: BrowserContext;
let page: Page;

/** How many rows the phone's own store holds. */
const held = () =>
  page.evaluate(
    () =>
      new Promise<Record<string, number>>((resolve, reject) => {
        const opening = indexedDB.open('driprail-phone');
        opening.onerror = () => reject(new Error('no store'));
        opening.onsuccess = () => {
          const names = ['copies', 'drafts', 'files', 'presses'];
          const tx = opening.result.transaction(names);
          const asked = names.map((name) => [name, tx.objectStore(name).count()] as const);
          tx.oncomplete = () => {
            opening.result.close();
            resolve(Object.fromEntries(asked.map(([name, { result }]) => [name, result])));
          };
        };
      }),
  );
const atTheDoor = () => page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();

beforeAll(async () => {
  phone = await stage.enter('tech3', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').first().waitFor();
  await untilKept(page);
  const { visits } = (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;
  const visit = visits.find(({ progress }) => progress === 'on_site');
  if (!visit) throw new Error('the demo day has a visit on site');
  await untilWalkKept(page, visit.id);
  const photo = await cameraPhoto(page, 800, 600);
  await phone.setOffline(true);
  await page.getByRole('link', { name: 'Walk-round' }).first().click();
  await takePhoto(page, photo);
  await page.getByRole('figure').waitFor();
  await page.getByRole('button', { name: 'Raining' }).click();
  await page.getByRole('button', { name: 'Raining', pressed: true }).waitFor();
  expect(await held()).toMatchObject({ drafts: 1, files: 1, presses: 1 });
});

test('an expired session keeps what is not sent, for its person', async () => {
  const cookies = await phone.cookies();
  await phone.clearCookies();
  await phone.setOffline(false);
  await page.goto('/run-sheet');
  await atTheDoor();
  expect(await held()).toMatchObject({ drafts: 1, files: 1, presses: 1 });
  await phone.setOffline(true);
  await phone.addCookies(cookies);
});

test('a login that was switched off takes drafts and photos along on the next contact', async () => {
  const owner = (await stage.enter('owner')).request;
  const { logins } = (await (await owner.get('/api/logins')).json()) as { logins: { id: string; email: string }[] };
  const id = logins.find(({ email }) => email === emailOf('tech3'))?.id;
  expect((await owner.patch(`/api/logins/${id}`, { data: { isActive: false } })).ok()).toBe(true);
  await phone.setOffline(false);
  await page.goto('/run-sheet');
  await atTheDoor();
  await vi.waitFor(async () => expect(await held()).toEqual({ copies: 0, drafts: 0, files: 0, presses: 0 }), {
    timeout: PATIENCE,
    interval: 200,
  });
  // Switched on again, the person begins anew.
  expect((await owner.patch(`/api/logins/${id}`, { data: { isActive: true } })).ok()).toBe(true);
  await signIn(phone, 'tech3');
  await page.goto('/run-sheet');
  await page.getByRole('article').first().waitFor();
});
