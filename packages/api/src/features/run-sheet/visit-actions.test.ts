import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let idris: TestAgent;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  sefa = await company.sefa();
  idris = await company.idris();
  dispatcher = await company.dispatcher();
});

const clock = (time: string) => `2026-05-14T${time}:00.000Z`;
let visit: VisitDto;
beforeEach(async () => {
  // All at one address: they share its parking place, so they may run side by side.
  const from = clock('15:30');
  const to = clock('16:20');
  app.time.now = clock('15:00');
  const made = (await company.aJob()).visit;
  const move = { visitId: made.id, planVersion: 0, vanId: company.vans.gannet.id, from, to };
  const answer = await dispatcher
    .post('/api/board/moves')
    .send({ moves: [move] })
    .expect(200);
  visit = first((answer.body as { visits: VisitDto[] }).visits);
});
const press = (agent: TestAgent, kind: string, more: object = {}) =>
  agent.post(`/api/visits/${visit.id}/actions`).send({ key: uuid(), kind, deviceAt: app.time.now, ...more });
const shown = (body: unknown) => (body as { visit: RunVisitDto }).visit;

describe('progress', () => {
  test('goes step by step; a step out of order is a clash with the state as it is', async () => {
    const clash = await press(sefa, 'finish').expect(409);
    expect(clash.body).toMatchObject({
      error: { code: 'clash', message: 'Done can’t follow Placed.', hint: { current: { progress: 'placed' } } },
    });
    await press(sefa, 'set_off').expect(200);
    const arrived = await press(sefa, 'arrive').expect(200);
    expect(shown(arrived.body).crew).toEqual([{ personId: company.people.sefa.id, name: 'Sefa Lund' }]);
    await press(sefa, 'start_work').expect(200);
    expect(shown((await press(sefa, 'finish').expect(200)).body).lines.every((line) => line.isFinished)).toBe(true);
  });

  test('takes a double tap once, and the same key with another body not at all', async () => {
    const body = { key: uuid(), kind: 'set_off', deviceAt: app.time.now };
    const send = (more: object = {}) => sefa.post(`/api/visits/${visit.id}/actions`).send({ ...body, ...more });
    const [one, two] = await Promise.all([send(), send()]);
    expect([one.status, two.status]).toEqual([200, 200]);
    expect([one, two].map((answer) => (answer.body as { isRepeat: boolean }).isRepeat).sort()).toEqual([false, true]);
    await send({ kind: 'arrive' }).expect(422);
  });

  test('made on the day is taken from a phone that was dead for days; what runs today goes on', async () => {
    const made = { deviceAt: clock('15:20') };
    app.time.now = '2026-05-17T15:00:00.000Z';
    await sefa
      .post('/api/clock/actions')
      .send({ key: uuid(), action: 'start', kind: 'shop', deviceAt: app.time.now })
      .expect(200);
    await press(sefa, 'set_off').expect(404);
    await press(idris, 'set_off', made).expect(404);
    for (const kind of ['set_off', 'arrive', 'start_work', 'finish']) await press(sefa, kind, made).expect(200);
    const { clock: running } = (await sefa.get('/api/run-sheet/2026-05-17').expect(200)).body as RunSheetDto;
    expect(running?.open).toMatchObject({ kind: 'shop', startedAt: app.time.now });
    await sefa.post('/api/clock/actions').send({ key: uuid(), action: 'stop', deviceAt: app.time.now }).expect(200);
    app.time.now = '2026-05-29T15:00:00.000Z';
    await press(sefa, 'undo', made).expect(404);
  });

  test('is taken back for a short while, then no more', async () => {
    await press(sefa, 'set_off').expect(200);
    expect(shown((await press(sefa, 'undo').expect(200)).body).progress).toBe('placed');
    await press(sefa, 'set_off').expect(200);
    app.time.now = clock('15:10');
    const late = await press(sefa, 'undo').expect(409);
    expect((late.body as { error: { message: string } }).error.message).toContain('too late');
  });

  test('uses the device’s time, corrected by its offset, never after it was received', async () => {
    const wrongBy = 2 * 86_400_000;
    const deviceAt = new Date(Date.parse(clock('14:55')) + wrongBy).toISOString();
    const answer = await press(sefa, 'set_off', { deviceAt, offsetMs: wrongBy }).expect(200);
    expect(shown(answer.body).times.setOffAt).toBe(clock('14:55'));
    const future = await press(sefa, 'arrive', { deviceAt: clock('23:00') }).expect(200);
    expect(shown(future.body).times.arrivedAt).toBe(clock('15:00'));
  });

  test('of another crew’s visit is not there for a technician', async () => {
    await press(idris, 'set_off').expect(404);
    const sheet = (await idris.get('/api/run-sheet/2026-05-14').expect(200)).body as RunSheetDto;
    expect(sheet.visits).toEqual([]);
  });
});

describe('part done', () => {
  test('needs a reason and something left', async () => {
    for (const kind of ['set_off', 'arrive', 'start_work']) await press(sefa, kind).expect(200);
    const asked = await press(sefa, 'part_done', { finishedLineIds: [] }).expect(422);
    expect(asked.body).toMatchObject({ error: { fields: { reason: 'Say why the rest is left.' } } });
    await press(sefa, 'part_done', { reason: 'Weather', finishedLineIds: visit.lines.map((line) => line.id) }).expect(
      422,
    );
  });

  test('puts the rest back on Unplaced with its minutes, and is taken back whole', async () => {
    for (const kind of ['set_off', 'arrive', 'start_work']) await press(sefa, kind).expect(200);
    await press(sefa, 'part_done', { reason: 'Weather', finishedLineIds: [], remainingMinutes: 45 }).expect(200);
    const rest = async () =>
      ((await dispatcher.get('/api/board/2026-05-14')).body as BoardDto).unplaced.filter(
        (other) => other.jobId === visit.jobId,
      );
    expect(await rest()).toMatchObject([{ minutes: 45, part: 2, parts: 2, progress: 'unplaced' }]);
    expect(shown((await press(sefa, 'undo').expect(200)).body).progress).toBe('working');
    expect(await rest()).toEqual([]);
  });
});

