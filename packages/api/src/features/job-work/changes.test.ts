import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { QueryTypes, Sequelize } from 'sequelize';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { JobChangeDto, OpenWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { select } from '../../db/sequelize.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { createService } from '../service-menu/index.ts';
import { clock, placeVisit, pressesOf, workOf } from './testing/a-visit.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let dispatcher: TestAgent;
let lamps: ServiceDto;
let polish: ServiceDto;
let visit: VisitDto;

beforeAll(async () => {
  company = await aCompany(app);
  sefa = await company.sefa();
  dispatcher = await company.dispatcher();
  const service = (name: string, priceCents: number, minutes: number, skills: 'correction'[] = []) =>
    createService(company.ctx, {
      ...{ name, kind: 'add_on', description: '', skills, equipment: [], isActive: true, position: 1 },
      ...{ startsOn: '2026-01-01', prices: [{ sizeClass: 'sedan', priceCents, minutes }] },
    });
  lamps = await service('Headlight restoration', 4800, 40);
  polish = await service('One-step polish', 28_000, 165, ['correction']);
});

beforeEach(async () => {
  app.time.now = clock('15:00');
  const span = { from: clock('15:30'), to: clock('17:00') };
  visit = await placeVisit(company, dispatcher, { ...span, vanId: company.vans.gannet.id });
  for (const kind of ['set_off', 'arrive']) await presses().mark(kind).expect(200);
});

const presses = (agent = sefa) => pressesOf(app, agent, visit.id);
const vehicleId = () => first(company.customer.vehicles).id;
const add = (service: ServiceDto) =>
  ({ kind: 'add', serviceId: service.id, vehicleId: vehicleId(), sizeClass: 'sedan' }) as const;
const jobOf = async () => ((await dispatcher.get(`/api/jobs/${visit.jobId}`).expect(200)).body as { job: JobDto }).job;
const lastChange = (body: unknown): JobChangeDto => first(workOf(body).changes);
const asked = async () =>
  ((await dispatcher.get('/api/open-work').expect(200)).body as OpenWorkDto).changes.filter(
    (change) => change.visitId === visit.id,
  );

describe('a change that nothing hinders', () => {
  test('is done at once, with both prices in the job’s history and in the audit trail', async () => {
    const answer = await presses().change(add(lamps), {
      shownCents: 4800,
      saidYes: { by: 'H. Nakagawa', at: app.time.now },
    });
    expect(answer.status).toBe(200);
    expect(lastChange(answer.body)).toMatchObject({
      state: 'done',
      saidYesBy: 'H. Nakagawa',
      priceDifferenceCents: 4800,
    });
    const job = await jobOf();
    expect(job.lines.map(({ serviceName, priceCents }) => [serviceName, priceCents])).toEqual([
      ['Wash and wax', 24_000],
      ['Headlight restoration', 4800],
    ]);
    expect(first(job.visits)).toMatchObject({ minutes: 130, to: clock('17:40') });
    expect(job.history.map((event) => event.text)).toContain(
      'Headlight restoration added, visit 240.00 to 288.00, Customer asked',
    );
    const [entry] = await select<{ details: Record<string, unknown> }>(
      `SELECT details FROM audit_entries WHERE entity_id = :id AND action = 'changed at the car'`,
      { id: visit.jobId },
    );
    expect(entry?.details).toMatchObject({ priceDifferenceCents: 4800, before: [{ priceCents: 24_000 }] });
  });

  test('drops, swaps and raises a line; only that line is touched', async () => {
    await presses().change(add(lamps), { shownCents: 4800 }).expect(200);
    const [wash, lamp] = (await jobOf()).lines;
    const raise = { kind: 'condition', lineId: wash?.id, condition: 'dirty' };
    await presses().change(raise, { shownCents: 4800 }).expect(200);
    await presses().change({ kind: 'drop', lineId: lamp?.id }, { shownCents: -4800 }).expect(200);
    expect((await jobOf()).lines).toMatchObject([{ id: wash?.id, priceCents: 28_800, minutes: 110 }]);
    await presses().change({ kind: 'drop', lineId: wash?.id }, { shownCents: -28_800 }).expect(409);
    const swap = { kind: 'swap', lineId: wash?.id, serviceId: lamps.id };
    await presses()
      .change(swap, { shownCents: 4800 - 28_800 })
      .expect(200);
    expect((await jobOf()).lines).toMatchObject([{ id: wash?.id, serviceName: 'Headlight restoration' }]);
  });

  test('is taken once, needs a reason, and is not there for another crew', async () => {
    const body = {
      ...{ key: '0f6f2d5e-9f0b-4f6e-8d9a-0c9f3c1a2b3c', deviceAt: app.time.now, change: add(lamps), shownCents: 4800 },
      ...{ reason: 'Customer asked', saidYes: { by: '', at: app.time.now } },
    };
    const send = (agent: TestAgent, more: object = {}) =>
      agent.post(`/api/visits/${visit.id}/changes`).send({ ...body, ...more });
    await send(await company.idris()).expect(404);
    await send(sefa, { reason: '' }).expect(400);
    const [one, two] = await Promise.all([send(sefa), send(sefa)]);
    expect([one.status, two.status]).toEqual([200, 200]);
    expect((await jobOf()).lines).toHaveLength(2);
  });
});

describe('a change that breaks the next promise, or needs a skill', () => {
  const ask = async (more: object = {}) =>
    lastChange(
      (
        await presses()
          .change(add(polish), { shownCents: 28_000, ...more })
          .expect(200)
      ).body,
    );

  test('is asked of the board; nothing changes before dispatch accepts', async () => {
    const change = await ask();
    expect(change).toMatchObject({ state: 'asked', hindrances: [{ code: 'missing_skill' }] });
    expect((await jobOf()).lines).toHaveLength(1);
    expect((await asked()).map((one) => one.id)).toContain(change.id);
    const answer = (isAccepted: boolean, agent = dispatcher) =>
      agent.post(`/api/changes/${change.id}/answer`).send({ isAccepted, note: 'Idris comes over' });
    await answer(true, sefa).expect(403);
    await answer(true).expect(200);
    await answer(false).expect(409);
    const job = await jobOf();
    expect(job.totalCents).toBe(52_000);
    expect(job.history.map((event) => event.text)).toContain('One-step polish added, accepted, Idris comes over');
    expect(await asked()).toEqual([]);
  });

  test('declined, it stays as a quote at its price, and the job as it was', async () => {
    const change = await ask();
    await dispatcher.post(`/api/changes/${change.id}/answer`).send({ isAccepted: false, note: '' }).expect(200);
    const work = workOf((await dispatcher.get(`/api/visits/${visit.id}/work`)).body);
    expect(first(work.changes)).toMatchObject({ state: 'declined', priceDifferenceCents: 28_000 });
    expect((await jobOf()).totalCents).toBe(24_000);
  });

  test('without signal it is marked: the board was not asked', async () => {
    app.time.now = clock('15:40');
    expect(await ask({ deviceAt: clock('15:10'), isBoardNotAsked: true })).toMatchObject({
      ...{ state: 'asked', isBoardNotAsked: true, at: clock('15:10') },
    });
  });

  test('is kept as a quote when the crew wants no answer now', async () => {
    expect(await ask({ isQuote: true })).toMatchObject({ state: 'quote' });
    expect(await asked()).toEqual([]);
  });

  test('another price than the customer saw is asked too, and what was agreed holds', async () => {
    const change = lastChange((await presses().change(add(lamps), { shownCents: 4500 }).expect(200)).body);
    expect(change).toMatchObject({
      ...{ state: 'asked', priceDifferenceCents: 4500 },
      hindrances: [{ code: 'price_differs', message: 'The customer saw 45.00; the menu says 48.00.' }],
    });
    await dispatcher.post(`/api/changes/${change.id}/answer`).send({ isAccepted: true }).expect(200);
    expect((await jobOf()).totalCents).toBe(28_500);
  });

  test('accepted too late, when the line is gone, says so', async () => {
    await presses().change(add(lamps), { shownCents: 4800 }).expect(200);
    const lamp = (await jobOf()).lines[1];
    const swap = { kind: 'swap', lineId: lamp?.id, serviceId: polish.id };
    const change = lastChange((await presses().change(swap, { shownCents: 23_200 }).expect(200)).body);
    await presses().change({ kind: 'drop', lineId: lamp?.id }, { shownCents: -4800 }).expect(200);
    const late = await dispatcher.post(`/api/changes/${change.id}/answer`).send({ isAccepted: true }).expect(409);
    expect(JSON.stringify(late.body)).toContain('Headlight restoration is finished or gone meanwhile.');
  });
});

test('a job is changed while the crew is at the car', async () => {
  await presses().mark('undo').expect(200);
  await presses().change(add(lamps), { shownCents: 4800 }).expect(409);
});

test('what was pressed, and a change that was answered, are never rewritten, in the database too', async () => {
  await presses().work('key_taken', { words: 'Lockbox' }).expect(200);
  await presses().change(add(lamps), { shownCents: 4800, saidYes: { by: 'H. Nakagawa', at: app.time.now } });
  const owner = new Sequelize(process.env['DATABASE_MIGRATION_URL'] ?? '', { logging: false, pool: { max: 1 } });
  const asOwner = (sql: string) => owner.query(sql, { type: QueryTypes.UPDATE });
  try {
    await expect(asOwner(`UPDATE work_events SET words = ''`)).rejects.toMatchObject({ parent: { code: 'DR002' } });
    await expect(asOwner(`DELETE FROM job_changes`)).rejects.toMatchObject({ parent: { code: 'DR002' } });
    await expect(asOwner(`UPDATE job_changes SET price_difference_cents = 0`)).rejects.toMatchObject({
      parent: { code: 'DR002' },
    });
    // A customer may ask for erasure: the name goes, the change stays.
    await asOwner(`UPDATE job_changes SET said_yes_by = ''`);
  } finally {
    await owner.close();
  }
});
