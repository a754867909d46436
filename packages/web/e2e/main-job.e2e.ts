import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, test } from 'vitest';

import { dragTicket, ticket, ticketOn } from './support/board.ts';
import { complaintsOf } from './support/browser.ts';
import { openPage, useStage } from './support/stage.ts';
import { startWithoutWalk } from './support/walk-round.ts';

// The main job, played by three people who are signed in at once. Sten Verrall's polish is given to
// Sefa Lund, who rides alone in Gannet; the dispatcher makes room for it there first.
const stage = useStage();
const LAST_WEEK = '2026-05-04';
let dispatcher: Page;
let technician: Page;
let owner: Page;
const complaints: string[][] = [];

beforeAll(async () => {
  const [desk, phone, office] = await Promise.all([
    stage.enter('dispatch'),
    stage.enter('tech3', { size: 'phone' }),
    stage.enter('owner'),
  ]);
  [dispatcher, technician, owner] = await Promise.all([
    openPage(desk, '/board'),
    openPage(phone, '/run-sheet'),
    openPage(office, '/board'),
  ]);
  complaints.push(...[dispatcher, technician, owner].map(complaintsOf));
  await ticket(dispatcher, 'Sten Verrall').waitFor();
  await technician.getByRole('button', { name: /Yusra Kittredge/ }).waitFor();
  await Promise.all([dispatcher, technician].map((page) => page.evaluate(() => (document.title = 'not reloaded'))));
});

async function press(button: string): Promise<void> {
  if (button === 'Start work') await startWithoutWalk(technician);
  else await technician.getByRole('button', { name: button, exact: true }).click();
}

describe('the day', () => {
  test('the dispatcher drags jobs to other vans, and the open phone shows it', async () => {
    await dragTicket(dispatcher, 'Yusra Kittredge', 'Dunlin', '13:05');
    await (await ticketOn(dispatcher, 'Dunlin', 'Yusra Kittredge')).waitFor();
    await technician.getByRole('button', { name: /Yusra Kittredge/ }).waitFor({ state: 'detached' });

    await dragTicket(dispatcher, 'Sten Verrall', 'Gannet', '12:35');
    await (await ticketOn(dispatcher, 'Gannet', 'Sten Verrall')).waitFor();
    expect(await technician.getByRole('button', { name: /Sten Verrall/ }).innerText()).toContain('12:35 pm');
  });

  test('the technician ends the job at hand, and the one that came stands large', async () => {
    await press('Start work');
    await press('Done');
    await press('Yes, done');
    await technician.getByRole('article', { name: 'Sten Verrall' }).waitFor();
    await ticket(dispatcher, 'Bola Ferrante')
      .getByText(/^Done 11:\d\d am$/)
      .waitFor();
  });

  test.each([
    ['On my way', 'On the way'],
    ['Arrived', 'On site'],
    ['Start work', 'Working'],
  ])('the technician presses “%s”, and the boards follow', async (button, progress) => {
    await press(button);
    for (const board of [dispatcher, owner]) await ticket(board, 'Sten Verrall').getByText(progress).waitFor();
  });

  test('done is pressed, then confirmed, and the boards follow', async () => {
    await press('Done');
    await technician.getByText('Is everything at Sten Verrall done?').waitFor();
    expect(await ticket(dispatcher, 'Sten Verrall').innerText()).toContain('Working');
    await press('Yes, done');
    // A step of the polish has to be ticked by itself: it was not, so the phone asks why.
    await technician.getByText('Measure the paint on every panel').waitFor();
    await press('Tool is broken');
    await press('Done');
    await press('Yes, done');
    for (const board of [dispatcher, owner])
      await ticket(board, 'Sten Verrall')
        .getByText(/^Done 11:\d\d am$/)
        .waitFor();
    // The bill is shown to the customer next.
    await technician.getByRole('link', { name: 'Pay later' }).click();
    await technician.getByRole('article', { name: 'Rosalind Merrow' }).waitFor();
  });

  test('no screen was reloaded on the way', async () => {
    const titles = await Promise.all([dispatcher, technician].map((page) => page.title()));
    expect(titles).toEqual(['not reloaded', 'not reloaded']);
  });
});