describe('access notes', () => {
  test('reach the crew 12 hours before the window, and leave at the day’s end', async () => {
    const seenAt = async (now: string) => {
      app.time.now = now;
      const sheet = (await sefa.get('/api/run-sheet/2026-05-14').expect(200)).body as RunSheetDto;
      const mine = sheet.visits.find((other) => other.id === visit.id);
      return [mine?.gateCode, mine?.phone];
    };
    // The window opens at 09:00 in New York.
    expect(await seenAt('2026-05-14T00:59:00.000Z')).toEqual([null, null]);
    expect(await seenAt('2026-05-14T01:00:00.000Z')).toEqual(['4471', '555-0142']);
    expect(await seenAt('2026-05-15T03:59:00.000Z')).toEqual(['4471', '555-0142']);
    expect(await seenAt('2026-05-15T04:00:00.000Z')).toEqual([null, null]);
  });
});

test('trouble shows on the board until somebody says how it was settled', async () => {
  await press(sefa, 'trouble').expect(422);
  await press(sefa, 'trouble', { trouble: 'no_water', reason: 'Spigot is off' }).expect(200);
  const troubles = async () => ((await dispatcher.get('/api/board/2026-05-14')).body as BoardDto).troubles;
  const [trouble] = await troubles();
  expect(trouble).toMatchObject({ kind: 'no_water', note: 'Spigot is off', by: 'Sefa Lund' });
  await dispatcher.post(`/api/troubles/${trouble?.id}/settle`).send({ outcome: 'Tank is enough' }).expect(200);
  expect(await troubles()).toEqual([]);
  await dispatcher.post(`/api/troubles/${trouble?.id}/settle`).send({ outcome: 'Again' }).expect(409);
});

test('a tip is recorded once, by the crew’s own hands', async () => {
  for (const kind of ['set_off', 'arrive']) await press(sefa, kind).expect(200);
  const tip = { key: uuid(), amountCents: 2000, method: 'cash', alreadyReceived: true };
  await idris.post(`/api/jobs/${visit.jobId}/tips`).send(tip).expect(404);
  await sefa.post(`/api/jobs/${visit.jobId}/tips`).send(tip).expect(200);
  await sefa.post(`/api/jobs/${visit.jobId}/tips`).send(tip).expect(200);
  await sefa
    .post(`/api/jobs/${visit.jobId}/tips`)
    .send({ ...tip, key: uuid(), method: 'card' })
    .expect(422);
  const tipsFor = async (agent: TestAgent) =>
    ((await agent.get(`/api/jobs/${visit.jobId}`)).body as { job: { tips: unknown[] } }).job.tips;
  expect(await tipsFor(await company.owner())).toHaveLength(1);
  // A tip is pay: the desk does not see it.
  expect(await tipsFor(dispatcher)).toEqual([]);
});

describe('a phone that did not know what the board had changed', () => {
  const troubles = async () => {
    const board = (await dispatcher.get('/api/board/2026-05-14')).body as BoardDto;
    return board.troubles.filter((trouble) => trouble.visitId === visit.id);
  };

  test('a press on a visit called off meanwhile is refused to the phone and told to the desk, once', async () => {
    const { job } = (await dispatcher.get(`/api/jobs/${visit.jobId}`).expect(200)).body as { job: { version: number } };
    await dispatcher
      .post(`/api/jobs/${visit.jobId}/call-off`)
      .send({ version: job.version, reason: 'Rain' })
      .expect(200);
    const body = { key: uuid(), kind: 'set_off', deviceAt: app.time.now };
    await sefa.post(`/api/visits/${visit.id}/actions`).send(body).expect(409);
    await sefa.post(`/api/visits/${visit.id}/actions`).send(body).expect(409);
    expect((await troubles()).map(({ kind, note }) => [kind, note])).toEqual([
      ['clash', 'Sefa Lund marked “On my way” at 11:00 am.'],
    ]);
  });

  test('so is one on a visit that went to another van after it was made; before, it is not there', async () => {
    const made = app.time.now;
    await press(sefa, 'set_off').expect(200);
    await press(sefa, 'undo').expect(200);
    app.time.now = '2026-05-14T15:20:00Z';
    const board = (await dispatcher.get('/api/board/2026-05-14')).body as BoardDto;
    const now = board.visits.find((one) => one.id === visit.id);
    const move = { visitId: visit.id, planVersion: now?.planVersion, vanId: company.vans.plover.id };
    await dispatcher
      .post('/api/board/moves')
      .send({ moves: [{ ...move, from: now?.from, to: now?.to }], accept: [] })
      .expect(200);
    const late = { key: uuid(), kind: 'set_off', deviceAt: made };
    const refused = await sefa.post(`/api/visits/${visit.id}/actions`).send(late).expect(409);
    expect(refused.body).toMatchObject({ error: { message: expect.stringContaining('Dispatch is told') as string } });
    expect((await troubles()).map(({ note }) => note)).toEqual(['Sefa Lund marked “On my way” at 11:00 am.']);
    app.time.now = '2026-05-14T15:25:00Z';
    const fresh = { key: uuid(), kind: 'set_off', deviceAt: app.time.now };
    await sefa.post(`/api/visits/${visit.id}/actions`).send(fresh).expect(404);
  });
});
