import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

import type { Browser, BrowserContext } from 'playwright-core';

import { testPostgresFromEnvironment } from '../../api/src/testing/database.ts';
import { launchBrowser, openContext, signIn } from './support/browser.ts';
import { NOON } from './support/moment.ts';
import { logins, screens, show, type Screen, type Size } from './support/screens.ts';
import { startServer } from './support/server.ts';

// npm run screens: a picture of every screen, per role, at a desk and on a phone. With `--docs` also the
// pictures that the documentation shows; a word picks screens by their name.
const root = fileURLToPath(new URL('../../../', import.meta.url));
const folder = join(root, '.screens');
const docs = join(root, 'docs/pictures');
const zone = 'America/New_York';

/** What the documentation shows, each from one of the screens. */
const pictures: { file: string; name: string; role: Screen['role']; size: Size }[] = [
  { file: 'board.png', name: 'board', role: 'dispatcher', size: 'desk' },
  { file: 'run-sheet.png', name: 'run-sheet', role: 'technician', size: 'phone' },
  { file: 'pay-week.png', name: 'pay-week', role: 'owner', size: 'desk' },
];

const forDocs = process.argv.includes('--docs');
const words = process.argv.slice(2).filter((word) => !word.startsWith('--'));
const wanted = screens.filter(({ name }) => words.length === 0 || words.some((word) => name.includes(word)));

const postgres = testPostgresFromEnvironment();
const browser = await launchBrowser();
try {
  if (words.length === 0) await rm(folder, { recursive: true, force: true });
  await mkdir(folder, { recursive: true });
  if (forDocs) await mkdir(docs, { recursive: true });
  await takeDemo();
  if (words.length === 0) await takeSetUp();
} finally {
  await browser.close();
}

async function takeDemo(): Promise<void> {
  const server = await startServer(postgres, { demo: true, now: NOON });
  try {
    for (const size of ['desk', 'phone'] as const) {
      for (const role of ['nobody', 'owner', 'dispatcher', 'technician', 'crew'] as const) {
        const own = wanted.filter((screen) => screen.role === role && !(screen.isPhoneOnly && size === 'desk'));
        if (own.length === 0) continue;
        const context = await enter(browser, server.url, role, size);
        for (const screen of own) await take(context, screen, size);
        await context.close();
      }
    }
  } finally {
    await server.stop();
  }
}

async function takeSetUp(): Promise<void> {
  const server = await startServer(postgres, { demo: false, now: NOON });
  try {
    for (const size of ['desk', 'phone'] as const) {
      const context = await enter(browser, server.url, 'nobody', size);
      await take(context, { name: 'set-up', role: 'nobody', path: '/set-up' }, size);
      await context.close();
    }
  } finally {
    await server.stop();
  }
}

async function enter(own: Browser, url: string, role: Screen['role'], size: Size): Promise<BrowserContext> {
  const context = await openContext(own, { url, size, timezoneId: zone });
  if (role !== 'nobody') await signIn(context, logins[role]);
  return context;
}

async function take(context: BrowserContext, screen: Screen, size: Size): Promise<void> {
  const page = await context.newPage();
  await show(page, context, screen);
  const path = join(folder, `${screen.role}-${screen.name}-${size}.png`);
  await page.screenshot({ path });
  const shown = pictures.find((one) => one.name === screen.name && one.role === screen.role && one.size === size);
  if (forDocs && shown) await page.screenshot({ path: join(docs, shown.file) });
  await page.close();
  process.stdout.write(`${path.slice(root.length)}${forDocs && shown ? ` and docs/pictures/${shown.file}` : ''}\n`);
}
