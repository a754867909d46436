import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, describe, expect, test } from 'vitest';

import type { DayWorkDto, VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import { TODAY } from './support/moment.ts';
import { PATIENCE, openPage, untilKept, useStage } from './support/stage.ts';

// Knot's crew of two is at work on a full interior; its next visit has a promised window.
const stage = useStage();
let tomas: BrowserContext;
let wyn: BrowserContext;
let phone: Page;
let visitId: string;

beforeAll(async () => {
  tomas = await stage.enter('tech5', { size: 'phone', serviceWorkers: 'allow' });
  wyn = await stage.enter('tech6', { size: 'phone' });
  phone = await openPage(tomas, '/run-sheet');
  await phone.getByRole('article').waitFor();
  visitId = (await works(tomas)).find((work) => work.progress === 'working')?.visitId ?? '';
});

async function works(context: BrowserContext): Promise<VisitWorkDto[]> {
  const answer = await context.request.get(`/api/run-sheet/${TODAY}/work`);
  return ((await answer.json()) as DayWorkDto).works;
}
const workNow = async () => {
  const work = (await works(tomas)).find((one) => one.visitId === visitId);
  if (!work) throw new Error('the visit is on the run sheet');
  return work;
};
const path = (part: string) => `/run-sheet/${TODAY}/job/${visitId}/${part}`;
const step = (page: Page, words: string) => page.getByRole('checkbox', { name: words });

test('two phones see each other’s ticks, and a tick taken back', async () => {
  await phone.getByRole('link', { name: 'Job' }).click();
  await step(phone, 'Glass inside').waitFor();
  const other = await openPage(wyn, path('steps'));
  const there = step(other, 'Glass inside');
  expect(await there.getAttribute('aria-checked')).toBe('false');
  await step(phone, 'Glass inside').click();
  await other.getByRole('checkbox', { name: 'Glass inside', checked: true }).waitFor();
  expect(await there.textContent()).toContain('Tomas');
  await there.click();
  await phone.getByRole('checkbox', { name: 'Glass inside', checked: false }).waitFor();
  await other.close();
});

describe('a change at the car', () => {
  test('that breaks the next promise is asked of the board, and accepted there', async () => {
    await phone.getByRole('link', { name: 'Change' }).click();
    await phone.getByRole('button', { name: 'Change the job' }).click();
    await phone.getByRole('button', { name: 'Add a service' }).click();
    await phone.getByRole('button', { name: /^Odor treatment/ }).click();
    await phone.getByText('In the way.').first().waitFor();
    await phone.getByRole('button', { name: 'Customer asked' }).click();
    await phone.getByRole('button', { name: 'Said yes in person' }).click();
    await phone.getByRole('button', { name: 'Ask the board' }).click();
    await phone.getByText('Asked of the board').waitFor();
    expect((await workNow()).lines).toHaveLength(2);

    const desk = await stage.enter('dispatch');
    const board = await openPage(desk, `/board?visit=${visitId}`);
    const ask = board.getByRole('group', { name: 'Asked: Odor treatment added' });
    await ask.getByLabel('Note to the crew').fill('The next customer knows');
    await ask.getByRole('button', { name: 'Accept the change' }).click();
    await ask.waitFor({ state: 'detached' });
    await phone.getByText('Accepted by Maren Holt, ').waitFor();
    expect((await workNow()).lines.map((line) => line.serviceName)).toContain('Odor treatment');
    await board.getByText(/^Odor treatment added, accepted, The next customer knows/).waitFor();
  });
});

test('a key that was taken stays on the board until it is handed back', async () => {
  const desk = await stage.enter('dispatch2');
  const board = await openPage(desk, '/board');
  const need = board.getByText('Key not handed back: Knot, Tomas Reyes');
  await need.waitFor();
  await phone.getByRole('link', { name: 'Must-knows' }).click();
  await phone.getByRole('button', { name: 'Key handed back' }).click();
  await need.waitFor({ state: 'detached' });
  await board.close();
});

describe('in a dead zone', () => {
  test('the job is worked to its end, also when the app is closed and opened again', async () => {
    await untilKept(phone);
    await phone.goto(path('steps'));
    await step(phone, 'Dash, console and doors').waitFor();
    await tomas.setOffline(true);
    await phone.reload();
    await phone.getByText('No signal. Every press is kept.').waitFor();
    await step(phone, 'Test the cleaner on a hidden spot').click();
    await phone.getByRole('button', { name: 'Done up to here' }).last().click();
    await phone.getByText('2 changes kept here').waitFor();
    await phone.getByRole('button', { name: 'Note' }).click();
    await phone.getByRole('button', { name: 'All as planned' }).click();
    await phone.getByRole('button', { name: 'Keep the note' }).click();
    await phone.getByText('3 changes kept here').waitFor();
    await phone.close();

    phone = await tomas.newPage();
    await phone.goto(path('done'));
    await phone.getByText('3 changes kept here').waitFor();
    // Two steps of the added service are ticked by themselves: left out with a reason.
    await phone.getByText('Find the source and take it out').waitFor();
    expect(await phone.getByRole('button', { name: 'Tick or say why' }).isDisabled()).toBe(true);
    await phone.getByRole('button', { name: 'Customer asked to leave it' }).click();
    await phone.getByRole('button', { name: 'Done', exact: true }).click();
    await phone.getByRole('button', { name: 'Yes, done' }).click();
    await phone.getByText('5 changes kept here').waitFor();
    const before = await workNow();
    await tomas.setOffline(false);
    await phone.getByText('kept here').waitFor({ state: 'detached' });
    const after = await workNow();
    expect(after.progress).toBe('done');
    const fresh = after.events.slice(before.events.length);
    expect(fresh.map((event) => event.kind)).toEqual(['tick', 'tick', 'note', 'go_on']);
    expect(new Set(after.events.map((event) => event.id)).size).toBe(after.events.length);
  });
});

test('must-knows come before Start work', async () => {
  const beau = await stage.enter('tech11', { size: 'phone' });
  const next = (await works(beau)).find((work) => work.progress === 'placed');
  const desk = await stage.enter('owner');
  await noteDog(desk, next?.customerName ?? '');
  const page = await openPage(beau, '/run-sheet');
  for (const mark of ['On my way', 'Arrived']) await page.getByRole('button', { name: mark, exact: true }).click();
  await page.getByRole('button', { name: 'Start work', exact: true }).click();
  const confirm = page.getByRole('button', { name: /to read$/ });
  expect(await confirm.isDisabled()).toBe(true);
  await page.getByRole('checkbox', { name: 'A dog is here.' }).click();
  await page.getByRole('button', { name: 'Confirm' }).click();
  await page.getByRole('article').waitFor();
  const confirmed = async () =>
    (await works(beau)).find((one) => one.visitId === next?.visitId)?.events.flatMap((event) => event.keys);
  await expect.poll(confirmed, { timeout: PATIENCE }).toEqual(['dog']);
});

async function noteDog(desk: BrowserContext, name: string): Promise<void> {
  const found = await desk.request.get(`/api/customers?find=${encodeURIComponent(name)}`);
  const { customers } = (await found.json()) as {
    customers: { id: string; version: number; addresses: object[]; standing: unknown }[];
  };
  const [customer] = customers;
  if (!customer) throw new Error(`${name} is a customer`);
  // Where the next visit stands is shown, not saved.
  const { id, standing: _standing, ...fields } = customer;
  const addresses = fields.addresses.map((address) => ({ ...address, hasDog: true }));
  const saved = await desk.request.put(`/api/customers/${id}`, { data: { ...fields, addresses } });
  expect(saved.status()).toBe(200);
}
