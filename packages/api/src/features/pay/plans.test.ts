import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, test } from 'vitest';
import { NO_EXTRAS } from '@driprail/shared/domain/pay/plans/pay-plan';
import type { PlanBase } from '@driprail/shared/domain/pay/plans/pay-plan';
import type { PayWeekDto, StatementDto } from '@driprail/shared/contracts/pay.contract';
import type { WhatIfWeek } from '@driprail/shared/contracts/pay-plans.contract';
import { select } from '../../db/sequelize.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { payWeeks } from '../../testing/pay-weeks.ts';
import { verifyWeeks } from './verify.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
});

const read = async (day: string) => (await owner.get(`/api/pay/weeks/${day}`).expect(200)).body as PayWeekDto;
const personOf = async (day: string) => first((await read(day)).people);
const addPlan = (startsOn: string, base: PlanBase) =>
  owner.post('/api/pay/plans').send({ personId: company.people.sefa.id, startsOn, plan: { base, extras: NO_EXTRAS } });
const clock = (startedAt: string, endedAt: string) =>
  owner
    .post('/api/clock/entries')
    .send({
      ...{ personId: company.people.sefa.id, visitId: null, kind: 'shop', startedAt, endedAt },
      ...{ isInterrupted: false, reason: 'Forgot to clock in' },
    })
    .expect(200);
const lock = (day: string) => payWeeks(owner).lock(day);
const draw: PlanBase = { kind: 'draw', percent: '40', weekly: '400', other: { hourly: '10', agreement: null } };

describe('plans', () => {
  test('a plan starts with a workweek, once, and the trail keeps it', async () => {
    const inside = await addPlan('2026-04-15', { kind: 'hourly', hourly: '20' }).expect(422);
    expect((inside.body as { error: { fields: Record<string, string> } }).error.fields['startsOn']).toContain(
      'Apr 13, 2026',
    );
    await addPlan('2026-04-13', { kind: 'hourly', hourly: '20' }).expect(200);
    await addPlan('2026-04-13', { kind: 'hourly', hourly: '21' }).expect(409);
    const { plans } = (await owner.get('/api/pay/plans').expect(200)).body as { plans: { personName: string }[] };
    expect(plans.map((plan) => plan.personName)).toEqual(['Sefa Lund']);
    expect(await select(`SELECT action FROM audit_entries WHERE entity = 'pay_plan'`)).toEqual([{ action: 'set' }]);
  });

  test('a shape that makes no sense is refused at its field', async () => {
    const bad = await addPlan('2026-04-20', { kind: 'hourly', hourly: '0' }).expect(400);
    expect(bad.body).toMatchObject({ error: { fields: { 'plan.base.hourly': 'Give an amount above zero.' } } });
  });

  test('the week is paid by the plan in force, and a salary is owed the hours beyond it', async () => {
    await clock('2026-04-14T12:00:00Z', '2026-04-14T14:00:00Z');
    expect((await personOf('2026-04-13')).totals.gross).toBe(4000);
    await addPlan('2026-04-20', { kind: 'salary', amount: '60', period: 'weekly', coversHours: '4' }).expect(200);
    await clock('2026-04-21T12:00:00Z', '2026-04-21T18:00:00Z');
    // 60 / 4 h is 15.00; 6 h were worked.
    expect((await personOf('2026-04-20')).totals.gross).toBe(9000);
  });

  test('a draw goes from week to week inside the month, from locked weeks and open ones alike', async () => {
    await addPlan('2026-04-27', draw).expect(200);
    await clock('2026-05-04T12:00:00Z', '2026-05-04T14:00:00Z');
    await clock('2026-05-11T12:00:00Z', '2026-05-11T14:00:00Z');
    // Shop time is paid by the hour beside the draw: 2 h at 10.00.
    expect((await personOf('2026-05-04')).carries?.drawDeficitCents).toBe(40_000);
    expect((await personOf('2026-05-11')).carries?.drawDeficitCents).toBe(80_000);
    await lock('2026-05-04');
    app.time.now = '2026-05-18T12:00:00Z';
    await lock('2026-05-11');
    expect((await personOf('2026-05-11')).carries?.drawDeficitCents).toBe(80_000);
    expect(await verifyWeeks()).toEqual({ verified: 2, complaints: [] });
    const late = await addPlan('2026-05-11', draw).expect(422);
    expect(late.body).toMatchObject({ error: { code: 'locked_week' } });
  });
});

