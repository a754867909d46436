import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

import { ensureChromium } from '../../../api/bin/lib/chromium.mjs';

const flags = [
  '--no-sandbox', // Chromium does not start as root with it; only pages of our own are opened.
  '--disable-gpu',
  '--disable-quic',
  '--disable-dev-shm-usage',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Sizes the screens are drawn for, in CSS pixels. */
export const sizes = { desk: { width: 1600, height: 1000 }, phone: { width: 390, height: 844 } } as const;

/** A login of the demo company. */
export type DemoLogin = 'owner' | 'dispatch' | 'dispatch2' | `tech${number}`;

export const demoPassword = 'driprail-demo';

export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: await ensureChromium(), args: flags });
}

export interface ContextOptions {
  /** The server's address. */
  url: string;
  size?: keyof typeof sizes;
  /** The browser's zone: by default another than the company's, since screens go by the company's alone. */
  timezoneId?: string;
  serviceWorkers?: 'allow' | 'block';
}

/** A browser of its own for one person: cookies and storage are shared with nobody. */
export async function openContext(browser: Browser, options: ContextOptions): Promise<BrowserContext> {
  const { url, size = 'desk', timezoneId = 'Asia/Tokyo', serviceWorkers = 'block' } = options;
  return browser.newContext({
    baseURL: url,
    viewport: sizes[size],
    timezoneId,
    serviceWorkers,
    locale: 'en-US',
    reducedMotion: 'reduce',
    ...(size === 'phone' && { hasTouch: true, isMobile: true, deviceScaleFactor: 2 }),
  });
}

/**
 * Signs a demo login in without the form; its pages are signed in from then on.
 * @throws Error when the server refuses
 */
export async function signIn(context: BrowserContext, login: DemoLogin): Promise<void> {
  const data = { email: emailOf(login), password: demoPassword };
  const answer = await context.request.post('/api/session', { data });
  if (!answer.ok()) throw new Error(`${data.email} was not signed in: ${answer.status()} ${await answer.text()}`);
}

export function emailOf(login: DemoLogin): string {
  return `${login}@ternandtide.example`;
}

/**
 * Collects what a page complains about, for a test to find it empty. That nobody is signed in yet is an
 * answer, 401, which the browser itself puts down as an error.
 */
export function complaintsOf(page: Page): string[] {
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(String(error)));
  page.on('console', (message) => {
    const isAtTheDoor = message.location().url.endsWith('/api/session') && message.text().includes('401');
    if (message.type() === 'error' && !isAtTheDoor) complaints.push(message.text());
  });
  return complaints;
}
