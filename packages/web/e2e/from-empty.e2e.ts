import type { Locator, Page } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { dragTag, ticket, ticketOn } from './support/board.ts';
import { NOON } from './support/moment.ts';
import { setUpCodeOf } from './support/small-company.ts';
import { openPage, useStage } from './support/stage.ts';
import { startWithoutWalk } from './support/walk-round.ts';

// From nothing: the company is set up with the terminal's code, then the main job runs as far as a
// technician's Done and the pay it makes.
const stage = useStage({ demo: false, now: NOON });
const PASSWORD = 'towels by color';
let owner: Page;
let technician: Page;

beforeAll(async () => {
  const [office, phone] = await Promise.all([stage.visit(), stage.visit({ size: 'phone' })]);
  owner = await openPage(office, '/');
  technician = await phone.newPage();
});

function dialog(name: string | RegExp): Locator {
  return owner.getByRole('dialog', { name });
}

async function fill(form: Locator | Page, values: Record<string, string>): Promise<void> {
  for (const [label, value] of Object.entries(values)) await form.getByLabel(label, { exact: true }).fill(value);
}

async function save(form: Locator, button: string): Promise<void> {
  await form.getByRole('button', { name: button, exact: true }).click();
  await form.waitFor({ state: 'detached' });
}

test('the company is set up with the code from the terminal, and with no other', async () => {
  await owner.getByRole('heading', { name: 'Set up', exact: true }).waitFor();
  await fill(owner, { 'Company name': 'Cinder Row Detailing', 'Your name': 'Ansel Brook' });
  await fill(owner, { 'Your e-mail': 'owner@cinderrow.example', Password: PASSWORD, 'One-time code': 'NOTTHIS1' });
  await owner.getByLabel('Time zone').selectOption('America/New_York');
  await owner.getByRole('button', { name: 'Set up the company' }).click();
  await owner.getByRole('alert').first().waitFor();
  await fill(owner, { 'One-time code': setUpCodeOf(stage) });
  await owner.getByRole('button', { name: 'Set up the company' }).click();
  await owner.getByRole('heading', { name: 'Vans' }).waitFor();
});

test('a van, two people and a service with prices are added', async () => {
  await owner.getByRole('button', { name: 'New van' }).click();
  await fill(dialog('New van'), { Name: 'Heron' });
  await save(dialog('New van'), 'Add van');
  await owner.getByRole('region', { name: 'Heron' }).waitFor();

  await owner.getByRole('link', { name: 'People' }).click();
  for (const [name, phone] of [
    ['Wren Calder', '555-0131'],
    ['Moss Tolland', '555-0132'],
  ]) {
    await owner.getByRole('button', { name: 'New person' }).click();
    await fill(dialog('New person'), { Name: name ?? '', Phone: phone ?? '' });
    await save(dialog('New person'), 'Add person');
    await owner.getByRole('cell', { name }).waitFor();
  }

  await owner.getByRole('link', { name: 'Service menu' }).click();
  await owner.getByRole('button', { name: 'New service' }).click();
  await fill(dialog('New service'), { Name: 'Hand wash' });
  await fill(dialog('New service').getByRole('group', { name: 'Sedan' }), { Price: '90.00', Minutes: '60' });
  await save(dialog('New service'), 'Add service');
  await owner.getByRole('button', { name: 'Steps of Hand wash' }).waitFor();
});

test('a customer comes in through the job form, and the job is booked', async () => {
  await owner.getByRole('link', { name: 'Board' }).click();
  await owner.getByRole('button', { name: 'New job' }).click();
  const form = dialog('New job');
  await fill(form, { Customer: 'Orla Finch' });
  await form.getByRole('button', { name: 'New customer “Orla Finch”' }).click();
  await fill(form, { Phone: '555-0148', 'Street and number': '3 Kiln Yard', Town: 'Ternmouth' });
  await fill(form, { Year: '2020', Model: 'sedan' });
  await form.getByRole('button', { name: 'Add customer' }).click();
  await form.getByRole('button', { name: 'Add a service' }).click();
  await form.getByLabel('Service', { exact: true }).selectOption({ label: 'Hand wash' });
  await form.getByText('90.00', { exact: true }).waitFor();
  await save(form, 'Book the job');
  const open = owner.getByRole('complementary', { name: /^Orla Finch/ });
  await open.getByRole('button', { name: 'Close' }).click();
});

test('the van gets its crew, and the job is placed', async () => {
  await owner.getByRole('button', { name: 'Crew of Heron: No crew. Change' }).click();
  const crew = dialog('Heron, crew');
  await crew.getByRole('button', { name: 'Add a person' }).click();
  await crew.getByLabel('Person').selectOption({ label: 'Wren Calder' });
  await save(crew, 'Save crew');
  await dragTag(owner, 'Orla Finch', 'Heron', '13:00');
  await (await ticketOn(owner, 'Heron', 'Orla Finch')).waitFor();
  await owner.getByText(/^Orla Finch is on Heron at 1:00/).waitFor();
});

test('a commission is agreed', async () => {
  await owner.goto('/pay-rates');
  await owner.getByRole('button', { name: 'New rate' }).click();
  const form = dialog('New rate');
  await form.getByLabel('For', { exact: true }).selectOption({ label: 'Wren Calder' });
  await form.getByLabel('Kind', { exact: true }).selectOption('commission_percent');
  await form.getByLabel(/^Percent/).fill('10');
  await form.getByLabel('From', { exact: true }).fill('2026-05-11');
  await save(form, 'Add rate');
});

test('the technician follows the link of the invitation, and is signed in', async () => {
  await owner.goto('/logins');
  await owner.getByRole('button', { name: 'Invite a person' }).click();
  const invitation = dialog('Invite');
  await invitation.getByLabel('Person').selectOption({ label: 'Wren Calder' });
  await fill(invitation, { 'E-mail': 'wren@cinderrow.example' });
  await save(invitation, 'Send the invitation');

  await owner.goto('/local-mail');
  const mail = owner.getByRole('article').filter({ hasText: 'wren@cinderrow.example' });
  const link = await mail.getByRole('link').first().getAttribute('href');
  await technician.goto(link ?? '');
  await technician.getByRole('heading', { name: 'Welcome' }).waitFor();
  await fill(technician, { Password: 'rinse and repeat', 'The same again': 'rinse and repeat' });
  await technician.getByRole('button', { name: 'Save and sign in' }).click();
  await technician.getByRole('article', { name: 'Orla Finch' }).waitFor();
});

test('the technician marks the job to its end, and the board and the pay week show it', async () => {
  await owner.goto('/board');
  for (const [button, progress] of [
    ['On my way', 'On the way'],
    ['Arrived', 'On site'],
    ['Start work', 'Working'],
  ]) {
    if (button === 'Start work') await startWithoutWalk(technician);
    else await technician.getByRole('button', { name: button, exact: true }).click();
    await ticket(owner, 'Orla Finch')
      .getByText(progress ?? '')
      .waitFor();
  }
  await technician.getByRole('button', { name: 'Done', exact: true }).click();
  await technician.getByRole('button', { name: 'Yes, done' }).click();
  await ticket(owner, 'Orla Finch').getByText(/^Done/).waitFor();

  await owner.goto('/pay/2026-05-11');
  const sheet = owner.getByRole('complementary', { name: 'Pay of Wren Calder' });
  // 10 % of 90.00.
  expect(await sheet.getByRole('listitem').filter({ hasText: 'Hand wash' }).innerText()).toContain('9.00');
});