describe('places', () => {
  const place = (fields: object) =>
    owner
      .post('/api/pay/places')
      .send({ name: 'Harbor', ruleSetKey: null, ownRules: null, minimumWages: [], ...fields });

  test('lists the known rule sets with their sources', async () => {
    const answer = await owner.get('/api/pay/rule-sets').expect(200);
    const sets = (answer.body as { ruleSets: { key: string; source: string; certainty: string }[] }).ruleSets;
    expect(sets.find((set) => set.key === 'us_ak')).toMatchObject({
      source: 'AS 23.10.060; 8 AAC 15.100',
      certainty: 'read',
    });
  });

  test('the owner’s own daily rule and a higher minimum wage pay the person who works there, from a week on', async () => {
    await place({}).expect(400);
    await place({ ruleSetKey: 'us_zz' }).expect(422);
    const ownRules = {
      ...{ weeklyOver: '40', dailyOver: '8', doubleAfter: null, seventhDay: null },
      ...{ paysPieceRest: false, mayCoverOtherTime: true, source: 'Town ordinance 12' },
    };
    const made = await place({
      ownRules,
      minimumWages: [{ startsOn: '2026-01-01', amount: '18', source: 'Town ordinance 12' }],
    });
    expect(made.status).toBe(200);
    await place({ ruleSetKey: 'us_ak' }).expect(409);
    const placeId = (made.body as { place: { id: string } }).place.id;
    await owner
      .post('/api/pay/person-places')
      .send({ personId: company.people.sefa.id, placeId, startsOn: '2026-05-18' })
      .expect(200);
    await addPlan('2026-05-18', { kind: 'hourly', hourly: '10' }).expect(200);
    app.time.now = '2026-05-25T12:00:00Z';
    await clock('2026-05-19T12:00:00Z', '2026-05-19T22:00:00Z');
    const person = await personOf('2026-05-18');
    // 10 h at 10.00, made up to 18.00; 2 h over 8 carry half of 18.00.
    expect(person.totals).toMatchObject({ hourly: 10_000, makeUp: 8000, overtimePremium: 1800, gross: 19_800 });
    expect(person.lines.find((line) => line.kind === 'overtime_premium')?.rule).toBe('Harbor; Town ordinance 12');
    await owner
      .post(`/api/pay/places/${placeId}/wages`)
      .send({ startsOn: '2026-05-19', amount: '20', source: 'Town ordinance 13' })
      .expect(200);
    expect((await personOf('2026-05-18')).totals.makeUp).toBe(10_000);
    expect(await select('SELECT 1 FROM person_places')).toHaveLength(1);
  });
});

test('rounded punches and premiums always up are dated rules', async () => {
  await addPlan('2026-06-01', { kind: 'hourly', hourly: '20' }).expect(200);
  const rules = {
    ...{ startsOn: '2026-06-01', overtimeRuleSet: 'us_federal', minimumWage: '7.25', crewSplit: 'equal' },
    ...{ mealBreakMinutes: 30, workweekStartsOn: 1, workweekStartsAt: '00:00' },
  };
  await owner
    .post('/api/pay/rules')
    .send({ ...rules, punchRoundingMinutes: 7 })
    .expect(400);
  const set = await owner
    .post('/api/pay/rules')
    .send({ ...rules, punchRoundingMinutes: 15, premiumRounding: 'up' })
    .expect(200);
  expect(set.body).toMatchObject({ rules: { punchRoundingMinutes: 15, premiumRounding: 'up' } });
  app.time.now = '2026-06-08T12:00:00Z';
  await clock('2026-06-02T12:07:00Z', '2026-06-02T14:08:00Z');
  expect((await personOf('2026-06-01')).hoursWorked).toBe('9/4');
});

