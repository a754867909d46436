import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, describe, expect, test, vi } from 'vitest';

import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { readJpeg } from '@driprail/shared/domain/walk-round/jpeg';
import { signIn } from './support/browser.ts';
import { TODAY } from './support/moment.ts';
import { PATIENCE, openPage, untilKept, useStage } from './support/stage.ts';
import { POSITION, cameraPhoto, takePhoto, untilWalkKept, walkCarOf } from './support/walk-round.ts';

// A technician's walk-round in a dead zone, with photos, the app closed in between, and what the desk sees of it.
const stage = useStage();
let phone: BrowserContext;
let page: Page;
let photo: Buffer;
let visit: RunVisitDto;

const sheetAt = async () => (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;
const visitNow = async () => (await sheetAt()).visits.find(({ id }) => id === visit.id);
const sent = () => page.getByText('kept here').waitFor({ state: 'detached' });
/** Presses a button of the walk-round, or of the sheet that is open over it. */
const press = (name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).click();

beforeAll(async () => {
  phone = await stage.enter('tech3', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
  const found = (await sheetAt()).visits.find(({ progress }) => progress === 'on_site');
  if (!found) throw new Error('the demo day has a visit on site');
  visit = found;
  await untilWalkKept(page, visit.id);
  photo = await cameraPhoto(page);
});

describe('without signal', () => {
  test('photos and marks are kept on the phone, also when the app is closed', async () => {
    await phone.setOffline(true);
    await page.getByRole('link', { name: 'Walk-round' }).first().click();
    for (const taken of [1, 2]) {
      await takePhoto(page, photo);
      await page
        .getByRole('figure')
        .nth(taken - 1)
        .waitFor();
    }
    expect(await page.getByRole('figure').filter({ hasText: 'waiting to send' }).count()).toBe(2);
    await press('Raining');
    await press('Next: Marks');
    await page.getByRole('img', { name: /Hatchback/ }).click({ position: { x: 180, y: 100 } });
    await press('Dent');
    await press('Put it down');
    await page.getByText('Dent hood').waitFor();
    await page.close();

    page = await phone.newPage();
    await page.goto(`/walk-round/${visit.id}`);
    await page.getByRole('figure').nth(1).waitFor();
    expect(await page.getByRole('button', { name: 'Raining' }).getAttribute('aria-pressed')).toBe('true');
    await page.getByRole('button', { name: /^Marks/ }).click();
    await page.getByText('Dent hood').waitFor();
  });

  test('each photo arrives once, though every answer to a piece is lost the first time', async () => {
    const lost = new Set<string>();
    let pieces = 0;
    await phone.route('**/api/photos/*/bytes*', async (route) => {
      const url = route.request().url();
      pieces += 1;
      if (lost.has(url)) return route.continue();
      lost.add(url);
      // The server takes the piece, and the phone never hears of it.
      await route.fetch();
      return route.abort();
    });
    await phone.setOffline(false);
    // A lost answer ends a try; coming to the front begins the next.
    await vi.waitFor(
      async () => {
        await page.evaluate(() => window.dispatchEvent(new Event('online')));
        expect((await walkCarOf(phone, visit.id)).photos.filter(({ isStored }) => isStored)).toHaveLength(2);
      },
      { timeout: 60_000, interval: 300 },
    );
    await sent();
    await phone.unroute('**/api/photos/*/bytes*');
    expect(pieces).toBeGreaterThan(4);
    const { photos } = await walkCarOf(phone, visit.id);
    expect(photos.map(({ view }) => view).sort()).toEqual(['front', 'left']);
    const bytes = await (await phone.request.get(`/api/photos/${photos[0]?.id}`)).body();
    expect(readJpeg(bytes)).toMatchObject({ width: 1600, height: 1200 });
    expect(bytes.toString('latin1')).not.toContain(POSITION);
  });

  test('the walk-round is finished and work starts; both wait and arrive in order', async () => {
    await phone.setOffline(true);
    await press('Next: Condition');
    await press('Glossy');
    await press('Soiled');
    await page.getByLabel(/Odometer/).fill('41,200');
    await press('None seen');
    await press('Next: Customer');
    await press('No, it stays');
    await press('At work');
    await press('Finish walk-round');
    await press('Start work');
    await page.getByRole('button', { name: 'Done', exact: true }).waitFor();
    expect(await page.getByText(/changes? kept here/).innerText()).toContain('2 changes');
    await phone.setOffline(false);
    await sent();
    expect((await visitNow())?.progress).toBe('working');
    expect((await walkCarOf(phone, visit.id)).walkRound).toMatchObject({
      ...{ odometer: 41_200, absentReason: 'At work', missingReason: 'Raining', isLate: false, mayMove: false },
      marks: [{ kind: 'dent', place: 'hood', isAddition: false }],
    });
  });
});

/** The browser's answer of a full disk, to every write, until there is `room`. */
function fillPhone(): void {
  const stores = IDBObjectStore.prototype;
  const put = Object.getOwnPropertyDescriptor(stores, 'put') ?? {};
  stores.put = () => {
    throw new DOMException('no room', 'QuotaExceededError');
  };
  window.addEventListener('room', () => Object.defineProperty(stores, 'put', put), { once: true });
}

describe('what is no photo, or finds no room', () => {
  beforeAll(async () => {
    await page.goto(`/walk-round/${visit.id}`);
    await page.getByRole('button', { name: 'After photos' }).waitFor();
  });

  test.each([
    ['a PDF named as a photo', '%PDF-1.7', 'That file is a PDF'],
    ['a HEIC that this browser can’t open', '\0\0\0\x18ftypheic\0\0\0\0mif1', 'can’t open that HEIC'],
    ['words', 'nothing to see here at all', 'That file is no photo'],
  ])('%s is said to be so', async (_what, content, words) => {
    await takePhoto(page, Buffer.from(content, 'latin1'));
    const said = page.getByRole('alert').filter({ hasText: words });
    await said.waitFor();
    await said.getByRole('button', { name: 'Understood' }).click();
    expect(await page.getByRole('figure').count()).toBe(0);
  });

  test('a photo of 60 MB is made small like any other; a damaged one is said to be too large', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'driprail-photos-'));
    const rest = Buffer.alloc(60 * 1024 * 1024);
    const [whole, damaged] = [join(folder, 'whole.jpg'), join(folder, 'damaged.jpg')];
    await writeFile(whole, Buffer.concat([photo, rest]));
    await writeFile(damaged, Buffer.concat([photo.subarray(0, 200), rest]));
    const camera = page.locator('.ph-act input[type=file]');
    await camera.setInputFiles(damaged);
    const said = page.getByRole('alert').filter({ hasText: 'photo of 60 MB is too large' });
    await said.getByRole('button', { name: 'Understood' }).click();
    await camera.setInputFiles(whole);
    await page.getByRole('figure').filter({ hasText: 'Sefa Lund' }).waitFor();
    await rm(folder, { recursive: true });
  });

  test('a full phone keeps the photo on the page until there is room', async () => {
    await phone.setOffline(true);
    await page.evaluate(fillPhone);
    await takePhoto(page, photo);
    const said = page.getByRole('alert').filter({ hasText: 'This phone is full' });
    await said.waitFor();
    await page.evaluate(() => window.dispatchEvent(new Event('room')));
    await said.getByRole('button', { name: 'Keep the photo' }).click();
    await page.getByRole('figure').filter({ hasText: 'waiting to send' }).waitFor();
    expect(await said.count()).toBe(0);
  });

  test('a session that ended half-way keeps what waits for the same person', async () => {
    await phone.clearCookies();
    await phone.setOffline(false);
    await page.goto('/sign-in');
    await signIn(phone, 'tech3');
    await page.goto(`/walk-round/${visit.id}`);
    await vi.waitFor(
      async () => {
        const { photos } = await walkCarOf(phone, visit.id);
        expect(photos.filter(({ moment, isStored }) => moment === 'after' && isStored)).toHaveLength(2);
      },
      { timeout: PATIENCE, interval: 300 },
    );
  });
});

test('the desk sees before and after side by side, and the marks', async () => {
  const desk = await openPage(await stage.enter('dispatch'), `/board?visit=${visit.id}`);
  await desk.getByRole('link', { name: 'Photos and marks' }).click();
  await desk.getByRole('heading', { name: visit.customerName, level: 1 }).waitFor();
  const figures = desk.getByRole('figure');
  await figures.nth(3).waitFor();
  expect(await figures.filter({ hasText: 'Front' }).count()).toBe(2);
  await desk.getByText('Dent hood').waitFor();
  const pictures = desk.getByRole('figure').getByRole('img');
  await vi.waitFor(
    async () => {
      const sizes = await pictures.evaluateAll((all) => all.map((one) => (one as HTMLImageElement).naturalWidth));
      expect(sizes).toEqual([1600, 1600, 1600, 1600]);
    },
    { timeout: PATIENCE, interval: 200 },
  );
});
