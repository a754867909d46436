import type { Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { dragTag, dragTicket, dragToRoof, resizeTicket, tag, ticket, ticketOn, timeOn } from './support/board.ts';
import { TODAY } from './support/moment.ts';
import { openPage, useStage } from './support/stage.ts';

// One dispatcher and a mouse, in a browser whose zone is another than the company's.
const stage = useStage();
let page: Page;

beforeAll(async () => {
  page = await openPage(await stage.enter('dispatch'), '/board');
  await ticket(page, 'Viggo Esker').waitFor();
});

interface Plan {
  van: string | null;
  from: string | null;
  to: string | null;
}

/** What the server holds of a visit's plan. */
async function planOf(customer: string): Promise<Plan> {
  const board = (await (await page.context().request.get(`/api/board/${TODAY}`)).json()) as {
    vans: { id: string; name: string }[];
    visits: (Plan & { customerName: string; vanId: string | null })[];
    unplaced: (Plan & { customerName: string; vanId: string | null })[];
  };
  const visit = [...board.visits, ...board.unplaced].find((one) => one.customerName === customer);
  if (!visit) throw new Error(`No visit of ${customer} on the board.`);
  const van = board.vans.find(({ id }) => id === visit.vanId)?.name ?? null;
  return { van, from: visit.from, to: visit.to };
}

test('from Unplaced down to a lane', async () => {
  await dragTag(page, 'Sten Delacroix', 'Fulmar', '15:30');
  expect(await timeOn(await ticketOn(page, 'Fulmar', 'Sten Delacroix'))).toBe('3:30–5:20');
  await expect
    .poll(() => planOf('Sten Delacroix'))
    .toEqual({ van: 'Fulmar', from: '2026-05-14T19:30:00.000Z', to: '2026-05-14T21:20:00.000Z' });
  await page.getByRole('heading', { name: /^Unplaced 3/ }).waitFor();
});

test('from one lane to another', async () => {
  await dragTicket(page, 'Viggo Esker', 'Knot', '15:40');
  await (await ticketOn(page, 'Knot', 'Viggo Esker')).waitFor();
  await expect.poll(() => planOf('Viggo Esker')).toMatchObject({ van: 'Knot', from: '2026-05-14T19:40:00.000Z' });
});

test('longer by its lower edge', async () => {
  const { from } = await planOf('Viggo Esker');
  await resizeTicket(page, 'Viggo Esker', '16:50');
  await expect.poll(() => planOf('Viggo Esker')).toEqual({ van: 'Knot', from, to: '2026-05-14T20:50:00.000Z' });
});

test('along the time of a lane', async () => {
  await dragTicket(page, 'Viggo Esker', 'Knot', '16:35');
  await expect
    .poll(() => planOf('Viggo Esker'))
    .toEqual({ van: 'Knot', from: '2026-05-14T20:35:00.000Z', to: '2026-05-14T21:45:00.000Z' });
});

test('back up to Unplaced', async () => {
  await dragToRoof(page, 'Viggo Esker');
  await tag(page, 'Viggo Esker').waitFor();
  await expect.poll(() => planOf('Viggo Esker')).toEqual({ van: null, from: null, to: null });
});

test('what cannot be is refused in plain words, and goes back', async () => {
  const before = await planOf('Soren Oyelaran');
  await dragTicket(page, 'Soren Oyelaran', 'Plover', '14:00');
  const alert = page.getByRole('alert');
  await alert.waitFor();
  expect(await alert.innerText()).toMatch(/Plover is at Noa Quartermain until .*\. One van can’t be at two stops\./);
  await (await ticketOn(page, 'Knot', 'Soren Oyelaran')).waitFor();
  expect(await timeOn(ticket(page, 'Soren Oyelaran'))).toBe('2:45–3:20');
  expect(await planOf('Soren Oyelaran')).toEqual(before);
  await alert.getByRole('button', { name: 'Clear' }).click();
  await alert.waitFor({ state: 'detached' });
});

test('a warning asks for a reason: without one the ticket goes back', async () => {
  const before = await planOf('Soren Oyelaran');
  await dragTicket(page, 'Soren Oyelaran', 'Knot', '16:30');
  const sheet = page.getByRole('dialog', { name: 'A reason keeps it' });
  await sheet.getByText(/is outside the promise/).waitFor();
  expect(await sheet.getByRole('button', { name: 'Place with this reason' }).isDisabled()).toBe(true);
  await sheet.getByRole('button', { name: 'Put back' }).click();
  expect(await timeOn(ticket(page, 'Soren Oyelaran'))).toBe('2:45–3:20');
  expect(await planOf('Soren Oyelaran')).toEqual(before);
});

test('with a reason it stays, and the reason with it', async () => {
  await dragTicket(page, 'Soren Oyelaran', 'Knot', '16:30');
  const sheet = page.getByRole('dialog', { name: 'A reason keeps it' });
  await sheet.getByRole('button', { name: 'Customer agreed' }).click();
  await sheet.getByRole('button', { name: 'Place with this reason' }).click();
  await sheet.waitFor({ state: 'detached' });
  await expect.poll(() => planOf('Soren Oyelaran')).toMatchObject({ from: '2026-05-14T20:30:00.000Z' });
  await ticket(page, 'Soren Oyelaran').click();
  const open = page.getByRole('complementary', { name: /^Soren Oyelaran/ });
  await open.getByText(/Kept: Customer agreed\. Maren Holt/).waitFor();
  await open.getByRole('button', { name: 'Close' }).click();
});

test('moves are taken back, the last one first', async () => {
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect.poll(() => planOf('Soren Oyelaran')).toMatchObject({ from: '2026-05-14T18:45:00.000Z' });
  expect(await timeOn(ticket(page, 'Soren Oyelaran'))).toBe('2:45–3:20');
  await page.keyboard.press('Control+z');
  await expect.poll(() => planOf('Viggo Esker')).toMatchObject({ van: 'Knot', from: '2026-05-14T20:35:00.000Z' });
});
