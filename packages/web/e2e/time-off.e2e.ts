import type { Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { complaintsOf } from './support/browser.ts';
import { openPage, useStage } from './support/stage.ts';

// Idris Vale was sick a day of last week: the owner pays the hours, and both see them.
const stage = useStage();
const LAST_WEEK = '2026-05-04';
let owner: Page;
let technician: Page;
let complaints: string[];

beforeAll(async () => {
  owner = await openPage(await stage.enter('owner'), `/pay/${LAST_WEEK}`);
  technician = await openPage(await stage.enter('tech1', { size: 'phone' }), '/statements');
  complaints = complaintsOf(technician);
});

const dialog = () => owner.getByRole('dialog', { name: 'Time off' });

test('more than the balance asks for a reason at the field, and nothing is lost', async () => {
  await owner.getByRole('button', { name: 'Pay time off' }).click();
  await dialog().getByLabel('Person').selectOption({ label: 'Idris Vale' });
  await dialog().getByLabel('Day').fill('2026-05-06');
  await dialog().getByLabel('Hours').fill('24');
  await dialog()
    .getByRole('button', { name: /^Pay 24:00 h/ })
    .click();
  await dialog().getByText('Give a reason to go on.', { exact: true }).waitFor();
  expect(await dialog().getByLabel('Hours').inputValue()).toBe('24');
});

test('a day outside the week is refused at its field', async () => {
  await dialog().getByLabel('Hours').fill('8');
  await dialog().getByLabel('Day').fill('2026-05-20');
  await dialog().getByText('Choose a day of this pay week, Mon May 4 to Sun May 10.').waitFor();
  expect(await dialog().getByRole('button', { name: 'Pay the hours' }).isDisabled()).toBe(true);
  await dialog().getByLabel('Day').fill('2026-05-06');
});

test('8 hours are worth the hourly rate before they are paid, and stand on the statement after', async () => {
  const result = dialog().getByLabel('What this comes to');
  await result.getByText('8:00 h at 24.00').waitFor();
  expect(await result.innerText()).toContain('192.00');
  await dialog().getByRole('button', { name: 'Pay 8:00 h, 192.00' }).click();
  await dialog().waitFor({ state: 'detached' });
  await owner
    .getByRole('rowheader', { name: /Idris Vale/ })
    .getByRole('link')
    .click();
  const sheet = owner.getByRole('complementary', { name: 'Pay of Idris Vale' });
  await sheet.getByText('Paid time off, sick').waitFor();
  await sheet.getByRole('link', { name: 'Print statement' }).click();
  const paper = owner.getByRole('article', { name: /^Pay statement of Idris Vale/ });
  expect(await paper.getByRole('listitem').filter({ hasText: 'Paid time off, sick' }).innerText()).toContain('192.00');
  const row = paper.getByRole('row', { name: /^Sick/ });
  expect(await row.getByRole('cell').nth(1).innerText()).toBe('8:00');
});

test('the technician sees the own hours, and how they came about', async () => {
  await technician.reload();
  const mine = technician.getByRole('region', { name: 'My paid time off' });
  await mine.getByText('Sick', { exact: true }).click();
  await mine.getByRole('row', { name: /May 6, 2026 Taken/ }).waitFor();
  expect(complaints).toEqual([]);
});
