import type { Locator, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { tag, ticket, ticketOn, timeOn } from './support/board.ts';
import { demoPassword, emailOf, type DemoLogin } from './support/browser.ts';
import { openPage, useStage } from './support/stage.ts';

// The whole main job without a mouse: nothing here clicks, and focus moves only by the keys a person has.
const stage = useStage();
let dispatcher: Page;
let technician: Page;
let owner: Page;

beforeAll(async () => {
  const [desk, phone, office] = await Promise.all([stage.visit(), stage.visit({ size: 'phone' }), stage.visit()]);
  [dispatcher, technician, owner] = await Promise.all([
    openPage(desk, '/'),
    openPage(phone, '/'),
    openPage(office, '/'),
  ]);
});

/** Presses Tab until the focus is where it should be. */
async function tabTo(page: Page, wanted: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  await wanted.first().waitFor();
  for (let presses = 0; presses < 150; presses += 1) {
    const isThere = await wanted.first().evaluate((element) => element === document.activeElement);
    if (isThere) return;
    await page.keyboard.press(key);
  }
  throw new Error(`Tab does not reach ${wanted.toString()}.`);
}

async function pressOn(page: Page, wanted: Locator, key = 'Enter'): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.press(key);
}

async function signInByKeys(page: Page, login: DemoLogin): Promise<void> {
  await tabTo(page, page.getByLabel('Work e-mail'));
  await page.keyboard.type(emailOf(login));
  await tabTo(page, page.getByLabel('Password', { exact: true }));
  await page.keyboard.type(demoPassword);
  await page.keyboard.press('Enter');
}

const button = (page: Page | Locator, name: string | RegExp) => page.getByRole('button', { name, exact: true });

test('the dispatcher signs in', async () => {
  await signInByKeys(dispatcher, 'dispatch');
  await ticket(dispatcher, 'Viggo Esker').waitFor();
});

test('a ticket is picked up, carried to another van and time, and set down', async () => {
  await tabTo(dispatcher, ticket(dispatcher, 'Viggo Esker'));
  await dispatcher.keyboard.press('Space');
  await dispatcher.getByText('Viggo Esker picked up').waitFor();
  for (const key of ['ArrowRight', 'ArrowDown', 'ArrowDown', 'Shift+ArrowUp']) await dispatcher.keyboard.press(key);
  // What it would meet is said before it is set down.
  await dispatcher
    .getByRole('status')
    .filter({ hasText: /^Viggo Esker, Fulmar .*\. Fits\./ })
    .waitFor();
  await dispatcher.keyboard.press('Enter');
  await dispatcher.getByText(/^Viggo Esker is on Fulmar at/).waitFor();
  expect(await timeOn(await ticketOn(dispatcher, 'Fulmar', 'Viggo Esker'))).toBe('3:35–4:25');
});

test('Esc puts a held ticket back', async () => {
  await tabTo(dispatcher, ticket(dispatcher, 'Soren Oyelaran'));
  await dispatcher.keyboard.press('Space');
  await dispatcher.keyboard.press('ArrowRight');
  await (await ticketOn(dispatcher, 'Dunlin', 'Soren Oyelaran')).waitFor();
  await dispatcher.keyboard.press('Escape');
  await (await ticketOn(dispatcher, 'Knot', 'Soren Oyelaran')).waitFor();
});

test('U takes a ticket back to Unplaced, Enter opens it, Esc closes it', async () => {
  await tabTo(dispatcher, ticket(dispatcher, 'Viggo Esker'));
  await dispatcher.keyboard.press('u');
  await pressOn(dispatcher, tag(dispatcher, 'Viggo Esker'));
  const open = dispatcher.getByRole('complementary', { name: /^Viggo Esker/ });
  await open.waitFor();
  await dispatcher.keyboard.press('Escape');
  await open.waitFor({ state: 'detached' });
});

test('a job is booked and placed by form', async () => {
  await pressOn(dispatcher, button(dispatcher, 'New job'));
  const form = dispatcher.getByRole('dialog', { name: 'New job' });
  await tabTo(dispatcher, form.getByLabel('Customer', { exact: true }));
  await dispatcher.keyboard.type('Odette Yarrow');
  await pressOn(dispatcher, form.getByRole('list', { name: 'Customers found' }).getByRole('button'));
  await pressOn(dispatcher, button(form, 'Add a service'));
  await tabTo(dispatcher, form.getByLabel('Service', { exact: true }));
  await dispatcher.keyboard.type('Maintenance');
  await pressOn(dispatcher, button(form, 'Book the job'));

  const open = dispatcher.getByRole('complementary', { name: /^Odette Yarrow/ });
  await tabTo(dispatcher, open.getByLabel('Van', { exact: true }));
  await dispatcher.keyboard.type('Gannet');
  await tabTo(dispatcher, open.getByLabel('Time', { exact: true }));
  await dispatcher.keyboard.type('0440PM');
  await pressOn(dispatcher, button(open, 'Place'));
  await (await ticketOn(dispatcher, 'Gannet', 'Odette Yarrow')).waitFor();
  expect(await timeOn(await ticketOn(dispatcher, 'Gannet', 'Odette Yarrow'))).toMatch(/^4:40–/);
});

test('the technician signs in and marks a visit to its end', async () => {
  await signInByKeys(technician, 'tech3');
  // No walk-round is made, so Start work asks why.
  for (const step of ['Start work', 'Customer in a hurry', 'Start without it', 'Done', 'Yes, done'])
    await pressOn(technician, button(technician, step));
  await technician.getByRole('article', { name: 'Yusra Kittredge' }).waitFor();
});

test('the owner signs in and settles what keeps the last week open', async () => {
  await signInByKeys(owner, 'owner');
  await pressOn(owner, owner.getByRole('link', { name: 'Pay week', exact: true }));
  await pressOn(owner, owner.getByRole('link', { name: 'Set the time' }));
  const correction = owner.getByRole('dialog', { name: 'Correct' });
  await tabTo(owner, correction.getByLabel('To', { exact: true }));
  await owner.keyboard.type('0240PM');
  await pressOn(owner, button(correction, 'Forgot to clock out'));
  await pressOn(owner, button(correction, 'Save the correction'));
  await correction.waitFor({ state: 'detached' });
});

test('the owner opens an amount, and locks the week', async () => {
  await pressOn(owner, owner.getByRole('link', { name: 'Pay week', exact: true }));
  await pressOn(owner, owner.getByRole('link', { name: /how it was worked/ }));
  await owner
    .getByText('Half up')
    .or(owner.getByText(/to the cent, half up/))
    .first()
    .waitFor();
  await pressOn(owner, owner.getByRole('link', { name: 'Pay week', exact: true }));
  await pressOn(owner, button(owner, 'Mark as checked'));
  await owner.getByRole('button', { name: 'Back to draft', disabled: false }).waitFor();
  await pressOn(owner, button(owner, 'Lock week 19'));
  await pressOn(owner, button(owner, 'Lock for good'));
  await button(owner, 'Correction').waitFor();
  await owner.waitForURL(/\/pay\/2026-05-04$/);
});
