import type { AddressInfo } from 'node:net';
import { beforeAll, expect, test } from 'vitest';
import { io } from 'socket.io-client';
import { changedEvent, customerNamespace, hintEvent } from '@driprail/shared/realtime/hints';
import { useApp } from '../testing/app.ts';
import { aCompany } from '../testing/company.ts';
import type { TestCompany } from '../testing/company.ts';
import { messageStage } from '../testing/messages.ts';

const app = useApp();
let company: TestCompany;
let url = '';
beforeAll(async () => {
  company = await aCompany(app);
  await new Promise<void>((resolve) => app.app.server.listen(0, '127.0.0.1', resolve));
  url = `http://127.0.0.1:${(app.app.server.address() as AddressInfo).port}`;
});
const { someone, onTheVan } = messageStage(app, () => company);

const open = (token: string, namespace = customerNamespace) =>
  io(`${url}${namespace}`, { auth: { token }, transports: ['websocket'], reconnection: false, forceNew: true });
const said = (socket: ReturnType<typeof open>, event: string) =>
  new Promise<unknown[]>((resolve) => socket.once(event, (...words: unknown[]) => resolve(words)));

test('a customer’s page hears that its job changed, of no other job, and nothing more', async () => {
  const dispatcher = await company.dispatcher();
  const sefa = await company.sefa();
  const [mine, other] = [await onTheVan(await someone(), sefa), await onTheVan(await someone(), sefa)];
  const link = await dispatcher.post(`/api/jobs/${mine.job.id}/pay-link`).send({}).expect(200);
  const token = new URL((link.body as { url: string }).url).pathname.split('/').at(-1) ?? '';
  const page = open(token);
  const heard: unknown[] = [];
  page.onAny((event: string, ...words: unknown[]) => heard.push([event, ...words]));
  await said(page, 'connect');
  await other.press('set_off');
  const changed = said(page, changedEvent);
  await mine.press('set_off');
  expect(await changed).toEqual([]);
  expect(heard).toEqual([[changedEvent]]);
  page.disconnect();
});

test('nobody is let in without a link that was signed here, nor by it to what the crew hears', async () => {
  for (const token of ['', 'x'.repeat(43), 'y'.repeat(900)])
    expect(await said(open(token), 'connect_error')).toHaveLength(1);
  expect(await said(open('', '/'), 'connect_error')).toHaveLength(1);
  expect(hintEvent).not.toBe(changedEvent);
});
