import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { addMinutes } from '@driprail/shared/domain/time/zone';
import { expect, test } from 'vitest';

import { TODAY } from './support/moment.ts';
import { openPage, untilKept, useStage } from './support/stage.ts';

const stage = useStage();

test('on the way the phone is quiet; what the board changed is said after Arrived', async () => {
  const phone = await stage.enter('tech4', { size: 'phone' });
  const page = await openPage(phone, '/run-sheet');
  await page.getByRole('heading', { name: 'Ulla Bexley' }).waitFor();
  await page.getByText('Hands on the wheel.').waitFor();
  expect(await page.getByRole('button', { name: 'Trouble' }).count()).toBe(0);

  const desk = await stage.enter('dispatch');
  const board = (await (await desk.request.get(`/api/board/${TODAY}`)).json()) as BoardDto;
  const later = board.visits.find((visit) => visit.customerName === 'Sten Winterborne');
  if (!later?.from || !later.to) throw new Error('the demo day has a later visit');
  const move = { visitId: later.id, planVersion: later.planVersion, vanId: later.vanId };
  const times = { from: addMinutes(later.from, 20), to: addMinutes(later.to, 20) };
  const saved = await desk.request.post('/api/board/moves', {
    data: { moves: [{ ...move, ...times }], accept: [] },
  });
  expect(saved.status()).toBe(200);
  await page.waitForResponse((answer) => answer.url().includes('/api/run-sheet/') && answer.ok());
  expect(await page.getByText('Since you last looked').count()).toBe(0);

  await page.getByRole('button', { name: 'Arrived', exact: true }).click();
  await page.getByText('Since you last looked').waitFor();
  await page.getByText(/3:00 pm instead of 2:40 pm/).waitFor();
  await page.getByRole('button', { name: 'Seen' }).click();
  await page.getByText('Since you last looked').waitFor({ state: 'detached' });
});

test('first help needs neither sign-in nor signal, and knows the address while somebody is signed in', async () => {
  const phone = await stage.enter('tech1', { size: 'phone', serviceWorkers: 'allow' });
  const page = await openPage(phone, '/run-sheet');
  await page.getByRole('article').waitFor();
  await untilKept(page);
  await page.getByRole('link', { name: 'First help' }).click();
  await page.getByText(/Ternmouth/).waitFor();

  await page.getByRole('button', { name: 'Back' }).click();
  await page.getByRole('button', { name: 'Menu' }).click();
  await page.getByRole('button', { name: 'Sign out' }).click();
  await page.getByLabel('Password').waitFor();
  await phone.setOffline(true);
  await page.goto('/first-aid');
  expect(await page.getByRole('link', { name: /Call 911/ }).getAttribute('href')).toBe('tel:911');
  await page.getByText('Where you are: house number').waitFor();
  await page.getByText('In the eyes').click();
  await page.getByText(/at least 15 minutes/).waitFor();
});