describe('the week’s pay', () => {
  test('the owner sees the commission of the job just done in the running week', async () => {
    await owner.goto('/pay/2026-05-11');
    await owner
      .getByRole('rowheader', { name: /Sefa Lund/ })
      .getByRole('link')
      .click();
    const line = owner.getByRole('complementary', { name: 'Pay of Sefa Lund' }).getByRole('listitem').filter({
      hasText: 'One-step polish, Sten Verrall',
    });
    // 6 % of 295.00, all of it to the one person of the crew.
    expect(await line.innerText()).toContain('17.70');
    expect(await owner.getByRole('button', { name: 'Mark as checked' }).isDisabled()).toBe(true);
  });

  test('what keeps the last week open is settled where its tape leads', async () => {
    await owner.getByRole('link', { name: 'Pay week' }).first().click();
    await owner.getByRole('heading', { name: 'Pay week 19' }).waitFor();
    await owner.getByRole('link', { name: 'Set the time' }).click();
    const correction = owner.getByRole('dialog', { name: 'Correct' });
    await correction.getByText('Cal Webb', { exact: true }).waitFor();
    await correction.getByLabel('To', { exact: true }).fill('14:40');
    await correction.getByRole('button', { name: 'Forgot to clock out' }).click();
    await correction.getByRole('button', { name: 'Save the correction' }).click();
    await correction.waitFor({ state: 'detached' });

    await owner.goto(`/pay/${LAST_WEEK}`);
    await owner.getByRole('link', { name: 'Add the time' }).click();
    await owner.getByRole('heading', { name: 'Hours' }).waitFor();
    await owner.getByText('Fri May 8').waitFor();
    await owner.getByRole('button', { name: 'Write down time' }).click();
    const time = owner.getByRole('dialog', { name: 'Time' });
    await time.getByLabel('Person').selectOption({ label: 'Wyn Abara' });
    await time.getByLabel('Kind').selectOption({ label: 'Work' });
    await time.getByLabel('From', { exact: true }).fill('13:44');
    await time.getByLabel('To', { exact: true }).fill('14:56');
    const job = time.getByLabel('Job', { exact: true });
    const option = await job.locator('option', { hasText: '2670,' }).textContent();
    await job.selectOption({ label: option ?? '' });
    await time.getByRole('button', { name: 'Phone was off' }).click();
    await time.getByRole('button', { name: 'Write it down' }).click();
    await time.waitFor({ state: 'detached' });

    await owner.goto(`/pay/${LAST_WEEK}`);
    await owner.getByRole('heading', { name: 'Pay week 19' }).waitFor();
    expect(await owner.locator('.pay-tape').count()).toBe(0);
  });

  test('an amount opens to its working', async () => {
    await owner
      .getByRole('rowheader', { name: /Mara Quist/ })
      .getByRole('link')
      .click();
    const sheet = owner.getByRole('complementary', { name: 'Pay of Mara Quist' });
    await sheet
      .getByRole('link', { name: /how it was worked/ })
      .first()
      .click();
    const working = owner.getByRole('article', { name: 'Hours' });
    // 37 h 46 min at 24.25 an hour, half up to the cent.
    await working.getByText('915.84').first().waitFor();
    expect(await working.innerText()).toContain('37 h 46 min');
  });

  test('the week is checked and locked for good', async () => {
    await owner.goto(`/pay/${LAST_WEEK}`);
    await owner.getByRole('button', { name: 'Mark as checked' }).click();
    await owner.getByRole('button', { name: 'Back to draft', disabled: false }).waitFor();
    await owner.getByRole('button', { name: 'Lock week 19' }).click();
    await owner.getByRole('button', { name: 'Lock for good' }).click();
    await owner.getByRole('button', { name: 'Correction' }).waitFor();
    expect(await owner.getByRole('button', { name: /Mark as checked|Back to draft|Lock week/ }).count()).toBe(0);
  });

  test('the technician opens the statement of the week', async () => {
    await technician.goto('/statements');
    const week = technician.getByRole('link', { name: /Week 19/ });
    const gross = await week.locator('.e').innerText();
    await week.click();
    await technician.getByRole('heading', { name: 'Week 19' }).waitFor();
    await technician.getByRole('heading', { name: 'Sefa Lund' }).waitFor();
    expect(await technician.getByRole('main').innerText()).toContain(gross);
  });

  test('a dispatcher who asks for another person’s pay is refused', async () => {
    const ask = async (path: string) => (await dispatcher.context().request.get(path)).status();
    const technicians = (await (await dispatcher.context().request.get('/api/people')).json()) as {
      people: { id: string; name: string }[];
    };
    const sefa = technicians.people.find((person) => person.name === 'Sefa Lund')?.id ?? '';
    expect(await ask(`/api/pay/statements/${LAST_WEEK}/${sefa}`)).toBe(403);
    expect(await ask(`/api/pay/weeks/${LAST_WEEK}`)).toBe(403);
    expect(await ask(`/api/pay/weeks/${LAST_WEEK}/export.csv`)).toBe(403);
    expect(await ask('/api/pay/rates')).toBe(403);
  });

  test('no screen complained', () => {
    expect(complaints.flat()).toEqual([]);
  });
});
