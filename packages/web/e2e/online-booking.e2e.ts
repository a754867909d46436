import type { Page } from 'playwright-core';
import { expect, test } from 'vitest';

import { openPage, useStage } from './support/stage.ts';

const stage = useStage();

async function toThePlace(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Sedan' }).click();
  await page.getByLabel(/^Wash and wax/).check();
  await page.getByRole('button', { name: 'Where to' }).click();
  await page.getByLabel('Street and number').fill('3 Brine Street');
}

test('a stranger books on the phone with a code from the mail, and calls it off by the link', async () => {
  const phone = await stage.visit({ size: 'phone' });
  const page = await openPage(phone, '/book');
  await toThePlace(page);
  await page.getByLabel('Town').fill('Elsewhere');
  await page.getByRole('button', { name: 'See free times' }).click();
  await page.getByText(/We do not come to Elsewhere .* Call us at 555-0100/).waitFor();
  await page.getByLabel('Town').fill('Ternmouth');
  await page.getByRole('button', { name: 'See free times' }).click();
  await page.getByRole('heading', { name: 'Pick a time' }).waitFor();
  await page
    .getByRole('button', { name: /We arrive, stay/ })
    .first()
    .click();
  await page.getByRole('button', { name: 'Hold this time' }).click();
  await page.getByText(/The time is yours until/).waitFor();

  await page.getByLabel('Your name').fill('Ada Quill');
  await page.getByLabel('E-mail').fill('ada@mail.example');
  // A reload half-way loses nothing, and Back goes a step back.
  await page.reload();
  expect(await page.getByLabel('Your name').inputValue()).toBe('Ada Quill');
  await page.goBack();
  await page.getByRole('heading', { name: 'Pick a time' }).waitFor();
  await page.goForward();
  await page.getByRole('button', { name: 'Send the code' }).click();
  await page.getByText('Read and accept the terms.').waitFor();
  await page.getByText('Give a phone number with digits, like 555-0142.').waitFor();
  await page.getByLabel('Phone').fill('555-0177');
  await page.getByLabel('The car').fill('2019 hatchback, gray');
  await page.getByLabel('I accept these terms').check();
  await page.getByRole('button', { name: 'Send the code' }).click();
  await page.getByRole('heading', { name: 'Type the code' }).waitFor();

  const owner = await stage.enter('owner');
  const code = () => codeIn(owner);
  await expect.poll(code, { timeout: 30_000 }).toMatch(/^\d{6}$/);
  await page.getByLabel('Code from the mail').fill((await code()) ?? '');
  await page.getByRole('button', { name: 'Book it' }).click();
  await page.getByRole('heading', { name: 'It is booked' }).waitFor();

  await page.getByRole('link', { name: 'See your page' }).click();
  await page.getByRole('heading', { name: /Booked, Ada/ }).waitFor();
  await page.getByText(/Calling off/).waitFor();
  await page.getByRole('button', { name: 'Call off', exact: true }).click();
  await page.getByRole('button', { name: /^Call off for/ }).click();
  await page.getByRole('heading', { name: 'Called off' }).waitFor();
});

test('the owner closes it, and strangers are asked to call', async () => {
  const desk = await stage.enter('owner');
  const page = await openPage(desk, '/settings/online-booking');
  await page.getByLabel('Customers book by themselves at /book').uncheck();
  await page.getByRole('button', { name: 'Save online booking' }).click();
  await page.getByText('Saved.').waitFor();
  const phone = await stage.visit({ size: 'phone' });
  const book = await openPage(phone, '/book');
  await book.getByRole('link', { name: 'Call 555-0100' }).waitFor();
});

async function codeIn(owner: Awaited<ReturnType<typeof stage.enter>>): Promise<string | undefined> {
  const { mails } = (await (await owner.request.get('/api/local-mail')).json()) as { mails: { subject: string }[] };
  return mails.find(({ subject }) => subject.includes('is your code'))?.subject.slice(0, 6);
}
