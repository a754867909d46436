import AxeBuilder from '@axe-core/playwright';
import type { BrowserContext, Page } from 'playwright-core';
import { describe, expect, inject, test } from 'vitest';

import { complaintsOf } from './support/browser.ts';
import { logins, screens, settled, show, type Screen } from './support/screens.ts';
import { startServer } from './support/server.ts';
import { useStage } from './support/stage.ts';

// Every screen, as each role sees it, at a desk and on a phone.
const stage = useStage();
const contexts = new Map<string, Promise<BrowserContext>>();

function contextFor(role: Screen['role'], size: 'desk' | 'phone'): Promise<BrowserContext> {
  const key = `${role} ${size}`;
  const made = contexts.get(key) ?? (role === 'nobody' ? stage.visit({ size }) : stage.enter(logins[role], { size }));
  contexts.set(key, made);
  return made;
}

describe.concurrent.each(screens)('$role, $name', (screen) => {
  test.skipIf(screen.isPhoneOnly)('holds at a desk', () => hold(screen, 'desk'));
  test('holds on a phone of 390 px', () => hold(screen, 'phone'));
});

// One after another: pages of one context share where the choice of ground is kept.
describe.each(screens.filter((screen) => screen.hasGrounds))('$role, $name', (screen) => {
  test.each(['night', 'sun'] as const)('can be read in the %s', async (ground) => {
    const context = await contextFor(screen.role, screen.isPhoneOnly ? 'phone' : 'desk');
    const page = await context.newPage();
    await page.addInitScript((theme) => localStorage.setItem('driprail-theme', theme), ground);
    await show(page, context, screen);
    expect(await page.locator('html').getAttribute('data-theme')).toBe(ground);
    expect(await barriersOn(page)).toEqual([]);
    await page.evaluate(() => localStorage.removeItem('driprail-theme'));
    await page.close();
  });
});

test('setting up an empty company holds on a phone of 390 px', async () => {
  const server = await startServer(inject('testPostgres'), { demo: false });
  try {
    const context = await stage.visit({ size: 'phone' });
    const page = await context.newPage();
    const watched = watch(page, server.url);
    await page.goto(server.url);
    await page.getByRole('heading', { name: 'Set up' }).waitFor();
    await settled(page);
    await holds(page, watched);
  } finally {
    await server.stop();
  }
});

async function hold(screen: Screen, size: 'desk' | 'phone'): Promise<void> {
  const context = await contextFor(screen.role, size);
  const page = await context.newPage();
  const watched = watch(page, stage.server.url);
  await show(page, context, screen);
  await holds(page, watched);
  await page.close();
}

interface Watched {
  complaints: string[];
  strangers: string[];
}

/** Notes what a page complains about and whom else it asks. */
function watch(page: Page, url: string): Watched {
  const strangers: string[] = [];
  page.on('request', (request) => {
    const asked = new URL(request.url());
    if (asked.protocol.startsWith('http') && asked.host !== new URL(url).host) strangers.push(request.url());
  });
  return { complaints: complaintsOf(page), strangers };
}

async function holds(page: Page, { complaints, strangers }: Watched): Promise<void> {
  expect(await overhang(page), 'scrolls sideways').toEqual([]);
  expect(await barriersOn(page)).toEqual([]);
  expect(complaints).toEqual([]);
  expect(strangers).toEqual([]);
}

/** What makes the page wider than its window; nothing when it does not scroll sideways. */
function overhang(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    if (scrollWidth <= clientWidth) return [];
    const wide = [...document.querySelectorAll('body *')].filter(
      (element) => element.getBoundingClientRect().right > clientWidth + 1,
    );
    return [`${scrollWidth} of ${clientWidth} px`, ...wide.map((e) => `${e.tagName}.${e.className}`).slice(0, 8)];
  });
}

/** What axe finds that keeps somebody out: serious and critical violations, one line each. */
async function barriersOn(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) =>
      nodes.map(({ target, failureSummary }) => `${id}: ${target.join(' ')}. ${failureSummary}`),
    );
}
