import { beforeAll, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { payWeeks } from '../../testing/pay-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let sefa: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  sefa = await company.sefa();
});

const WEEK = '2026-05-11';
const read = () => payWeeks(owner).read(WEEK);

/** A job placed on Thursday, 11:30 to 12:20 in New York. */
async function placed(): Promise<string> {
  app.time.now = '2026-05-14T15:00:00.000Z';
  const { visit } = await company.aJob();
  const span = { from: '2026-05-14T15:30:00.000Z', to: '2026-05-14T16:20:00.000Z' };
  const move = { visitId: visit.id, planVersion: 0, vanId: company.vans.gannet.id, ...span };
  await owner
    .post('/api/board/moves')
    .send({ moves: [move] })
    .expect(200);
  return visit.id;
}

/** What a phone that lay dead sends days later. */
async function finishLate(visitId: string): Promise<void> {
  const steps = { set_off: '15:20', arrive: '15:30', start_work: '15:35', finish: '16:25' };
  for (const [kind, time] of Object.entries(steps)) {
    const deviceAt = `2026-05-14T${time}:00.000Z`;
    await sefa.post(`/api/visits/${visitId}/actions`).send({ key: uuid(), kind, deviceAt }).expect(200);
  }
}

test('a visit that nobody ended is named from the day after until it is, and pays once its late marks are in', async () => {
  const personId = company.people.sefa.id;
  const commission = { kind: 'commission_percent', personId, serviceId: null, clockKind: null, value: '40' };
  await owner
    .post('/api/pay/rates')
    .send({ ...commission, startsOn: '2026-01-01' })
    .expect(200);
  const [before, after] = [await placed(), await placed()];
  expect((await read()).unended).toEqual([]);

  app.time.now = '2026-05-18T12:00:00.000Z';
  const { unended } = await read();
  expect(unended.map((visit) => visit.visitId)).toEqual([before, after]);
  expect(first(unended)).toMatchObject({ day: '2026-05-14', crewNames: ['Sefa Lund'] });

  await finishLate(before);
  const open = await read();
  expect(open.unended.map((visit) => visit.visitId)).toEqual([after]);
  // 40 % of 240.00 (arithmetic).
  expect(first(open.people).totals.gross).toBe(9600);

  await payWeeks(owner).lock(WEEK);
  expect((await read()).unended).toEqual([]);
  await finishLate(after);
  const locked = await read();
  expect(first(locked.people).totals.gross).toBe(9600);
  expect(locked.lateDifferences).toEqual([
    { personId, name: 'Sefa Lund', lockedCents: 9600, nowCents: 19_200, correctedCents: 0 },
  ]);
  const late = await owner.get('/api/pay/late-weeks').expect(200);
  expect(late.body).toEqual({
    weeks: [{ startsOn: WEEK, number: 20, people: [{ name: 'Sefa Lund', missingCents: 9600 }] }],
  });
  await sefa.get('/api/pay/late-weeks').expect(403);

  const lineId = first(Object.values(locked.lineIds));
  const correction = {
    personId,
    kind: 'correction',
    amountCents: 9600,
    reason: 'Job of May 14',
    correctsLineId: lineId,
  };
  await owner.post('/api/pay/weeks/2026-05-18/adjustments').send(correction).expect(200);
  expect((await owner.get('/api/pay/late-weeks').expect(200)).body).toEqual({ weeks: [] });
});
