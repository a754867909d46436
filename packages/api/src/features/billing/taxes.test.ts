import { beforeAll, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import type { SettingsDto } from '@driprail/shared/contracts/settings.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';

const test = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(test);
  owner = await company.owner();
});

const state = { name: 'State sales tax', taxClass: 'standard', place: '', percent: '6.25', startsOn: '2026-01-01' };
const add = (fields: object, agent = owner) => agent.post('/api/tax-rates').send({ ...state, ...fields });
const fieldsOf = (body: unknown) => (body as ErrorBody).error.fields;

it('are entered by the owner, once per day and place, never over 100 percent or below zero', async () => {
  await add({}).expect(200);
  await add({}, await company.dispatcher()).expect(403);
  const again = await add({ name: 'state SALES tax' }).expect(422);
  expect(fieldsOf(again.body)).toEqual({
    startsOn: 'This tax has a rate from that day on already. Choose another day.',
  });
  expect(fieldsOf((await add({ percent: '100.01' }).expect(400)).body)?.['percent']).toBe(
    'A tax is at most 100 percent.',
  );
  expect(fieldsOf((await add({ percent: '-1' }).expect(400)).body)?.['percent']).toBe('Give a number like 19.50.');
  expect(fieldsOf((await add({ startsOn: '2026-02-30' }).expect(400)).body)).toHaveProperty('startsOn');
  await add({ percent: '100', startsOn: '2027-01-01' }).expect(200);
  await add({ place: 'Ternmouth', percent: '7' }).expect(200);
  const { taxRates } = (await (await company.dispatcher()).get('/api/tax-rates').expect(200)).body as {
    taxRates: object[];
  };
  expect(taxRates).toHaveLength(3);
});

it('follow what a service is taxed as; a change of other things leaves that alone', async () => {
  const { services } = (await owner.get('/api/services').expect(200)).body as { services: ServiceDto[] };
  const wash = services.find(({ id }) => id === company.wash.id);
  expect(wash?.taxClass).toBe('standard');
  const put = async (fields: object) => {
    const body = {
      ...{ name: 'Wash and wax', kind: 'package', description: '', skills: [], equipment: [] },
      ...{ isActive: true, position: 0, ...fields },
    };
    const answer = await owner.put(`/api/services/${company.wash.id}`).send(body).expect(200);
    return (answer.body as { service: ServiceDto }).service;
  };
  const untaxed = await put({ taxClass: 'untaxed', version: wash?.version });
  expect(untaxed.taxClass).toBe('untaxed');
  expect((await put({ version: untaxed.version })).taxClass).toBe('untaxed');
  const { job } = await company.aJob();
  const { bill } = (await owner.get(`/api/jobs/${job.id}/bill`).expect(200)).body as { bill: BillDto };
  expect(bill).toMatchObject({ taxes: [], totalCents: 24_000 });
});

it('an invoice is due after the days that the company set', async () => {
  const { settings } = (await owner.get('/api/settings').expect(200)).body as { settings: SettingsDto };
  expect(settings.invoiceDueDays).toBe(14);
  await owner
    .put('/api/settings')
    .send({ ...settings, invoiceDueDays: 30 })
    .expect(200);
  const { job } = await aDoneJob(test, company, owner);
  const { bill } = (await owner.post(`/api/jobs/${job.id}/invoice`).expect(200)).body as { bill: BillDto };
  expect(bill.invoice?.dueOn).toBe('2026-06-13');
});
