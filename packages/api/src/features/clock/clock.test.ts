import { beforeAll, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { ClockEntryDto, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { ClockCorrection } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  sefa = await company.sefa();
  dispatcher = await company.dispatcher();
});
const press = (at: string, action: 'start' | 'stop', kind?: string) => {
  app.time.now = at;
  return sefa.post('/api/clock/actions').send({ key: uuid(), action, deviceAt: at, ...(kind && { kind }) });
};
const state = (body: unknown) => (body as { clock: ClockStateDto }).clock;

describe('the clock', () => {
  test('runs one kind of time after another, to the second', async () => {
    await press('2026-05-14T12:00:00Z', 'start', 'shop').expect(200);
    await press('2026-05-14T12:20:00Z', 'start', 'travel').expect(200);
    await press('2026-05-14T13:00:00Z', 'start', 'meal_break').expect(200);
    const out = await press('2026-05-14T13:30:00Z', 'stop').expect(200);
    expect(state(out.body)).toMatchObject({ open: null, todayMinutes: 60, weekMinutes: 60 });
    expect(state(out.body).today.map((entry) => [entry.kind, entry.endedAt])).toEqual([
      ['shop', '2026-05-14T12:20:00.000Z'],
      ['travel', '2026-05-14T13:00:00.000Z'],
      ['meal_break', '2026-05-14T13:30:00.000Z'],
    ]);
  });

  test('clocking out twice is a clash, not an error', async () => {
    const again = await press('2026-05-14T13:31:00Z', 'stop').expect(409);
    expect(again.body).toMatchObject({ error: { code: 'clash', hint: { current: { open: null } } } });
  });

  test('a press that arrives late never runs backwards', async () => {
    await press('2026-05-14T14:00:00Z', 'start', 'shop').expect(200);
    app.time.now = '2026-05-14T15:00:00Z';
    const late = await sefa
      .post('/api/clock/actions')
      .send({ key: uuid(), action: 'start', kind: 'waiting', deviceAt: '2026-05-14T13:45:00Z' })
      .expect(200);
    const [shop, waiting] = state(late.body).today.slice(-2);
    expect([shop?.startedAt, shop?.endedAt, waiting?.startedAt]).toEqual(Array(3).fill('2026-05-14T14:00:00.000Z'));
  });

  test('a forgotten clock-out is flagged, not guessed', async () => {
    app.time.now = '2026-05-15T12:00:00Z';
    const answer = await sefa.get('/api/clock').expect(200);
    expect(state(answer.body)).toMatchObject({ forgotten: [{ kind: 'waiting', isForgotten: true, endedAt: null }] });
  });
});

describe('a correction', () => {
  const entries = async () =>
    (
      (await dispatcher.get('/api/clock/entries?from=2026-05-14&to=2026-05-14').expect(200)).body as {
        entries: ClockEntryDto[];
      }
    ).entries;

  test('needs a reason, names the version it saw, and keeps both versions', async () => {
    const open = (await entries()).find((entry) => entry.endedAt === null);
    const fixed = {
      kind: 'waiting',
      startedAt: open?.startedAt,
      endedAt: '2026-05-14T20:00:00Z',
      isInterrupted: false,
      version: open?.version,
    };
    await dispatcher
      .put(`/api/clock/entries/${open?.id}`)
      .send({ ...fixed, reason: '' })
      .expect(400);
    await dispatcher
      .put(`/api/clock/entries/${open?.id}`)
      .send({ ...fixed, endedAt: '2026-05-14T13:00:00Z', reason: 'x' })
      .expect(422);
    await dispatcher
      .put(`/api/clock/entries/${open?.id}`)
      .send({ ...fixed, endedAt: '2026-05-16T13:00:00Z', reason: 'x' })
      .expect(422);
    await dispatcher
      .put(`/api/clock/entries/${open?.id}`)
      .send({ ...fixed, reason: 'Forgot to clock out' })
      .expect(200);
    await dispatcher
      .put(`/api/clock/entries/${open?.id}`)
      .send({ ...fixed, reason: 'Again' })
      .expect(409);
    expect(await ClockCorrection.findOne({ where: { entryId: open?.id ?? '' } })).toMatchObject({
      before: { endedAt: null },
      reason: 'Forgot to clock out',
    });
  });

  test('is not a technician’s to make, nor is another’s time theirs to see', async () => {
    await sefa.get('/api/clock/entries?from=2026-05-14&to=2026-05-14').expect(403);
    await sefa
      .put(`/api/clock/entries/${first(await entries()).id}`)
      .send({})
      .expect(403);
  });
});

describe('a crew mate’s clock', () => {
  test('is pressed by somebody who rides along, marked as such, and by nobody else', async () => {
    const { idris, sefa: own } = company.people;
    const at = '2026-05-14T16:00:00Z';
    app.time.now = at;
    const body = { action: 'start', kind: 'shop', deviceAt: at, forPersonId: idris.id };
    const stranger = await sefa
      .post('/api/clock/actions')
      .send({ key: uuid(), ...body })
      .expect(422);
    expect(stranger.body).toMatchObject({ error: { code: 'not_riding' } });

    const shift = { from: '2026-05-14T15:30:00Z', to: '2026-05-14T22:00:00Z' };
    const crew = [own.id, idris.id].map((personId) => ({ personId, ...shift }));
    await dispatcher.put(`/api/vans/${company.vans.plover.id}/crew/2026-05-14`).send({ members: [] }).expect(200);
    await dispatcher.put(`/api/vans/${company.vans.gannet.id}/crew/2026-05-14`).send({ members: crew }).expect(200);
    const pressed = await sefa
      .post('/api/clock/actions')
      .send({ key: uuid(), ...body })
      .expect(200);
    expect(state(pressed.body).crew).toEqual([
      { personId: idris.id, name: 'Idris Vale', kind: 'shop', since: '2026-05-14T16:00:00.000Z' },
    ]);
    const mate = await company.idris();
    const seen = state((await mate.get('/api/clock').expect(200)).body);
    expect(seen.open).toMatchObject({ kind: 'shop', note: 'Pressed by Sefa Lund' });
  });
});

test('the house’s rule on reminding of breaks goes along with the clock; only the owner sets it', async () => {
  const owner = await company.owner();
  const { settings } = (await owner.get('/api/settings').expect(200)).body as { settings: Record<string, unknown> };
  await dispatcher
    .put('/api/settings')
    .send({ ...settings, mealReminderMinutes: 300 })
    .expect(403);
  await owner
    .put('/api/settings')
    .send({ ...settings, mealReminderMinutes: 5 })
    .expect(400);
  await owner
    .put('/api/settings')
    .send({ ...settings, mealReminderMinutes: 300 })
    .expect(200);
  const clock = state((await sefa.get('/api/clock').expect(200)).body);
  expect(clock.breaks).toEqual({ mealAfterMinutes: 300, restAfterMinutes: null });
});

test('a press that arrives days late leaves what runs today alone, and says what to do', async () => {
  const today = '2026-05-22T12:00:00.000Z';
  await press(today, 'start', 'training').expect(200);
  const late = { key: uuid(), action: 'stop', deviceAt: '2026-05-20T20:00:00.000Z' };
  const answer = await sefa.post('/api/clock/actions').send(late).expect(409);
  expect(answer.body).toMatchObject({ error: { code: 'clash', hint: { current: { open: { kind: 'training' } } } } });
  await press('2026-05-22T12:30:00.000Z', 'stop').expect(200);
});
