import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import type { PaidJob, UnpaidJob } from '@driprail/shared/contracts/jobs-paid.contract';
import { select } from '../../../db/sequelize.ts';
import { useApp } from '../../../testing/app.ts';
import { aCompany, first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { aDoneJob, payWeeks } from '../../../testing/pay-weeks.ts';
import { verifyWeeks } from '../verify.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let job: Awaited<ReturnType<typeof aDoneJob>>['job'];
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  const rules = {
    ...{ startsOn: '2026-02-02', overtimeRuleSet: 'us_federal', minimumWage: '7.25', crewSplit: 'equal' },
    ...{ mealBreakMinutes: 30, workweekStartsOn: 1, workweekStartsAt: '00:00', commissionEarned: 'paid' },
  };
  await owner.post('/api/pay/rules').send(rules).expect(200);
  const rate = (kind: string, value: string) => ({ kind, value, personId: null, serviceId: null, clockKind: null });
  for (const one of [rate('commission_percent', '10'), rate('hourly', '20')])
    await owner
      .post('/api/pay/rates')
      .send({ ...one, startsOn: '2026-01-01' })
      .expect(200);
  ({ job } = await aDoneJob(app, company, owner));
});

const listed = async () =>
  (await owner.get('/api/pay/jobs-paid').expect(200)).body as { waiting: UnpaidJob[]; paid: PaidJob[] };
const mark = (paidOn: string) => owner.post('/api/pay/jobs-paid').send({ jobId: job.id, paidOn });
const sefaIn = async (day: string) =>
  (await payWeeks(owner).read(day)).people.find((person) => person.personId === company.people.sefa.id);
const commissions = async (day: string) =>
  ((await sefaIn(day))?.lines ?? []).flatMap((line) =>
    line.kind.startsWith('commission') ? [[line.kind, line.amountCents]] : [],
  );

test('commission waits while the customer has not paid, and the list names the job', async () => {
  expect(await commissions('2026-05-11')).toEqual([]);
  expect((await sefaIn('2026-05-11'))?.waiting).toEqual({
    amountCents: 2400,
    jobs: [{ jobId: job.id, jobNumber: job.number }],
  });
  const { waiting, paid } = await listed();
  expect(paid).toEqual([]);
  expect(waiting).toEqual([
    { jobId: job.id, jobNumber: job.number, customerName: 'Nakagawa', doneOn: '2026-05-14', totalCents: 24_000 },
  ]);
});

test('a day to come is refused at its field, a second mark is a conflict, and a mark can be taken back', async () => {
  const early = await mark('2026-05-15').expect(422);
  expect(early.body).toMatchObject({
    error: { fields: { paidOn: 'The customer can’t have paid on a day to come.' } },
  });
  await mark('2026-05-14').expect(200);
  await mark('2026-05-14').expect(409);
  // Paid inside the week of the work: earned in it as if by Done.
  expect(await commissions('2026-05-11')).toEqual([['commission', 2400]]);
  expect(first((await listed()).paid)).toMatchObject({ paidOn: '2026-05-14', mayTakeBack: true });
  await owner.delete(`/api/pay/jobs-paid/${job.id}`).expect(200);
  expect(await commissions('2026-05-11')).toEqual([]);
  expect(await select(`SELECT action FROM audit_entries WHERE entity = 'job_paid' ORDER BY id`)).toEqual([
    { action: 'recorded' },
    { action: 'taken_back' },
  ]);
});

test('a payment after the week is settled into it, once that week is locked, and both weeks can be proved', async () => {
  const { read, lock } = payWeeks(owner);
  app.time.now = '2026-05-26T12:00:00Z';
  await mark('2026-05-20').expect(200);
  expect(await commissions('2026-05-18')).toEqual([['commission_settlement', 2400]]);
  const checked = (await owner.post('/api/pay/weeks/2026-05-18/state').send({ to: 'checked', version: 0 })).body as {
    week: { version: number };
  };
  const early = await owner
    .post('/api/pay/weeks/2026-05-18/state')
    .send({ to: 'locked', version: checked.week.version })
    .expect(422);
  expect((early.body as { error: { message: string } }).error.message).toBe(
    'Lock week 20 first: customers paid for its work in this week.',
  );
  await lock('2026-05-11');
  await owner.post('/api/pay/weeks/2026-05-18/state').send({ to: 'locked', version: checked.week.version }).expect(200);
  expect((await read('2026-05-18')).lateDifferences).toEqual([]);
  expect((await read('2026-05-11')).lateDifferences).toEqual([]);
  expect(await verifyWeeks()).toEqual({ verified: 2, complaints: [] });
  const locked = await owner.delete(`/api/pay/jobs-paid/${job.id}`).expect(422);
  expect((locked.body as { error: { message: string } }).error.message).toContain('May 24, 2026 is locked');
  const [snapshot] = await select<{ text: string }>(
    `SELECT snapshot::text AS text FROM pay_weeks WHERE starts_on = '2026-05-18'`,
  );
  expect(snapshot?.text).not.toContain('Nakagawa');
});

test('nobody but the owner sees or marks what waits', async () => {
  for (const other of [await company.dispatcher(), await company.sefa()]) {
    await other.get('/api/pay/jobs-paid').expect(403);
    await other.post('/api/pay/jobs-paid').send({ jobId: job.id, paidOn: '2026-05-20' }).expect(403);
  }
});
