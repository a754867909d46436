import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, test } from 'vitest';
import type { RefundReasonDto } from '@driprail/shared/contracts/pay-agreements.contract';
import { useApp } from '../../../testing/app.ts';
import { aCompany, first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { aDoneJob, payWeeks } from '../../../testing/pay-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let personId: string;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  personId = company.people.sefa.id;
  await aDoneJob(app, company, owner);
});

const fieldsOf = (body: unknown) => (body as { error: { fields?: Record<string, string> } }).error.fields ?? {};
const addRate = (kind: string, value: string, more: object = {}) =>
  owner
    .post('/api/pay/rates')
    .send({ kind, value, personId: null, serviceId: null, clockKind: null, startsOn: '2026-01-01', ...more });
const adjust = (more: object) =>
  owner
    .post('/api/pay/weeks/2026-05-11/adjustments')
    .send({ personId, amountCents: null, reason: 'As agreed', correctsLineId: null, ...more });
const sefa = async () => {
  const { people } = await payWeeks(owner).read('2026-05-11');
  return first(people.filter((person) => person.personId === personId));
};
const agree = (more: object) =>
  owner.post('/api/pay/agreements').send({ personId, kind: 'refunds', note: 'Paper in the office folder', ...more });
const reason = async (name: string, lowersCommission: boolean) => {
  const answer = await owner
    .post('/api/pay/refund-reasons')
    .send({ name, lowersCommission, startsOn: '2026-01-01' })
    .expect(200);
  return (answer.body as { refundReason: RefundReasonDto }).refundReason;
};

describe('rates of other things', () => {
  test('each asks for what it needs', async () => {
    const washId = company.wash.id;
    expect(fieldsOf((await addRate('product_cost', '4').expect(400)).body)).toHaveProperty('serviceId');
    expect(fieldsOf((await addRate('mileage', '0.725', { personId }).expect(400)).body)).toHaveProperty('personId');
    expect(fieldsOf((await addRate('per_review', '5', { serviceId: washId }).expect(400)).body)).toHaveProperty(
      'serviceId',
    );
    const both = await addRate('hourly', '20', { serviceId: washId, clockKind: 'job' }).expect(400);
    expect(fieldsOf(both.body)).toHaveProperty('clockKind');
    await addRate('hourly', '22', { serviceId: washId }).expect(200);
  });

  test('product cost comes off before the percentage', async () => {
    await addRate('commission_percent', '10').expect(200);
    await addRate('product_cost', '15', { serviceId: company.wash.id }).expect(200);
    // 10 % of 240.00 less 15.00.
    expect((await sefa()).totals.commission).toBe(2250);
  });

  test('miles are paid back by the rate of their day, and asked for one where none had started', async () => {
    const miles = { kind: 'reimbursement', counted: { unit: 'mile', quantity: '42.5', on: '2026-05-12' } };
    const none = await adjust(miles).expect(422);
    expect(fieldsOf(none.body)['counted.quantity']).toContain('No rate for a mile');
    await addRate('mileage', '0.725').expect(200);
    await adjust(miles).expect(200);
    const line = first((await sefa()).lines.filter((one) => one.kind === 'reimbursement'));
    // 30.8125, half up.
    expect(line).toMatchObject({ amountCents: 3081, inRegularRate: false });
    expect(line.working.map((step) => step.arithmetic)).toEqual(['42.5 miles times 0.725']);
    expect(fieldsOf((await adjust({ ...miles, kind: 'bonus' }).expect(400)).body)).toHaveProperty('kind');
  });
});

describe('refunds', () => {
  test('lower commission only for a marked reason and by a signed plan', async () => {
    const goodwill = await reason('Goodwill', false);
    const undone = await reason('Work not done', true);
    const refund = { kind: 'refund', amountCents: -1000, reason: 'Job refunded', refundReasonId: undone.id };
    expect(fieldsOf((await adjust({ ...refund, refundReasonId: null }).expect(400)).body)).toHaveProperty(
      'refundReasonId',
    );
    expect(fieldsOf((await adjust({ ...refund, amountCents: 1000 }).expect(400)).body)).toHaveProperty('amountCents');
    expect(
      fieldsOf((await adjust({ ...refund, refundReasonId: goodwill.id }).expect(422)).body)['refundReasonId'],
    ).toContain('does not touch commission');
    expect(fieldsOf((await adjust(refund).expect(422)).body)['kind']).toContain('No signed plan');
    expect(fieldsOf((await agree({ startsOn: '2026-05-12', signedOn: '2026-05-01' }).expect(422)).body)).toHaveProperty(
      'startsOn',
    );
    expect(fieldsOf((await agree({ startsOn: '2026-05-11', signedOn: '2026-05-12' }).expect(400)).body)).toHaveProperty(
      'signedOn',
    );
    await agree({ startsOn: '2026-05-11', signedOn: '2026-05-01' }).expect(200);
    await adjust(refund).expect(200);
    expect((await sefa()).totals.commission).toBe(1250);
  });

  test('a later row of the same name changes what it does, and the history stays', async () => {
    await owner
      .post('/api/pay/refund-reasons')
      .send({ name: 'work not done', lowersCommission: false, startsOn: '2026-01-01' })
      .expect(409);
    const { refundReasons } = (await owner.get('/api/pay/agreements').expect(200)).body as { refundReasons: unknown[] };
    expect(refundReasons).toHaveLength(2);
  });

  test('nobody but the owner reads or writes agreements', async () => {
    for (const other of [await company.dispatcher(), await company.sefa()]) {
      await other.get('/api/pay/agreements').expect(403);
      await other.post('/api/pay/agreements').send({}).expect(403);
      await other.post('/api/pay/refund-reasons').send({}).expect(403);
    }
  });
});
