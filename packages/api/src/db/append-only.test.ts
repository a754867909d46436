import { beforeAll, describe, expect, test } from 'vitest';
import { QueryTypes, Sequelize } from 'sequelize';
import { useApp } from '../testing/app.ts';
import { aCompany } from '../testing/company.ts';
import { select } from './sequelize.ts';

const app = useApp();
beforeAll(async () => {
  const company = await aCompany(app);
  await select(
    `INSERT INTO pay_weeks (id, starts_on, ends_on, starts_at, ends_at, state, locked_at, locked_by, snapshot)
     SELECT gen_random_uuid(), '2026-05-04', '2026-05-10', '2026-05-04T04:00:00Z', '2026-05-11T04:00:00Z', 'draft', now(), id, '{}' FROM users LIMIT 1`,
  );
  await select(
    `INSERT INTO pay_lines (id, pay_week_id, person_id, position, key, amount_cents, is_payable, line)
     SELECT gen_random_uuid(), id, :personId, 0, 'hourly', 100, true, '{}' FROM pay_weeks`,
    { personId: company.people.sefa.id },
  );
  const { job } = await company.aJob();
  const ids = { jobId: job.id, personId: company.people.sefa.id };
  await select(
    `INSERT INTO tips (id, job_id, amount_cents, method, received_at, user_id)
     SELECT gen_random_uuid(), :jobId, 500, 'card', '2026-05-05T12:00:00Z', id FROM users LIMIT 1`,
    ids,
  );
  await select(
    `INSERT INTO jobs_paid (job_id, paid_at, recorded_by, recorded_at)
     SELECT :jobId, '2026-05-05T12:00:00Z', id, now() FROM users LIMIT 1`,
    ids,
  );
  await select(
    `INSERT INTO clock_entries (id, person_id, kind, started_at, ended_at)
     VALUES (gen_random_uuid(), :personId, 'shop', '2026-05-05T12:00:00Z', '2026-05-05T13:00:00Z')`,
    ids,
  );
  await select(`UPDATE pay_weeks SET state = 'locked'`);
});

/** As the application's role, and as the owner of the schema, whose rights the triggers bind too. */
const asOwner = async (sql: string) => {
  const sequelize = new Sequelize(process.env['DATABASE_MIGRATION_URL'] ?? '', { logging: false, pool: { max: 1 } });
  try {
    return await sequelize.query(sql, { type: QueryTypes.SELECT });
  } finally {
    await sequelize.close();
  }
};

describe('a locked week never changes', () => {
  test.each([
    ['a line', `UPDATE pay_lines SET amount_cents = 200`],
    ['a line taken away', `DELETE FROM pay_lines`],
    [
      'a line more',
      `INSERT INTO pay_lines SELECT gen_random_uuid(), pay_week_id, person_id, 1, 'x', 1, true, '{}' FROM pay_lines`,
    ],
    ['its head', `UPDATE pay_weeks SET state = 'draft'`],
    ['its head taken away', `DELETE FROM pay_weeks`],
    [
      'an adjustment',
      `INSERT INTO pay_adjustments SELECT gen_random_uuid(), w.id, l.person_id, 'bonus', 100, 'x', null, w.locked_by, now() FROM pay_weeks w, pay_lines l`,
    ],
    ['a tip it paid', `UPDATE tips SET amount_cents = 100`],
    ['a tip it paid, taken away', `DELETE FROM tips`],
    ['a payment it settled', `DELETE FROM jobs_paid`],
    ['a clock entry, taken away', `DELETE FROM clock_entries`],
    ['a clock entry, but by a correction', `UPDATE clock_entries SET ended_at = '2026-05-05T14:00:00Z'`],
    ['a statement', `INSERT INTO pay_statements SELECT w.id, l.person_id, 1, '{}' FROM pay_weeks w, pay_lines l`],
  ])('%s', async (_what, sql) => {
    await expect(select(sql)).rejects.toMatchObject({ parent: { code: 'DR001' } });
    await expect(asOwner(sql)).rejects.toMatchObject({ parent: { code: 'DR001' } });
  });
});

describe('what is appended stays', () => {
  test.each(['audit_entries', 'pay_rules'])('%s', async (table) => {
    await expect(select(`DELETE FROM ${table}`)).rejects.toMatchObject({ parent: { code: '42501' } });
    await expect(asOwner(`DELETE FROM ${table}`)).rejects.toMatchObject({ parent: { code: 'DR002' } });
  });
});
