import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { BrowserContext } from 'playwright-core';
import { inTurn, median, timed, type Ratio } from '../../api/bench/measure.ts';
import type { TestPostgres } from '../../api/src/testing/database.ts';
import { launchBrowser, openContext, signIn } from '../e2e/support/browser.ts';
import { untilKept } from '../e2e/support/kept.ts';
import { NOON } from '../e2e/support/moment.ts';
import { startServer } from '../e2e/support/server.ts';

const ROUNDS = 15;
const BARE = '<!doctype html><meta charset="utf-8"><title>Bare</title><article>One visit</article>';

/** Opening the run sheet again in a dead zone, until its visit at hand shows, against a page of one line. */
export async function benchOpenOffline(postgres: TestPostgres): Promise<Ratio> {
  const [server, browser] = await Promise.all([startServer(postgres, { demo: true, now: NOON }), launchBrowser()]);
  const bare = createServer((_, response) => void response.setHeader('content-type', 'text/html').end(BARE));
  await new Promise<void>((resolve) => bare.listen(0, '127.0.0.1', resolve));
  try {
    const bareUrl = `http://127.0.0.1:${(bare.address() as AddressInfo).port}`;
    const plain = await openContext(browser, { url: bareUrl, size: 'phone' });
    const phone = await openContext(browser, { url: server.url, size: 'phone', serviceWorkers: 'allow' });
    await signIn(phone, 'tech3');
    const page = await phone.newPage();
    await page.goto('/run-sheet');
    await page.getByRole('article').first().waitFor();
    await untilKept(page);
    await page.close();
    await phone.setOffline(true);
    const [sheet, one] = await inTurn(
      ROUNDS,
      3,
      () => openIn(phone, '/run-sheet'),
      () => openIn(plain, '/'),
    );
    const note = `${median(sheet).toFixed(0)} ms against ${median(one).toFixed(0)} ms here, in Chromium without a phone's slower processor`;
    return { what: 'run sheet opened again offline / bare page', ratio: median(sheet) / median(one), goal: 8, note };
  } finally {
    await browser.close();
    bare.close();
    await server.stop();
  }
}

/** @returns milliseconds from the address until the first card is there */
async function openIn(context: BrowserContext, path: string): Promise<number> {
  const page = await context.newPage();
  const length = await timed(async () => {
    await page.goto(path, { waitUntil: 'commit' });
    await page.getByRole('article').first().waitFor();
  });
  await page.close();
  return length;
}
