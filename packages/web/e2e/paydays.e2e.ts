import { readFile } from 'node:fs/promises';

import { strFromU8, unzipSync } from 'fflate';
import type { Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { openPage, useStage } from './support/stage.ts';

// The owner puts the weeks that wait on a payday, takes the files away and marks it as handed over.
const stage = useStage();
let owner: Page;

beforeAll(async () => {
  owner = await openPage(await stage.enter('owner'), '/pay/paydays');
});

const sheet = () => owner.getByRole('region', { name: 'Payday of May 15, 2026' });

async function taken(press: () => Promise<void>): Promise<{ name: string; bytes: Uint8Array }> {
  const [download] = await Promise.all([owner.waitForEvent('download'), press()]);
  return { name: download.suggestedFilename(), bytes: await readFile(await download.path()) };
}

test('the weeks that wait are ticked, and made a payday on the next Friday', async () => {
  expect(await owner.getByLabel('Payday', { exact: true }).inputValue()).toBe('2026-05-15');
  await owner.getByRole('checkbox', { name: /^Week 17/ }).uncheck();
  await owner.getByRole('button', { name: 'Make a payday of 1 week' }).click();
  await sheet().getByText('Not handed over yet').waitFor();
  await owner.getByRole('checkbox', { name: /^Week 17/ }).waitFor();
});

test('a date before the weeks are over is refused at the field, and nothing is lost', async () => {
  await sheet().getByRole('button', { name: 'Change payday' }).click();
  const dialog = owner.getByRole('dialog', { name: 'May 15, 2026' });
  await dialog.getByRole('checkbox', { name: /^Week 17/ }).check();
  await dialog.getByLabel('Payday', { exact: true }).fill('2026-04-30');
  await dialog.getByRole('button', { name: 'Save payday' }).click();
  await dialog.getByText('The payday can’t be before May 3, 2026, when week 18 ends.').waitFor();
  expect(await dialog.getByRole('checkbox', { name: /^Week 17/ }).isChecked()).toBe(true);
  await dialog.getByLabel('Payday', { exact: true }).fill('2026-05-15');
  await dialog.getByRole('button', { name: 'Save payday' }).click();
  await dialog.waitFor({ state: 'detached' });
  await sheet().getByText('Weeks 17 and 18').waitFor();
  await owner.getByText(/^No locked week waits/).waitFor();
});

test('everything comes in one archive whose totals are those on the screen', async () => {
  const { name, bytes } = await taken(() =>
    sheet()
      .getByRole('link', { name: /^Everything, ZIP/ })
      .click(),
  );
  expect(name).toBe('payday-2026-05-15-export.zip');
  const zip = unzipSync(bytes);
  expect(Object.keys(zip)).toEqual(expect.arrayContaining(['README.txt', 'kinds.csv', 'hours.csv', 'lines.csv']));
  const shown = await sheet()
    .getByRole('row', { name: /^Idris Vale/ })
    .getByRole('cell')
    .last()
    .innerText();
  const row = strFromU8(zip['people.csv'] ?? new Uint8Array())
    .split('\r\n')
    .find((line) => line.includes(',Idris Vale,'));
  expect(row?.split(',').at(-1)).toBe(shown.split('\n')[0]?.replace(',', ''));
  const kinds = await taken(() =>
    sheet()
      .getByRole('link', { name: /^By kind of pay/ })
      .click(),
  );
  expect(strFromU8(kinds.bytes)).toBe(strFromU8(zip['kinds.csv'] ?? new Uint8Array()));
});

test('once handed over it stays as it is, and an amount opens its statement', async () => {
  await sheet().getByRole('button', { name: 'Mark as handed over' }).click();
  await owner.getByRole('dialog').getByRole('button', { name: 'Mark as handed over' }).click();
  await sheet().getByText('Handed over May 14, 2026 by Rowan Tern').waitFor();
  await sheet().getByRole('button').first().waitFor({ state: 'detached' });
  await sheet()
    .getByRole('link', { name: /statement of Idris Vale, week 18$/ })
    .click();
  await owner.waitForURL(/\/statements\/2026-04-27\//);
  await owner.getByText('Idris Vale').first().waitFor();
});
