import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, expect, test, vi } from 'vitest';

import type { ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import { TODAY } from './support/moment.ts';
import { openPage, PATIENCE, untilKept, useStage } from './support/stage.ts';
import { cameraPhoto, takePhoto, untilWalkKept, walkCarOf } from './support/walk-round.ts';

/** The server ends and comes back at the same address meanwhile: it is this file's own. */
const stage = useStage();
let phone: BrowserContext;
let page: Page;

beforeAll(async () => {
  phone = await stage.enter('tech1', { size: 'phone', serviceWorkers: 'allow' });
  page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
});

/** Numbers that look like chance and are the same on every run (Park and Miller's generator, common knowledge). */
function chance(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48_271) % 2_147_483_647) / 2_147_483_647;
}

const toggles: ClockKindName[] = [
  ...(['shop', 'travel', 'waiting', 'rest_break', 'shop', 'travel', 'shop', 'waiting'] as const),
  ...(['travel', 'rest_break', 'shop', 'travel'] as const),
];
const tips = ['5', '10', '15'];
const PHOTOS = 3;

const ownClock = async () => ((await (await phone.request.get('/api/clock')).json()) as { clock: ClockStateDto }).clock;
const ownSheet = async () => (await (await phone.request.get(`/api/run-sheet/${TODAY}`)).json()) as RunSheetDto;

test(
  'a day of twenty presses and photos with the line cut at random, a killed server and a closed app arrives once each, in order',
  async () => {
    const random = chance(20_260_514);
    const before = new Set((await ownClock()).today.map((entry) => entry.id));
    let pressed = 0;
    const next = (await ownSheet()).visits.find((one) => one.progress === 'placed');
    if (!next) throw new Error('the demo day has a visit that is placed');
    await untilWalkKept(page, next.id);
    const photo = await cameraPhoto(page, 800, 600);
    /** Before each press the line goes or comes back; twice worse things happen. */
    const weather = async () => {
      pressed += 1;
      await phone.setOffline(random() < 0.5);
      if (pressed === 5) await stage.server.kill();
      if (pressed === 11) await stage.server.again();
      if (pressed === 14) {
        await page.close();
        page = await openPage(phone, '/run-sheet');
      }
    };
    const go = async (path: string) => {
      if (new URL(page.url()).pathname !== path) await page.goto(path);
    };

    await go('/run-sheet');
    for (const step of ['On my way', 'Arrived']) {
      await weather();
      await page.getByRole('button', { name: step, exact: true }).click();
      await page.getByRole('button', { name: step, exact: true }).waitFor({ state: 'detached' });
    }
    for (let taken = 0; taken < PHOTOS; taken += 1) {
      await weather();
      await go(`/walk-round/${next.id}`);
      await takePhoto(page, photo);
      await page.getByRole('figure').nth(taken).waitFor();
    }
    for (const amount of tips) {
      await weather();
      await go('/run-sheet');
      await page.getByRole('button', { name: 'Tip', exact: true }).click();
      await page.getByLabel('Amount').fill(amount);
      await page.getByRole('radio', { name: 'Card' }).click();
      await page.getByRole('button', { name: 'Record the tip' }).click();
      await page.getByRole('dialog').waitFor({ state: 'detached' });
    }
    for (const kind of toggles) {
      await weather();
      await go('/clock');
      const toggle = page.getByRole('group', { name: 'Kind of time' }).getByRole('button', {
        name: new RegExp(`^${clockKindNames[kind]}`),
      });
      await toggle.click();
      await toggle.and(page.locator('[aria-pressed="true"]')).waitFor();
    }
    expect(pressed).toBe(20);

    await phone.setOffline(false);
    await page.goto('/run-sheet');
    await page.getByRole('article').waitFor();
    // Ids are made in the order in which the server took the presses; the visit's own marks switched the clock first.
    const kinds = async () =>
      (await ownClock()).today
        .filter((entry) => !before.has(entry.id))
        .sort((a, b) => (a.id < b.id ? -1 : 1))
        .map((entry) => entry.kind);
    await vi.waitFor(async () => expect(await kinds()).toEqual(['travel', 'job', ...toggles]), {
      timeout: 3 * PATIENCE,
      interval: 250,
    });
    await page.getByText('kept here').waitFor({ state: 'detached' });

    const visit = (await ownSheet()).visits.find((one) => one.progress === 'on_site');
    expect(visit?.times.setOffAt).not.toBeNull();
    expect(visit?.times.arrivedAt).not.toBeNull();
    const { photos } = await walkCarOf(phone, next.id);
    expect(photos.map((one) => one.isStored)).toEqual(Array.from({ length: PHOTOS }, () => true));
    const owner = await stage.enter('owner');
    const { job } = (await (await owner.request.get(`/api/jobs/${visit?.jobId}`)).json()) as {
      job: { tips: { amountCents: number }[] };
    };
    expect(job.tips.map((tip) => tip.amountCents)).toEqual(tips.map((amount) => Number(amount) * 100));
  },
  12 * PATIENCE,
);
