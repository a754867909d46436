import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, test } from 'vitest';
import { QueryTypes, Sequelize } from 'sequelize';
import type { PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { AuditEntry } from '../../../db/models/index.ts';
import { select } from '../../../db/sequelize.ts';
import { useApp } from '../../../testing/app.ts';
import { aCompany, first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { payWeeks } from '../../../testing/pay-weeks.ts';
import { hourly, worked } from './testing/paid-weeks.ts';

const app = useApp();
const WEEKS = ['2026-04-13', '2026-04-20', '2026-04-27', '2026-05-04'] as const;
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  await hourly(owner, company.people.sefa.id, '20');
  for (const day of WEEKS) {
    await worked(company.people.sefa.id, day, '07:00', '09:00');
    await payWeeks(owner).lock(day);
  }
});

const post = (weeks: string[], paysOn = '2026-05-15') =>
  owner.post('/api/pay/paydays').send({ paysOn, note: '', weeks });
const paydayOf = (answer: { body: unknown }) => (answer.body as { payday: PaydayDto }).payday;
const list = async () =>
  (await owner.get('/api/pay/paydays').expect(200)).body as { waiting: { startsOn: string }[]; paydays: PaydayDto[] };

/** As the owner of the schema, whose rights the triggers bind too. */
const asSchemaOwner = async (sql: string) => {
  const sequelize = new Sequelize(process.env['DATABASE_MIGRATION_URL'] ?? '', { logging: false, pool: { max: 1 } });
  try {
    return await sequelize.query(sql, { type: QueryTypes.SELECT });
  } finally {
    await sequelize.close();
  }
};

test('locked weeks wait, are put on a payday together, changed, taken off and put on again', async () => {
  expect((await list()).waiting.map((week) => week.startsOn)).toEqual(WEEKS);
  const payday = paydayOf(await post(['2026-05-04', '2026-04-27']).expect(200));
  // 2 h at 20.00 each week (arithmetic).
  expect(payday).toMatchObject({ paysOn: '2026-05-15', handedOverAt: null, version: 0, madeBy: 'Rowan Tern' });
  expect(payday.weeks).toMatchObject([
    { startsOn: '2026-04-27', people: 1, grossCents: 4000 },
    { startsOn: '2026-05-04', people: 1, grossCents: 4000 },
  ]);
  expect((await list()).waiting.map((week) => week.startsOn)).toEqual(['2026-04-13', '2026-04-20']);

  const change = { paysOn: '2026-05-16', note: 'A day late', weeks: ['2026-05-04'], version: 0 };
  const changed = paydayOf(await owner.put(`/api/pay/paydays/${payday.id}`).send(change).expect(200));
  expect([changed.note, changed.weeks.length, changed.version]).toEqual(['A day late', 1, 1]);
  await owner.put(`/api/pay/paydays/${payday.id}`).send(change).expect(409);
  await owner.delete(`/api/pay/paydays/${payday.id}?version=0`).expect(409);
  await owner.delete(`/api/pay/paydays/${payday.id}?version=1`).expect(200);
  await owner.get(`/api/pay/paydays/${payday.id}`).expect(404);
  expect((await list()).waiting).toHaveLength(4);

  const trail = await AuditEntry.findAll({ where: { entity: 'payday', entityId: payday.id }, order: [['id', 'ASC']] });
  expect(trail.map((entry) => entry.action)).toEqual(['made', 'changed', 'removed']);
  expect(trail[1]?.details).toMatchObject({
    before: { paysOn: '2026-05-15', weeks: ['2026-04-27', '2026-05-04'] },
    after: { paysOn: '2026-05-16', weeks: ['2026-05-04'] },
  });
});

describe('a clear sentence at the field', () => {
  test.each([
    ['an open week', ['2026-05-11'], '2026-05-22', 'weeks', 'Week 20 is not locked. Lock it first, or leave it out.'],
    [
      'a day inside a week',
      ['2026-05-05'],
      '2026-05-22',
      'weeks',
      'Week 19 is not locked. Lock it first, or leave it out.',
    ],
    [
      'a date before the end of a week',
      ['2026-05-04'],
      '2026-05-09',
      'paysOn',
      'The payday can’t be before May 10, 2026, when week 19 ends.',
    ],
  ])('%s', async (_what, weeks, paysOn, field, sentence) => {
    const answer = await post(weeks, paysOn).expect(422);
    expect((answer.body as { error: { fields: Record<string, string> } }).error.fields).toEqual({ [field]: sentence });
  });

  test('no week, and a misspelt date', async () => {
    const answer = await post([], 'soon').expect(400);
    expect((answer.body as { error: { fields: object } }).error.fields).toEqual({
      weeks: 'Tick at least one locked week.',
      paysOn: 'Give a date like 2026-05-14.',
    });
  });

  test('a week on another payday already; of two at once one is made', async () => {
    const answers = await Promise.all([post(['2026-04-13']), post(['2026-04-13', '2026-04-20'])]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 422]);
    const refused = first(answers.filter((answer) => answer.status === 422)).body as { error: { message: string } };
    expect(refused.error.message).toBe('Week 16 is on the payday of May 15, 2026 already. A week is handed over once.');
    const made = first((await list()).paydays);
    await owner.delete(`/api/pay/paydays/${made.id}?version=0`).expect(200);
  });
});

