import type { Page } from 'playwright-core';

/** Waits until the phone has everything for a dead zone: the worker in charge, the shell and its pages kept. */
export async function untilKept(page: Page): Promise<void> {
  await page.waitForFunction(async () => {
    const cache = await caches.open('driprail-shell-1');
    // The shell goes in last, after the files it needs.
    return navigator.serviceWorker.controller !== null && (await cache.match('/')) !== undefined;
  });
}
