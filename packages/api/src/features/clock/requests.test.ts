import { beforeAll, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { ClockRequestDto } from '@driprail/shared/contracts/hours.contract';
import { ClockCorrection, ClockEntry } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let idris: TestAgent;
let dispatcher: TestAgent;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  sefa = await company.sefa();
  idris = await company.idris();
  dispatcher = await company.dispatcher();
  owner = await company.owner();
});
const requestIn = (body: unknown) => (body as { request: ClockRequestDto }).request;
const span = (from: string, to: string | null) => ({
  kind: 'shop',
  startedAt: `2026-05-14T${from}:00Z`,
  endedAt: to && `2026-05-14T${to}:00Z`,
  isInterrupted: false,
});
const anEntry = async (personId: string) =>
  ClockEntry.create({
    id: uuid(),
    personId,
    kind: 'shop',
    startedAt: new Date('2026-05-14T11:00:00Z'),
    endedAt: new Date('2026-05-14T12:00:00Z'),
  });

test('a technician asks, the desk agrees, both versions stay', async () => {
  const entry = await anEntry(company.people.sefa.id);
  const ask = {
    personId: company.people.sefa.id,
    entryId: entry.id,
    after: span('11:00', '12:30'),
    reason: 'Towels took longer',
  };
  await idris.post('/api/clock/requests').send(ask).expect(404);
  await sefa
    .post('/api/clock/requests')
    .send({ ...ask, after: span('12:00', '11:00') })
    .expect(422);
  const asked = requestIn((await sefa.post('/api/clock/requests').send(ask).expect(200)).body);
  expect(asked).toMatchObject({
    direction: 'asked',
    state: 'open',
    isMine: false,
    before: { endedAt: '2026-05-14T12:00:00.000Z' },
  });
  await sefa.post('/api/clock/requests').send(ask).expect(409);
  await sefa.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: true }).expect(403);
  await idris.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: true }).expect(404);
  expect((await entry.reload()).endedAt).toEqual(new Date('2026-05-14T12:00:00Z'));
  await dispatcher.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: true }).expect(200);
  expect((await entry.reload()).endedAt).toEqual(new Date('2026-05-14T12:30:00Z'));
  expect(await ClockCorrection.count({ where: { entryId: entry.id } })).toBe(1);
  await dispatcher.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: false }).expect(409);
});

test('a proposed clock-out is only a proposal until the technician agrees or objects', async () => {
  const open = await ClockEntry.create({
    id: uuid(),
    personId: company.people.idris.id,
    kind: 'travel',
    startedAt: new Date('2026-05-14T13:00:00Z'),
  });
  const proposal = {
    personId: company.people.idris.id,
    entryId: open.id,
    after: span('13:00', '14:10'),
    reason: 'Forgot to clock out',
  };
  const proposed = requestIn((await dispatcher.post('/api/clock/requests').send(proposal).expect(200)).body);
  expect(proposed).toMatchObject({ direction: 'proposed', isMine: false });
  await owner.post(`/api/clock/requests/${proposed.id}/decision`).send({ isAgreed: true }).expect(403);
  const mine = (await idris.get('/api/clock/requests').expect(200)).body as { requests: ClockRequestDto[] };
  expect(mine.requests.map((request) => [request.id, request.isMine])).toEqual([[proposed.id, true]]);
  await idris
    .post(`/api/clock/requests/${proposed.id}/decision`)
    .send({ isAgreed: false, answer: 'It was 14:40' })
    .expect(200);
  expect((await open.reload()).endedAt).toBeNull();
});

test('a dispatcher’s own request is decided by the owner', async () => {
  const ask = {
    personId: company.people.maren.id,
    entryId: null,
    after: span('12:00', '13:00'),
    reason: 'Phone was off',
  };
  const asked = requestIn((await dispatcher.post('/api/clock/requests').send(ask).expect(200)).body);
  await dispatcher.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: true }).expect(403);
  await owner.post(`/api/clock/requests/${asked.id}/decision`).send({ isAgreed: true }).expect(200);
  expect(await ClockEntry.count({ where: { personId: company.people.maren.id } })).toBe(1);
});

test('each says whether the own hours are right; silence is shown, the newest word counts', async () => {
  await sefa.post('/api/clock/weeks/2026-05-14').send({ isRight: false, note: '' }).expect(400);
  await sefa.post('/api/clock/weeks/2026-05-14').send({ isRight: false, note: 'Tuesday is short' }).expect(200);
  await sefa.post('/api/clock/weeks/2026-05-14').send({ isRight: true }).expect(200);
  await sefa.post(`/api/clock/weeks/2026-05-14/people/${company.people.idris.id}`).send({}).expect(403);
  const all = (await dispatcher.get('/api/clock/weeks/2026-05-14').expect(200)).body as {
    startsOn: string;
    words: { personName: string; isRight: boolean | null }[];
  };
  expect(all.startsOn).toBe('2026-05-11');
  expect(all.words.map((word) => [word.personName, word.isRight])).toEqual([
    ['Idris Vale', null],
    ['Maren Holt', null],
    ['Sefa Lund', true],
  ]);
  await dispatcher
    .post(`/api/clock/weeks/2026-05-14/people/${company.people.idris.id}`)
    .send({ note: 'By phone' })
    .expect(200);
  const own = (await idris.get('/api/clock/weeks/2026-05-14').expect(200)).body as { words: { by: string }[] };
  expect(own.words).toMatchObject([{ by: 'Maren Holt', note: 'By phone', isRight: true }]);
});
