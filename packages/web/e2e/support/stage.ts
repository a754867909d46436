import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, inject } from 'vitest';

import type {} from '../../../api/src/testing/global-setup.ts';
import { launchBrowser, openContext, signIn, type ContextOptions, type DemoLogin } from './browser.ts';
import { NOON } from './moment.ts';
import { startServer, type RunningServer, type ServerOptions } from './server.ts';

/** How long anything may take to show, in ms; a busy machine stalls for seconds. */
export const PATIENCE = 20_000;

export interface Stage {
  server: RunningServer;
  browser: Browser;
  /** A browser of one's own, signed in. */
  enter: (login: DemoLogin, options?: Omit<ContextOptions, 'url'>) => Promise<BrowserContext>;
  /** A browser of one's own at the door. */
  visit: (options?: Omit<ContextOptions, 'url'>) => Promise<BrowserContext>;
}

/** One server and one browser for a test file; both end with it. */
export function useStage(options: ServerOptions = { demo: true, now: NOON }): Stage {
  const stage = {} as Stage;
  stage.visit = async (own = {}) => {
    const context = await openContext(stage.browser, { url: stage.server.url, ...own });
    context.setDefaultTimeout(PATIENCE);
    return context;
  };
  stage.enter = async (login, own) => {
    const context = await stage.visit(own);
    await signIn(context, login);
    return context;
  };
  beforeAll(async () => {
    [stage.server, stage.browser] = await Promise.all([startServer(inject('testPostgres'), options), launchBrowser()]);
  });
  afterAll(async () => {
    await stage.browser?.close();
    await stage.server?.stop();
  });
  return stage;
}

/** Opens an address in a new tab of a context. */
export async function openPage(context: BrowserContext, path: string): Promise<Page> {
  const page = await context.newPage();
  await page.goto(path);
  return page;
}

export { untilKept } from './kept.ts';
