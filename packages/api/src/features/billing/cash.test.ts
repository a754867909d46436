import { beforeAll, beforeEach, expect, it, vi } from 'vitest';
import type { Response } from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { CashCountDto, CashHolderDto } from '@driprail/shared/contracts/cash.contract';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import { CashCount, PayAdjustment, Person } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';

const test = useApp();
let company: TestCompany;
let owner: TestAgent;
let dispatcher: TestAgent;
let sefa: TestAgent;
let jobId: string;

beforeAll(async () => {
  company = await aCompany(test);
  [owner, dispatcher, sefa] = [await company.owner(), await company.dispatcher(), await company.sefa()];
});
beforeEach(async () => {
  jobId = (await aDoneJob(test, company, owner)).job.id;
});

const take = async (agent: TestAgent, fields: object): Promise<BillDto> => {
  const body = { key: key(), method: 'cash', deviceAt: test.time.now, ...fields };
  const answer = await agent.post(`/api/jobs/${jobId}/payments`).send(body).expect(200);
  return (answer.body as { bill: BillDto }).bill;
};
const cash = async (agent = owner) =>
  (await agent.get('/api/cash').expect(200)).body as { holders: CashHolderDto[]; counts: CashCountDto[] };
const heldBySefa = async () => (await cash()).holders.find(({ personId }) => personId === company.people.sefa.id);
const count = (agent: TestAgent, held: CashHolderDto | undefined, fields: object) =>
  agent.post('/api/cash/counts').send({
    ...{ key: key(), personId: held?.personId, paymentIds: held?.payments.map(({ id }) => id), note: '' },
    ...fields,
  });
/** Backends of this test's database that wait for another's lock. */
const waiting = `SELECT DISTINCT l.pid FROM pg_locks l JOIN pg_stat_activity a ON a.pid = l.pid
  WHERE NOT l.granted AND a.datname = current_database()`;
const connection = () => {
  const { sequelize } = Person;
  if (!sequelize) throw new Error('the models are not connected');
  return sequelize;
};
const faultOf = (answer: Response) => (answer.body as ErrorBody).error;

it('is held with the tips handed over; what the crew kept, checks and mistakes are not in it', async () => {
  await take(sefa, { amountCents: 4000, tipCents: 500 });
  await take(sefa, { amountCents: 3000, tipCents: 700, tipIsKept: true });
  await take(sefa, { amountCents: 1000, method: 'check' });
  const bill = await take(sefa, { amountCents: 600 });
  const mistake = bill.payments.find(({ amountCents }) => amountCents === 600);
  await owner
    .post(`/api/payments/${mistake?.id}/refunds`)
    .send({ ...{ key: key(), kind: 'mistake', amountCents: 600, lines: [], reasonId: null }, note: 'Typed twice' })
    .expect(200);
  expect(await heldBySefa()).toMatchObject({ name: 'Sefa Lund', cents: 7500, payments: [{}, {}] });
  await sefa.get('/api/cash').expect(403);
  expect((await cash(dispatcher)).holders).toHaveLength(1);
});

it('over or short asks for a note at the field, is noted, and never touches pay', async () => {
  const held = await heldBySefa();
  const refused = await count(dispatcher, held, { countedCents: 7000 }).expect(422);
  expect(faultOf(refused).fields).toEqual({ note: 'Say what explains that it is 5.00 short.' });
  expect((await count(dispatcher, held, { countedCents: -1 }).expect(400)).body).toMatchObject({
    error: { fields: { countedCents: 'An amount can’t be below zero.' } },
  });
  await count(dispatcher, held, { countedCents: 7000, note: 'Change given twice' }).expect(200);
  const { holders, counts } = await cash();
  expect(holders).toEqual([]);
  expect(counts[0]).toMatchObject({
    ...{ personName: 'Sefa Lund', expectedCents: 7500, countedCents: 7000, note: 'Change given twice' },
    countedBy: 'Maren Holt',
  });
  expect(await PayAdjustment.count()).toBe(0);
});

it('is counted once: of two at the same moment one is told so, a repeated press is not', async () => {
  await take(sefa, { amountCents: 2000 });
  const held = await heldBySefa();
  const before = await CashCount.count();
  // Both have begun before either can go on: they stand at the person, whom somebody holds.
  const tx = await connection().transaction();
  await Person.findByPk(company.people.sefa.id, { transaction: tx, lock: tx.LOCK.UPDATE });
  const asked = Promise.all([owner, dispatcher].map((agent) => count(agent, held, { countedCents: 2000 })));
  await vi.waitFor(async () => expect(await select(waiting)).toHaveLength(2), { timeout: 20_000 });
  await tx.commit();
  const answers = await asked;
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  const late = answers.find(({ status }) => status === 409);
  expect(late && faultOf(late).message).toMatch(/^The cash of Sefa Lund was counted just now/);
  await take(sefa, { amountCents: 100 });
  const next = await heldBySefa();
  const once = { key: key(), countedCents: 100 };
  await Promise.all([1, 2].map(() => count(owner, next, once).expect(200)));
  expect(await CashCount.count()).toBe(before + 2);
});

it('that came in while somebody counted refuses the count with the new sum', async () => {
  await take(sefa, { amountCents: 2000 });
  const held = await heldBySefa();
  await take(sefa, { amountCents: 1500 });
  const refused = await count(owner, held, { countedCents: 2000 }).expect(409);
  expect(faultOf(refused).message).toBe(
    'What Sefa Lund holds has changed meanwhile, to 35.00. Look at it and count again.',
  );
});

it('taken by a login without a person stands under the login’s name', async () => {
  await take(owner, { amountCents: 900 });
  expect((await cash()).holders.at(-1)).toMatchObject({ personId: null, name: 'Rowan Tern, at the desk', cents: 900 });
});
