import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, test } from 'vitest';

import { complaintsOf } from './support/browser.ts';
import { PATIENCE, openPage, useStage } from './support/stage.ts';

// A customer comes in at the desk, is found again by anything, turns out to be there twice, asks for a copy, and is erased.
const stage = useStage();
let owner: Page;
let complaints: string[];

beforeAll(async () => {
  owner = await openPage(await stage.enter('owner'), '/customers');
  complaints = complaintsOf(owner);
});

const dialog = (name: string | RegExp) => owner.getByRole('dialog', { name });
const find = (text: string) => owner.getByLabel('Find customers').fill(text);
const list = () => owner.getByRole('region', { name: 'List' });
const record = () => owner.getByRole('article', { name: 'Customer' });

describe('at the desk', () => {
  test('a customer is added, and what is wrong is said at its field with nothing lost', async () => {
    await find('Máire');
    await list().getByRole('button', { name: 'Add a customer of that name' }).click();
    const form = dialog('New customer');
    expect(await form.getByLabel('Name', { exact: true }).inputValue()).toBe('Máire');
    await form.getByLabel('Name', { exact: true }).fill("Máire O'Dell");
    await form.getByLabel('Phone').fill('+1 (455) 555-0199');
    await form.getByLabel('E-mail').fill('"maire o"@quay.example');
    await form.getByLabel('Street and number').fill('9 Quay Éist');
    await form.getByLabel('Town').fill('Ternmouth');
    await form.getByLabel('The drain leads').selectOption({ label: 'To a creek or storm drain' });
    await form.getByLabel('Who agreed to work there').fill('Harbor master');
    await form.getByLabel('Model').fill('hatchback');
    await form.getByLabel('Plate').fill('QX-77 b');
    await form.getByLabel('VIN').fill('1m8gdm9ax kp042788');
    await form.getByText(/The check digit is right.*Model year 1989/).waitFor();
    await form.getByRole('button', { name: 'Take 1989 as the year' }).click();
    await form.getByLabel('Notes', { exact: true }).last().fill('x'.repeat(10_412));
    await form.getByRole('button', { name: 'Add customer' }).click();
    await form.getByText('At most 10,000 letters; this has 10,412. Shorten it, it is still here.').waitFor();
    await form.getByText('Say on which day the owner agreed.').waitFor();
    expect(await form.getByLabel('Notes', { exact: true }).last().inputValue()).toHaveLength(10_412);
    await form.getByLabel('Notes', { exact: true }).last().fill('No scent, please.');
    await form.getByLabel('Agreed on').fill('2026-05-01');
    await form.getByRole('button', { name: 'Find on the map' }).click();
    await expect.poll(() => form.getByLabel('Latitude').inputValue(), { timeout: PATIENCE }).toMatch(/^40\./);
    await form.getByRole('button', { name: 'Add customer' }).click();
    await record().getByRole('heading', { name: "Máire O'Dell" }).waitFor();
    for (const words of [
      '1989 hatchback',
      'VIN 1M8GDM9AXKP042788',
      'Wheels: unsure, treat as bare metal',
      'never asked',
    ])
      await record().getByText(words).first().waitFor();
    expect(await record().getByRole('img', { name: 'No' }).count()).toBe(1);
  });

  test.each([['odell'], ['(455) 555-0199'], ['qx77b'], ['KP042788'], ['quay eist']])('%s finds it', async (text) => {
    await find(text);
    await list().getByText('1 found').waitFor();
    await list()
      .getByRole('link', { name: /O'Dell/ })
      .waitFor();
  });

  test('a long list shows more on request', async () => {
    await find('');
    await list()
      .getByText(/in all$/)
      .waitFor();
    const before = await list().getByRole('listitem').count();
    await list()
      .getByRole('button', { name: /^Show more of/ })
      .click();
    await list().getByRole('listitem').nth(before).waitFor();
  });

  test('a likely duplicate is merged after a look at what moves', async () => {
    await owner.getByRole('button', { name: 'Likely duplicates (1)' }).click();
    await dialog('Likely duplicates').getByText('Same phone. Alike name at the same address').waitFor();
    await dialog('Likely duplicates').getByRole('button', { name: 'See what a merge moves' }).click();
    const merge = dialog('Merge two records');
    await merge.getByText('1 address', { exact: true }).waitFor();
    const [stays = '', goes = ''] = await merge.getByRole('definition').allInnerTexts();
    await merge.getByRole('button', { name: `Merge into ${stays}` }).click();
    await record().getByRole('heading', { name: stays }).waitFor();
    await record().getByText(`Also known: ${goes}.`).waitFor();
    await owner.getByRole('button', { name: 'Likely duplicates', exact: true }).waitFor();
  });

  test('a copy is read as a page and taken as a file', async () => {
    await find('odell');
    await list()
      .getByRole('link', { name: /O'Dell/ })
      .click();
    await record().getByRole('link', { name: 'Copy of the data' }).click();
    const copy = owner.getByRole('article', { name: 'Copy of the data' });
    await copy.getByText('"maire o"@quay.example').waitFor();
    const [file] = await Promise.all([
      owner.waitForEvent('download'),
      owner.getByRole('link', { name: 'Download as a file' }).click(),
    ]);
    expect(file.suggestedFilename()).toBe('customer-data.json');
    await owner.getByRole('link', { name: 'Customer', exact: true }).click();
  });

  test('an erasure is asked twice, and leaves no name', async () => {
    await record().getByRole('button', { name: 'Erase the customer' }).click();
    const erase = dialog('Erase a customer');
    await erase.getByText(/will be called “Customer erased May 14, 2026”/).waitFor();
    await erase.getByRole('button', { name: 'Go on to erase' }).click();
    await erase.getByLabel(/^Type the name to erase it/).fill("maire o'dell");
    await erase.getByRole('button', { name: "Erase Máire O'Dell" }).click();
    await erase.waitFor({ state: 'detached' });
    await record().getByRole('heading', { name: 'Customer erased May 14, 2026' }).waitFor();
    await find('odell');
    await list().getByText('Nobody found for “odell”.').waitFor();
    expect(complaints).toEqual([]);
  });
});

test('on a phone the record stands alone, with a way back to the list', async () => {
  const page = await openPage(await stage.enter('dispatch', { size: 'phone' }), '/customers');
  await page.getByLabel('Find customers').fill('galloway');
  await page
    .getByRole('link', { name: /Galloway/ })
    .first()
    .click();
  await page.getByRole('heading', { name: /Galloway/ }).waitFor();
  expect(await page.getByLabel('Find customers').isVisible()).toBe(false);
  expect(await page.getByRole('button', { name: 'Erase the customer' }).count()).toBe(0);
  expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
  await page.getByRole('link', { name: 'All customers' }).click();
  await page.getByLabel('Find customers').waitFor();
});