test('what if: both results side by side, from locked and open weeks, and nothing is saved', async () => {
  const personId = company.people.sefa.id;
  const rows = () =>
    select(
      'SELECT (SELECT count(*) FROM pay_plans) p, (SELECT count(*) FROM pay_weeks) w, (SELECT count(*) FROM audit_entries) a',
    );
  const before = await rows();
  const ask = { personId, from: '2026-05-11', to: '2026-05-18' };
  const tried = await owner
    .post('/api/pay/what-if')
    .send({ ...ask, hourly: '30' })
    .expect(200);
  const { weeks } = tried.body as { weeks: WhatIfWeek[] };
  // Week 20 was locked under a draw, which names no pay by the hour of its own; week 21 had 10 h made up to 20.00 and 2 h of
  // daily overtime; at 30.00 both are 300.00 and 30.00.
  expect(weeks.map((week) => [week.number, week.isLocked, week.asPaidCents, week.whatIfCents])).toEqual([
    [20, true, 42_000, 42_000],
    [21, false, 22_000, 33_000],
  ]);
  const salary = { base: { kind: 'salary', amount: '500', period: 'weekly', coversHours: '40' }, extras: NO_EXTRAS };
  const planned = await owner
    .post('/api/pay/what-if')
    .send({ ...ask, plan: salary })
    .expect(200);
  expect((planned.body as { weeks: WhatIfWeek[] }).weeks.map((week) => week.whatIfCents)).toEqual([50_000, 52_000]);
  await owner
    .post('/api/pay/what-if')
    .send({ ...ask, to: '2026-05-04' })
    .expect(400);
  await owner
    .post('/api/pay/what-if')
    .send({ ...ask, placeId: personId })
    .expect(404);
  await owner
    .post('/api/pay/what-if')
    .send({ ...ask, ruleSetKey: 'us_zz' })
    .expect(422);
  expect(await rows()).toEqual(before);
});

test('a statement adds up the year to date, and the running week is an estimate for the person alone', async () => {
  const sefa = await company.sefa();
  const own = company.people.sefa.id;
  const statement = await sefa.get(`/api/pay/statements/2026-05-11/${own}`).expect(200);
  // Weeks 19 and 20 are locked, 420.00 each; weeks 16 and 17 never were.
  expect((statement.body as StatementDto).yearToDate).toEqual({
    ...{ year: 2026, weeks: 2, hours: '4', grossCents: 84_000, tipCents: 0, overtimePremiumCents: 0 },
  });
  const soFar = await sefa.get('/api/pay/week-so-far').expect(200);
  expect(soFar.body).toMatchObject({ startsOn: '2026-06-08', isEstimate: true, grossCents: 0, hoursWorked: '0' });
  app.time.now = '2026-06-04T12:00:00Z';
  const running = await sefa.get('/api/pay/week-so-far').expect(200);
  expect(running.body).toMatchObject({ startsOn: '2026-06-01', grossCents: 4500, hoursWorked: '9/4' });
  await (await company.dispatcher()).get('/api/pay/week-so-far').expect(403);
  expect(await select(`SELECT 1 FROM pay_weeks WHERE starts_on >= '2026-06-01'`)).toEqual([]);
});

test('the commission test informs from locked weeks', async () => {
  const answer = await owner.get(`/api/pay/commission-test/${company.people.sefa.id}`).expect(200);
  expect(answer.body).toMatchObject({ weeks: 2, commissionCents: 0, otherCents: 84_000, isMostlyCommission: false });
});

test('what a technician may not do', async () => {
  const sefa = await company.sefa();
  for (const path of ['plans', 'places', 'rule-sets']) await sefa.get(`/api/pay/${path}`).expect(403);
});
