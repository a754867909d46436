import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { DayWorkDto, OpenWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { aStep, clock, placeVisit, pressesOf, workOf } from './testing/a-visit.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let idris: TestAgent;
let dispatcher: TestAgent;
let owner: TestAgent;
let visit: VisitDto;
const wheels = aStep({ stage: 'wheels', words: 'Wheels and tires' });
const wash = aStep({ stage: 'wash', words: 'Wash, top down', product: 'Shampoo', ratio: '4 oz per gallon' });
const measure = aStep({ stage: 'correct', words: 'Measure the paint', isAlone: true });

beforeAll(async () => {
  company = await aCompany(app);
  sefa = await company.sefa();
  idris = await company.idris();
  dispatcher = await company.dispatcher();
  owner = await company.owner();
  await owner
    .put(`/api/services/${company.wash.id}/checklist`)
    .send({ version: 0, asksNote: false, steps: [measure, { ...wash, ratio: '10 to 1' }, wheels] })
    .expect(200);
});

beforeEach(async () => {
  app.time.now = clock('15:00');
  const span = { from: clock('15:30'), to: clock('16:20') };
  visit = await placeVisit(company, dispatcher, { ...span, vanId: company.vans.gannet.id });
});

const presses = (agent = sefa) => pressesOf(app, agent, visit.id);
const refsOf = (...steps: { id: string }[]) =>
  steps.map((step) => ({ lineId: visit.lines[0]?.id ?? '', stepId: step.id }));
const start = async () => {
  for (const kind of ['set_off', 'arrive', 'start_work'])
    await presses().mark(kind, { reason: 'Walked round before' }).expect(200);
};

describe('a service’s steps', () => {
  test('are kept in order of work, with the ratio read', async () => {
    const read = await owner.get(`/api/services/${company.wash.id}/checklist`).expect(200);
    expect(read.body).toMatchObject({
      checklist: { version: 1, steps: [{ id: wheels.id }, { id: wash.id, ratio: '10:1' }, { id: measure.id }] },
    });
  });

  test('ask where a ratio reads in two ways, and where a towel’s color has another use', async () => {
    const towel = { use: 'glass' as const, color: 'Blue' };
    const steps = [
      { ...wash, ratio: '1:7' },
      aStep({ stage: 'wash', words: 'Dry', towel: { use: 'paint', color: 'blue' } }),
      aStep({ stage: 'glass', words: 'Glass', towel }),
    ];
    const asked = await owner
      .put(`/api/services/${company.wash.id}/checklist`)
      .send({ version: 1, asksNote: false, steps })
      .expect(422);
    const { fields } = (asked.body as { error: { fields: Record<string, string> } }).error;
    expect(fields['steps.0.ratio']).toContain('Which part is water? 7 parts water');
    expect(fields['steps.2.towel.color']).toBe('Blue is the paint towel. Choose another color here.');
    await dispatcher
      .put(`/api/services/${company.wash.id}/checklist`)
      .send({ version: 1, asksNote: false, steps: [] })
      .expect(403);
  });

  test('stay with a visit as they were when its work started', async () => {
    await start();
    const read = await owner.get(`/api/services/${company.wash.id}/checklist`);
    const { checklist } = read.body as { checklist: { version: number; steps: object[] } };
    const next = [...checklist.steps, aStep({ stage: 'protect', words: 'Wax' })];
    const save = (version: number) =>
      owner.put(`/api/services/${company.wash.id}/checklist`).send({ version, asksNote: false, steps: next });
    await save(checklist.version).expect(200);
    await save(checklist.version).expect(409);
    const under = workOf((await dispatcher.get(`/api/visits/${visit.id}/work`)).body);
    expect(under.lines[0]?.steps).toHaveLength(checklist.steps.length);
    const other = await placeVisit(company, dispatcher, {
      ...{ from: clock('15:30'), to: clock('16:20'), vanId: company.vans.gannet.id },
    });
    const fresh = workOf((await dispatcher.get(`/api/visits/${other.id}/work`)).body);
    expect(fresh.lines[0]?.steps).toHaveLength(next.length);
  });
});

describe('ticks', () => {
  test('come after Start work, are taken once each, and the first one stays', async () => {
    await presses()
      .work('tick', { steps: refsOf(wheels) })
      .expect(409);
    await start();
    const body = { key: uuid(), kind: 'tick', deviceAt: app.time.now, steps: refsOf(wheels) };
    const send = () => sefa.post(`/api/visits/${visit.id}/work`).send(body);
    const [one, two] = await Promise.all([send(), send()]);
    expect([one, two].map((answer) => (answer.body as { isRepeat: boolean }).isRepeat).sort()).toEqual([false, true]);
    const { events } = workOf(one.body);
    expect(events.map(({ kind, by, steps }) => ({ kind, by, steps }))).toEqual([
      { kind: 'tick', by: 'Sefa Lund', steps: refsOf(wheels) },
    ]);
  });

  test('are put in the order in which they were pressed, whichever phone sent first', async () => {
    await start();
    app.time.now = clock('15:20');
    await presses()
      .work('untick', { steps: refsOf(wheels) })
      .expect(200);
    const late = await presses().work('tick', { steps: refsOf(wheels), deviceAt: clock('15:10') });
    expect(workOf(late.body).events.map((event) => event.kind)).toEqual(['tick', 'untick']);
  });

  test('of a step that is ticked by itself never come with others, nor those of another list', async () => {
    await start();
    await presses()
      .work('tick', { steps: refsOf(wash, measure) })
      .expect(422);
    await presses()
      .work('tick', { steps: refsOf(measure) })
      .expect(200);
    await presses()
      .work('tick', { steps: refsOf({ id: uuid() }) })
      .expect(422);
    await presses().work('tick').expect(422);
  });

  test('of another crew’s visit are not there', async () => {
    await start();
    await presses(idris)
      .work('tick', { steps: refsOf(wheels) })
      .expect(404);
    const day = (await idris.get('/api/run-sheet/2026-05-14/work').expect(200)).body as DayWorkDto;
    expect(day.works).toEqual([]);
    await idris.get(`/api/visits/${visit.id}/work`).expect(403);
  });
});

describe('Done', () => {
  test('demands what must be ticked by itself, or a reason to go on without', async () => {
    await start();
    const asked = await presses().mark('finish').expect(422);
    expect(asked.body).toMatchObject({
      error: {
        code: 'missing_steps',
        hint: { current: { missing: [{ words: 'Measure the paint (grey 2019 hatchback)' }] } },
      },
    });
    const keys = refsOf(measure).map(({ lineId, stepId }) => `${lineId}/${stepId}`);
    await presses().work('go_on', { keys, words: '' }).expect(422);
    await presses().work('go_on', { keys, words: 'Gauge is broken' }).expect(200);
    await presses().mark('finish').expect(200);
  });

  test('of a phone without signal, and of the desk, is recorded as it happened', async () => {
    await start();
    await pressesOf(app, dispatcher, visit.id).mark('finish').expect(200);
    await presses().mark('undo').expect(200);
    app.time.now = clock('15:40');
    await presses()
      .mark('finish', { deviceAt: clock('15:30') })
      .expect(200);
  });
});

describe('must-knows', () => {
  const flags = async (more: object) => {
    const { id } = company.customer;
    const read = await dispatcher.get(`/api/customers/${id}`);
    const { id: _id, version, ...fields } = (read.body as { customer: typeof company.customer }).customer;
    const addresses = fields.addresses.map((address) => ({ ...address, ...more }));
    await dispatcher
      .put(`/api/customers/${id}`)
      .send({ ...fields, addresses, version })
      .expect(200);
  };

  test('come before Start work, unless it was pressed in a dead zone after what was known there', async () => {
    await flags({ hasDog: true, drain: 'storm' });
    for (const kind of ['set_off', 'arrive']) await presses().mark(kind).expect(200);
    const refused = await presses().mark('start_work', { reason: 'Walked round before' }).expect(422);
    expect(refused.body).toMatchObject({
      error: { code: 'must_knows', hint: { current: { missing: [{ code: 'dog' }, { code: 'creek' }] } } },
    });
    await presses()
      .work('confirm', { keys: ['dog', 'creek'] })
      .expect(200);
    await flags({ shutsGate: true });
    await presses().mark('start_work', { reason: 'Walked round before' }).expect(422);
    app.time.now = clock('15:30');
    await presses()
      .mark('start_work', { reason: 'Walked round before', deviceAt: clock('15:05') })
      .expect(200);
    await flags({ hasDog: false, drain: 'unknown', shutsGate: false });
  });

  test('the desk does not confirm for a crew; it records what it was told', async () => {
    await flags({ hasDog: true });
    for (const kind of ['set_off', 'arrive']) await presses().mark(kind).expect(200);
    await pressesOf(app, dispatcher, visit.id).mark('start_work', { reason: 'Walked round before' }).expect(200);
    await flags({ hasDog: false });
  });

  test('where the key goes back is for the crew in its hours', async () => {
    await flags({ takesKey: true, keyGoesBack: 'Lockbox left of the door' });
    const seenAt = async (now: string) => {
      app.time.now = now;
      const day = (await sefa.get('/api/run-sheet/2026-05-14/work').expect(200)).body as DayWorkDto;
      return day.works.find((work) => work.visitId === visit.id)?.mustKnows.find(({ code }) => code === 'key')?.words;
    };
    expect(await seenAt('2026-05-14T00:59:00.000Z')).not.toContain('Lockbox');
    expect(await seenAt('2026-05-14T01:00:00.000Z')).toContain('Lockbox left of the door');
    await flags({ takesKey: false });
  });
});

test('a key that was taken stays on the desk’s list until it is handed back', async () => {
  const keys = async () => ((await dispatcher.get('/api/open-work').expect(200)).body as OpenWorkDto).keys;
  await presses().work('key_taken', { words: 'Lockbox' }).expect(200);
  expect(await keys()).toMatchObject([
    { visitId: visit.id, takenBy: 'Sefa Lund', words: 'Lockbox', vanName: 'Gannet' },
  ]);
  app.time.now = clock('15:01');
  await pressesOf(app, dispatcher, visit.id).work('key_back').expect(200);
  expect(await keys()).toEqual([]);
  await sefa.get('/api/open-work').expect(403);
});
