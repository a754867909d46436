import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, test } from 'vitest';
import type { PayWeekDto, StatementDto } from '@driprail/shared/contracts/pay.contract';
import type { TimeOffBalanceDto, TimeOffQuote } from '@driprail/shared/contracts/time-off.contract';
import type { TimeOffRule } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { select } from '../../../db/sequelize.ts';
import { useApp } from '../../../testing/app.ts';
import { aCompany } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { payWeeks } from '../../../testing/pay-weeks.ts';
import { verifyWeeks } from '../verify.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let weeks: ReturnType<typeof payWeeks>;
let sefa: string;

const sick: TimeOffRule = {
  earning: { by: 'hours_worked', perHours: '30' },
  ...{ capHours: '40', yearStartsOn: '01-01', carryHours: null, pays: { by: 'hourly' } },
};
const addRule = (fields: object) =>
  owner
    .post('/api/pay/time-off/rules')
    .send({ kind: 'sick', personId: null, startsOn: '2026-04-20', rule: sick, ...fields });
const clock = (startedAt: string, endedAt: string) =>
  owner
    .post('/api/clock/entries')
    .send({
      ...{ personId: sefa, visitId: null, kind: 'shop', startedAt, endedAt },
      ...{ isInterrupted: false, reason: 'Forgot to clock in' },
    })
    .expect(200);
const take = (fields: object) =>
  owner
    .post('/api/pay/weeks/2026-05-11/time-off')
    .send({ personId: sefa, kind: 'sick', hours: '8', on: '2026-05-12', ...fields });
const quote = (fields: object) =>
  owner
    .get('/api/pay/weeks/2026-05-11/time-off')
    .query({ personId: sefa, kind: 'sick', hours: '8', on: '2026-05-12', ...fields });
const balances = async (agent: TestAgent) =>
  ((await agent.get(`/api/pay/time-off/balances/${sefa}`).expect(200)).body as { balances: TimeOffBalanceDto[] })
    .balances;
const errorOf = (answer: { body: unknown }) =>
  (answer.body as { error: { code: string; message: string; fields: Record<string, string> } }).error;

beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  weeks = payWeeks(owner);
  sefa = company.people.sefa.id;
  const rate = {
    kind: 'hourly',
    personId: sefa,
    serviceId: null,
    clockKind: null,
    value: '22.50',
    startsOn: '2026-01-01',
  };
  await owner.post('/api/pay/rates').send(rate).expect(200);
});

describe('rules of paid time off', () => {
  test('start with a workweek, once, and the trail keeps them', async () => {
    const inside = errorOf(await addRule({ startsOn: '2026-04-22' }).expect(422));
    expect(inside.fields['startsOn']).toContain('Apr 20, 2026');
    await addRule({}).expect(200);
    await addRule({}).expect(409);
    expect(await select(`SELECT action FROM audit_entries WHERE entity = 'time_off_rule'`)).toEqual([
      { action: 'set' },
    ]);
  });

  test('a shape that makes no sense is refused at its field', async () => {
    const bad = errorOf(await addRule({ rule: { ...sick, yearStartsOn: '02-29' } }).expect(400));
    expect(bad.fields['rule.yearStartsOn']).toBe('Choose a day that every year has.');
  });
});

