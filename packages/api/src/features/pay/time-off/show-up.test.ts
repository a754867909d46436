import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import { beforeAll, describe, expect, test } from 'vitest';
import { addMinutes } from '@driprail/shared/domain/time/zone';
import { useApp } from '../../../testing/app.ts';
import { aCompany } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { payWeeks } from '../../../testing/pay-weeks.ts';
import { verifyWeeks } from '../verify.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let crew: TestAgent;
let weeks: ReturnType<typeof payWeeks>;

const WEEK = '2026-05-11';
const addRule = (rule: object, startsOn = WEEK) =>
  owner.post('/api/pay/show-up/rules').send({ placeId: null, startsOn, rule, source: 'Handbook, page 4' });
const linesOf = async (kind: string) =>
  (await weeks.read(WEEK)).people.flatMap((person) => person.lines.filter((line) => line.kind === kind));

beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  crew = await company.sefa();
  weeks = payWeeks(owner);
  const rate = {
    kind: 'hourly',
    personId: null,
    serviceId: null,
    clockKind: null,
    value: '20',
    startsOn: '2026-01-01',
  };
  await owner.post('/api/pay/rates').send(rate).expect(200);
});

/** A visit of Sefa's on May 14, the n-th of the day, with presses made a minute apart. */
async function aTrip(n: number, presses: object[]): Promise<{ jobId: string; visitId: string }> {
  const { job, visit } = await company.aJob();
  const at = (minute: number) => addMinutes('2026-05-14T13:00:00.000Z', 45 * n + minute);
  app.time.now = at(0);
  const move = { visitId: visit.id, planVersion: 0, vanId: company.vans.gannet.id, from: at(10), to: at(40) };
  await owner
    .post('/api/board/moves')
    .send({ moves: [move] })
    .expect(200);
  for (const [minute, press] of presses.entries()) {
    app.time.now = at(minute + 1);
    await crew
      .post(`/api/visits/${visit.id}/actions`)
      .send({ key: key(), deviceAt: app.time.now, reason: 'Nobody home', ...press })
      .expect(200);
  }
  return { jobId: job.id, visitId: visit.id };
}

describe('a trip with nobody home', () => {
  test('pays nothing without a rule, and the rule’s amount once there is one', async () => {
    await aTrip(0, [{ kind: 'set_off' }, { kind: 'arrive' }, { kind: 'call_off', trouble: 'nobody_home' }]);
    expect(await linesOf('no_show_trip')).toEqual([]);
    await addRule({ pays: 'no_show_trip', dollars: '15', isShared: false }).expect(200);
    await addRule({ pays: 'no_show_trip', dollars: '18', isShared: false }).expect(409);
    expect(await linesOf('no_show_trip')).toMatchObject([
      { personId: company.people.sefa.id, amountCents: 1500, inRegularRate: true, workedOn: '2026-05-14' },
    ]);
  });

  test('counts when the crew reports it and the desk calls the job off', async () => {
    const { jobId } = await aTrip(1, [{ kind: 'arrive' }, { kind: 'trouble', trouble: 'nobody_home' }]);
    expect(await linesOf('no_show_trip')).toHaveLength(1);
    const { version } = ((await owner.get(`/api/jobs/${jobId}`).expect(200)).body as { job: { version: number } }).job;
    await owner.post(`/api/jobs/${jobId}/call-off`).send({ version, reason: 'Nobody home' }).expect(200);
    expect(await linesOf('no_show_trip')).toHaveLength(2);
  });

  test('is none before arrival, for another trouble, or when it is taken back', async () => {
    await aTrip(2, [{ kind: 'set_off' }, { kind: 'call_off', trouble: 'nobody_home' }]);
    await aTrip(3, [{ kind: 'arrive' }, { kind: 'call_off', trouble: 'weather' }]);
    const taken = [{ kind: 'arrive' }, { kind: 'call_off', trouble: 'nobody_home' }];
    const { visitId } = await aTrip(4, taken);
    expect(await linesOf('no_show_trip')).toHaveLength(3);
    await crew
      .post(`/api/visits/${visitId}/actions`)
      .send({ key: key(), deviceAt: app.time.now, kind: 'undo' })
      .expect(200);
    expect(await linesOf('no_show_trip')).toHaveLength(2);
  });
});

describe('show-up pay', () => {
  const clock = (day: number, hours: number) => ({
    ...{ personId: company.people.idris.id, visitId: null, kind: 'shop', isInterrupted: false, reason: 'Rained off' },
    startedAt: `2026-05-${day}T12:00:00Z`,
    endedAt: `2026-05-${day}T${12 + hours}:00:00Z`,
  });

  test('pays days cut short from the rule on, but no day away', async () => {
    for (const day of [11, 12]) await owner.post('/api/clock/entries').send(clock(day, 1)).expect(200);
    await addRule({ pays: 'show_up', hours: '3' }).expect(200);
    await addRule({ pays: 'show_up', hours: '3' }, '2026-05-13').expect(422);
    const idris = (await linesOf('show_up_pay')).filter((line) => line.personId === company.people.idris.id);
    expect(idris).toMatchObject([
      { workedOn: '2026-05-11', hours: '2', amountCents: 4000, inRegularRate: false },
      { workedOn: '2026-05-12', hours: '2', amountCents: 4000 },
    ]);
    const away = { startsOn: '2026-05-12', endsOn: '2026-05-12', note: 'Left at ten' };
    await owner.post(`/api/people/${company.people.idris.id}/time-off`).send(away).expect(200);
    const left = (await linesOf('show_up_pay')).filter((line) => line.personId === company.people.idris.id);
    expect(left.map((line) => line.workedOn)).toEqual(['2026-05-11']);
  });

  test('a week with both is proved from its snapshot, and later rules leave it alone', async () => {
    app.time.now = '2026-05-18T14:00:00Z';
    owner = await company.owner();
    weeks = payWeeks(owner);
    await weeks.lock(WEEK);
    expect(await verifyWeeks()).toEqual({ verified: 1, complaints: [] });
    await addRule({ pays: 'nothing', of: 'show_up' }).expect(422);
    await addRule({ pays: 'nothing', of: 'show_up' }, '2026-05-18').expect(200);
    expect((await weeks.read(WEEK)).lateDifferences).toEqual([]);
  });

  test('is the owner’s to set', async () => {
    for (const agent of [crew, await company.dispatcher()])
      await agent.post('/api/pay/show-up/rules').send({}).expect(403);
  });
});
