import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import { QueryTypes, Sequelize } from 'sequelize';
import type { PayWeekDto, StatementDto } from '@driprail/shared/contracts/pay.contract';
import { select } from '../../db/sequelize.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { aDoneJob, payWeeks } from '../../testing/pay-weeks.ts';
import { verifyWeeks } from './verify.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
});

const read = (day: string) => payWeeks(owner).read(day);

/** What only somebody with the right to switch triggers off could do to a locked week. */
async function tamper(sql: string): Promise<void> {
  const sequelize = new Sequelize(process.env['DATABASE_MIGRATION_URL'] ?? '', { logging: false, pool: { max: 1 } });
  await sequelize.query(
    `ALTER TABLE pay_lines DISABLE TRIGGER USER; ${sql}; ALTER TABLE pay_lines ENABLE TRIGGER USER`,
    {
      type: QueryTypes.RAW,
    },
  );
  await sequelize.close();
}

test('looking at a week, a list of weeks or a statement writes no row', async () => {
  const { week } = await read('2026-03-04');
  expect(week).toMatchObject({ id: null, startsOn: '2026-03-02', state: 'draft', version: 0 });
  const { weeks } = (await owner.get('/api/pay/weeks').expect(200)).body as { weeks: PayWeekDto['week'][] };
  expect(weeks.map((known) => [known.id, known.startsOn])).toEqual([[null, '2026-05-11']]);
  await owner.get(`/api/pay/statements/2026-03-02/${company.people.sefa.id}`).expect(404);
  await owner.get('/api/pay/weeks/2026-03-02/export.csv').expect(200);
  expect(await select('SELECT 1 FROM pay_weeks')).toEqual([]);
});

test('a locked week names customers by job number, is worked out again to the byte, and tampering is found', async () => {
  const percent = { kind: 'commission_percent', personId: null, serviceId: null, clockKind: null, value: '6' };
  await owner
    .post('/api/pay/rates')
    .send({ ...percent, startsOn: '2026-01-01' })
    .expect(200);
  const { job } = await aDoneJob(app, company, owner);
  const sefa = await company.sefa();
  app.time.now = '2026-05-18T12:00:00Z';
  await payWeeks(owner).lock('2026-05-11');
  const locked = await read('2026-05-11');
  const commission = first(first(locked.people).lines.filter((line) => line.kind === 'commission'));
  expect([commission.label, commission.jobNumber]).toEqual(['Wash and wax', job.number]);
  expect(locked.customers).toEqual({ [job.id]: 'Nakagawa' });
  const [kept] = await select<{ text: string }>(
    `SELECT (SELECT string_agg(snapshot::text, '') FROM pay_weeks) || (SELECT string_agg(line::text, '') FROM pay_lines)
         || (SELECT string_agg(summary::text, '') FROM pay_statements) AS text`,
  );
  expect(kept?.text).toContain(`Job ${job.number}`);
  expect(kept?.text).not.toContain('Nakagawa');
  const statement = await sefa.get(`/api/pay/statements/2026-05-11/${company.people.sefa.id}`).expect(200);
  expect((statement.body as StatementDto).customers).toEqual({ [job.id]: 'Nakagawa' });

  expect(await verifyWeeks()).toEqual({ verified: 1, complaints: [] });
  await tamper(`UPDATE pay_lines SET amount_cents = amount_cents + 1 WHERE key LIKE 'commission:%'`);
  const { verified, complaints } = await verifyWeeks();
  expect(verified).toBe(0);
  expect(complaints).toHaveLength(1);
  expect(complaints[0]).toContain(`Week 2026-05-11, person ${company.people.sefa.id}, commission:`);
});
