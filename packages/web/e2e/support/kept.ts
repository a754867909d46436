import type { Page } from 'playwright-core';

/** Waits until the phone has everything for a dead zone: a worker is in charge only once it kept the shell and its pages. */
export async function untilKept(page: Page): Promise<void> {
  // Not an async question: waitForFunction takes its promise itself for a yes.
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
}