describe('hours off', () => {
  test('are earned by locked weeks only; an open week is expected', async () => {
    for (const day of [20, 21, 22, 23, 24]) await clock(`2026-04-${day}T12:00:00Z`, `2026-04-${day}T20:00:00Z`);
    expect(await balances(owner)).toMatchObject([{ kind: 'sick', balance: '0' }]);
    await weeks.lock('2026-04-20');
    await clock('2026-05-04T12:00:00Z', '2026-05-04T20:00:00Z');
    // 40 h at 1 for 30, and 8 h that are not locked yet.
    expect(await balances(owner)).toMatchObject([{ kind: 'sick', balance: '4/3', expected: '8/5' }]);
  });

  test('an opening balance stays in the ledger, not before the last lock', async () => {
    const opening = { personId: sefa, kind: 'sick', on: '2026-04-27', hours: '6.5', reason: 'Opening balance' };
    const early = errorOf(
      await owner
        .post('/api/pay/time-off/adjustments')
        .send({ ...opening, on: '2026-04-26' })
        .expect(422),
    );
    expect(early.fields['on']).toContain('Weeks are locked');
    await owner.post('/api/pay/time-off/adjustments').send(opening).expect(200);
    expect(await balances(owner)).toMatchObject([{ balance: '47/6' }]);
    await expect(select('DELETE FROM time_off_adjustments')).rejects.toThrow('permission denied');
  });

  test('the quote says the amount and what is missing; without a reason it is refused at the field', async () => {
    const { warnings, ...rest } = (await quote({}).expect(200)).body as TimeOffQuote;
    expect(rest).toMatchObject({ amountCents: 18_000, balance: '47/6', balanceAfter: '-1/6', dayAway: null });
    expect(warnings).toMatchObject([{ code: 'over_balance' }]);
    const refusal = errorOf(await take({}).expect(422));
    expect(refusal.message).toBe('Sefa Lund has 7 h 50 of sick time; this is 10 min more. Give a reason to go on.');
    expect(refusal.fields['over_balance']).toBe('Give a reason to go on.');
    expect(errorOf(await quote({ on: '2026-05-18' }).expect(422)).fields['on']).toContain('this pay week');
    expect(errorOf(await quote({ kind: 'vacation' }).expect(422)).fields['kind']).toContain('No rule for vacation');
    expect(errorOf(await quote({ personId: company.people.idris.id }).expect(422)).fields['kind']).toContain(
      'hourly rate',
    );
  });

  test('taken with a reason, they pay hours times the rate outside the regular rate', async () => {
    const accept = [{ code: 'over_balance', reason: 'The week’s hours are coming' }];
    const before = (await weeks.read('2026-05-11')).people;
    expect(before).toEqual([]);
    const dto = (await take({ accept }).expect(200)).body as PayWeekDto;
    expect(dto.people[0]).toMatchObject({ hoursWorked: '0', regularRate: null, totals: { gross: 18_000, makeUp: 0 } });
    expect(dto.people[0]?.lines[0]).toMatchObject({
      ...{ kind: 'paid_time_off', hours: '8', workedOn: '2026-05-12', inRegularRate: false },
      rule: '29 CFR 778.218, 778.219',
    });
    const balances = [{ kind: 'sick', earned: '0', taken: '8', adjusted: '0', lost: '0', balance: '-1/6' }];
    const one = await owner.get(`/api/pay/weeks/2026-05-11/time-off/${sefa}`).expect(200);
    expect(one.body).toEqual({ timeOff: balances });
    const whole = await owner.get('/api/pay/weeks/2026-05-11?timeOff=all').expect(200);
    expect((whole.body as PayWeekDto).timeOff[sefa]).toEqual(balances);
    const [trail] = await select<{ details: object }>(
      `SELECT details FROM audit_entries WHERE action = 'hours off taken'`,
    );
    expect(trail?.details).toMatchObject({ accepted: accept, hours: '8' });
  });

  test('two takings at once can’t both have the last hours', async () => {
    await owner.post('/api/pay/time-off/adjustments').send({
      ...{ personId: sefa, kind: 'sick', on: '2026-05-11', hours: '4.1667', reason: 'Rounded up' },
    });
    // In two weeks, so that they don't wait for each other at a week's row.
    const inWeekBefore = owner
      .post('/api/pay/weeks/2026-05-04/time-off')
      .send({ personId: sefa, kind: 'sick', hours: '4', on: '2026-05-08' });
    const both = await Promise.all([take({ hours: '4', on: '2026-05-13' }), inWeekBefore]);
    expect(both.map((answer) => answer.status).sort()).toEqual([200, 422]);
  });

  test('the statement is frozen with its balances, and the week is proved', async () => {
    app.time.now = '2026-05-18T14:00:00Z';
    owner = await company.owner();
    weeks = payWeeks(owner);
    await weeks.lock('2026-05-11');
    const frozen = (await weeks.read('2026-05-11')).timeOff[sefa];
    // A week before that is locked late adds to the ledger, not to the statement that was handed over.
    await weeks.lock('2026-05-04');
    expect((await weeks.read('2026-05-11')).timeOff[sefa]).toEqual(frozen);
    const own = await company.sefa();
    const statement = (await own.get(`/api/pay/statements/2026-05-11/${sefa}`).expect(200)).body as StatementDto;
    expect(statement.timeOff).toEqual(frozen);
    await own.get(`/api/pay/statements/2026-05-11/${sefa}/statement.pdf`).expect(200);
    expect(await verifyWeeks()).toEqual({ verified: 3, complaints: [] });
    await take({}).expect(422);
  });
});

describe('the wall', () => {
  test('balances are one’s own and the owner’s; rules and takings the owner’s alone', async () => {
    const [own, other, desk] = await Promise.all([company.sefa(), company.idris(), company.dispatcher()]);
    expect(await balances(own)).toHaveLength(1);
    for (const agent of [other, desk]) {
      await agent.get(`/api/pay/time-off/balances/${sefa}`).expect(403);
    }
    await desk.get(`/api/pay/time-off/balances/${company.people.maren.id}`).expect(200);
    for (const agent of [own, other, desk]) {
      await agent.get('/api/pay/time-off/rules').expect(403);
      await agent.get('/api/pay/weeks/2026-05-11/time-off').expect(403);
      await agent.post('/api/pay/weeks/2026-05-11/time-off').send({}).expect(403);
      await agent.post('/api/pay/time-off/adjustments').send({}).expect(403);
    }
  });
});
