import type { Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { dragTicket, ticket, ticketOn } from './support/board.ts';
import { complaintsOf } from './support/browser.ts';
import { openPage, useStage } from './support/stage.ts';

// The main job, played by three people who are signed in at once. Odette Yarrow waits for a van that is
// late; the dispatcher gives the visit to Beau Okoro, who rides alone, and frees the time for it first.
const stage = useStage();
let dispatcher: Page;
let technician: Page;
let owner: Page;
const complaints: string[][] = [];

beforeAll(async () => {
  const [desk, phone, office] = await Promise.all([
    stage.enter('dispatch'),
    stage.enter('tech11', { size: 'phone' }),
    stage.enter('owner'),
  ]);
  [dispatcher, technician, owner] = await Promise.all([
    openPage(desk, '/board'),
    openPage(phone, '/run-sheet'),
    openPage(office, '/board'),
  ]);
  complaints.push(...[dispatcher, technician, owner].map(complaintsOf));
  await ticket(dispatcher, 'Odette Yarrow').waitFor();
  await technician.getByRole('heading', { name: 'Nils Ullman' }).waitFor();
  await Promise.all([dispatcher, technician].map((page) => page.evaluate(() => (document.title = 'not reloaded'))));
});

test('the dispatcher moves jobs between vans and the open phone follows', async () => {
  await dragTicket(dispatcher, 'Nils Ullman', 'Dunlin', '12:30');
  await (await ticketOn(dispatcher, 'Dunlin', 'Nils Ullman')).waitFor();
  await technician.getByRole('heading', { name: 'Gideon Amberley' }).waitFor();

  await dragTicket(dispatcher, 'Odette Yarrow', 'Fulmar', '11:15');
  await (await ticketOn(dispatcher, 'Fulmar', 'Odette Yarrow')).waitFor();
  await technician.getByRole('heading', { name: 'Odette Yarrow' }).waitFor();
  expect(await technician.getByRole('article', { name: 'Odette Yarrow' }).innerText()).toContain('11:15 am to 12:10');
});

test.each([
  ['On my way', 'On the way'],
  ['Arrived', 'On site'],
  ['Start work', 'Working'],
])('the technician presses “%s” and the boards follow live', async (button, progress) => {
  await technician.getByRole('button', { name: button, exact: true }).click();
  for (const board of [dispatcher, owner]) {
    await ticket(board, 'Odette Yarrow').getByText(progress).waitFor();
  }
});

test('done is pressed, then confirmed, and the boards follow', async () => {
  await technician.getByRole('button', { name: 'Done', exact: true }).click();
  expect(await ticket(dispatcher, 'Odette Yarrow').innerText()).toContain('Working');
  await technician.getByRole('button', { name: 'Yes, done' }).click();
  for (const board of [dispatcher, owner])
    await ticket(board, 'Odette Yarrow')
      .getByText(/^Done 11:\d\d am$/)
      .waitFor();
  await technician.getByRole('heading', { name: 'Gideon Amberley' }).waitFor();
});

test('no screen was reloaded on the way, and none complained', async () => {
  expect(await Promise.all([dispatcher, technician].map((page) => page.title()))).toEqual([
    'not reloaded',
    'not reloaded',
  ]);
  expect(complaints.flat()).toEqual([]);
});
