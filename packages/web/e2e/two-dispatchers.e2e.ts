import type { Page, WebSocketRoute } from 'playwright-core';
import { beforeAll, expect, test } from 'vitest';

import { dragTicket, ticket, ticketOn } from './support/board.ts';
import { openPage, useStage } from './support/stage.ts';

// Two boards at once. The second dispatcher's line can be held, so that news comes late, and cut.
const stage = useStage();
const line = { isHeld: false, isCut: false, open: new Set<WebSocketRoute>(), waiting: [] as (() => void)[] };
let first: Page;
let second: Page;

beforeAll(async () => {
  const [maren, ottilie] = await Promise.all([stage.enter('dispatch'), stage.enter('dispatch2')]);
  await ottilie.routeWebSocket(/socket\.io/, (socket) => {
    if (line.isCut) {
      void socket.close();
      return;
    }
    line.open.add(socket);
    const server = socket.connectToServer();
    server.onMessage((message) => {
      const pass = () => socket.send(message);
      if (line.isHeld) line.waiting.push(pass);
      else pass();
    });
  });
  [first, second] = await Promise.all([openPage(maren, '/board'), openPage(ottilie, '/board')]);
  await Promise.all([first, second].map((page) => page.getByText('Live', { exact: true }).waitFor()));
});

test('what one moves, the other sees', async () => {
  await dragTicket(first, 'Viggo Esker', 'Knot', '15:40');
  await (await ticketOn(second, 'Knot', 'Viggo Esker')).waitFor();
});

test('a plan made on an old board is not saved: the newer one comes, with a sentence', async () => {
  line.isHeld = true;
  await dragTicket(first, 'Gideon Amberley', 'Fulmar', '14:00');
  await first.getByText(/^Gideon Amberley is on Fulmar at/).waitFor();
  expect(await ticket(second, 'Gideon Amberley').locator('.tm').innerText()).toBe('1:15–3:00');

  await dragTicket(second, 'Gideon Amberley', 'Fulmar', '15:00');
  const alert = second.getByRole('alert');
  await alert.waitFor();
  expect(await alert.innerText()).toContain('Gideon Amberley was moved meanwhile. The board shows the newer plan');
  await ticket(second, 'Gideon Amberley').getByText('2:00–3:45').waitFor();
  expect(await ticket(first, 'Gideon Amberley').locator('.tm').innerText()).toBe('2:00–3:45');

  line.isHeld = false;
  line.waiting.splice(0).forEach((pass) => pass());
});

test('a board that lost its line says so, and catches up by itself', async () => {
  line.isCut = true;
  await Promise.all([...line.open].map((socket) => socket.close()));
  await second.getByText('Not live, catching up').waitFor();

  await dragTicket(first, 'Gideon Amberley', 'Fulmar', '13:30');
  await first.getByText(/^Gideon Amberley is on Fulmar at 1:30/).waitFor();
  expect(await ticket(second, 'Gideon Amberley').locator('.tm').innerText()).toBe('2:00–3:45');

  line.isCut = false;
  await second.getByText('Live', { exact: true }).waitFor();
  await ticket(second, 'Gideon Amberley').getByText('1:30–3:15').waitFor();
});