test('a payday with people names each week’s gross, and the tips and reimbursements in it', async () => {
  const payday = paydayOf(await post(['2026-04-20', '2026-04-13']).expect(200));
  const { people } = (await owner.get(`/api/pay/paydays/${payday.id}`).expect(200)).body as { people: unknown[] };
  const sums = { grossCents: 4000, tipCents: 0, reimbursementCents: 0 };
  expect(people).toEqual([
    {
      personId: company.people.sefa.id,
      name: 'Sefa Lund',
      weeks: [
        { startsOn: '2026-04-13', ...sums },
        { startsOn: '2026-04-20', ...sums },
      ],
    },
  ]);
  await owner.delete(`/api/pay/paydays/${payday.id}?version=0`).expect(200);
});

describe('after the hand-over nothing changes', () => {
  let payday: PaydayDto;
  beforeAll(async () => {
    payday = paydayOf(await post(['2026-04-27']).expect(200));
  });

  test('once, by the version that was seen', async () => {
    const path = `/api/pay/paydays/${payday.id}/hand-over`;
    await owner.post(path).send({ version: 7 }).expect(409);
    const [one, two] = await Promise.all([1, 2].map(() => owner.post(path).send({ version: 0 })));
    expect([one?.status, two?.status].sort()).toEqual([200, 409]);
    const handed = first((await list()).paydays);
    expect(handed).toMatchObject({ handedOverBy: 'Rowan Tern', handedOverAt: '2026-05-14T15:00:00.000Z', version: 1 });
    const fields = { paysOn: '2026-05-20', note: '', weeks: ['2026-04-27'], version: 1 };
    await owner.put(`/api/pay/paydays/${payday.id}`).send(fields).expect(409);
    await owner.delete(`/api/pay/paydays/${payday.id}?version=1`).expect(409);
  });

  test.each([
    ['its date', `UPDATE paydays SET pays_on = pays_on + 1 WHERE handed_over_at IS NOT NULL`],
    [
      'the mark itself',
      `UPDATE paydays SET handed_over_at = NULL, handed_over_by = NULL WHERE handed_over_at IS NOT NULL`,
    ],
    ['the payday taken away', `DELETE FROM paydays WHERE handed_over_at IS NOT NULL`],
    ['a week taken off', `DELETE FROM payday_weeks`],
    [
      'a week more',
      `INSERT INTO payday_weeks SELECT p.id, w.id FROM paydays p, pay_weeks w WHERE w.starts_on = '2026-05-04'`,
    ],
  ])('%s, for the application’s role and for the owner of the schema', async (_what, sql) => {
    await expect(select(sql)).rejects.toMatchObject({ parent: { code: 'DR003' } });
    await expect(asSchemaOwner(sql)).rejects.toMatchObject({ parent: { code: 'DR003' } });
  });

  test('and an open week can’t be put on any payday, whoever tries', async () => {
    const open = paydayOf(await post(['2026-05-04']).expect(200));
    await select(
      `INSERT INTO pay_weeks (id, starts_on, ends_on, starts_at, ends_at)
       VALUES (gen_random_uuid(), '2026-05-11', '2026-05-17', '2026-05-11T04:00:00Z', '2026-05-18T04:00:00Z')`,
    );
    const sql = `INSERT INTO payday_weeks SELECT '${open.id}', id FROM pay_weeks WHERE starts_on = '2026-05-11'`;
    await expect(select(sql)).rejects.toMatchObject({ parent: { code: 'DR004' } });
    await expect(asSchemaOwner(sql)).rejects.toMatchObject({ parent: { code: 'DR004' } });
  });
});

test('paydays are the owner’s alone', async () => {
  for (const agent of [await company.dispatcher(), await company.sefa()]) {
    await agent.get('/api/pay/paydays').expect(403);
    await agent
      .post('/api/pay/paydays')
      .send({ paysOn: '2026-05-15', weeks: ['2026-05-04'] })
      .expect(403);
  }
});
