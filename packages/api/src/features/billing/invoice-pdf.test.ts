import { beforeAll, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { useCardsApp } from '../../testing/local-cards.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';
import { fileOf, pdfText, printedOn } from '../../testing/pdf-text.ts';

const test = useCardsApp();
let company: TestCompany;
let owner: TestAgent;
let jobId: string;

beforeAll(async () => {
  company = await aCompany(test);
  owner = await company.owner();
  await owner
    .post('/api/tax-rates')
    .send({ name: 'City tax', taxClass: 'standard', place: 'Ternmouth', percent: '6.25', startsOn: '2026-01-01' })
    .expect(200);
  await owner
    .post('/api/tax-rates')
    .send({ name: 'State tax', taxClass: 'standard', place: '', percent: '0.5', startsOn: '2026-01-01' })
    .expect(200);
  jobId = (await aDoneJob(test, company, owner)).job.id;
});

const path = () => `/api/jobs/${jobId}/invoice.pdf`;
const pay = (fields: object) =>
  owner.post(`/api/jobs/${jobId}/payments`).send({ key: key(), deviceAt: test.time.now, ...fields });

it('is not there before the job is billed, and never for a technician', async () => {
  await owner.get(path()).expect(404);
  await owner.post(`/api/jobs/${jobId}/invoice`).expect(200);
  await (await company.sefa()).get(path()).expect(403);
});

it('holds lines, tax by place, what was received and what is owed, with its fonts in it', async () => {
  await pay({ method: 'check', amountCents: 10_000, reference: 'Check 1043' }).expect(200);
  await pay({ method: 'cash', amountCents: 500 }).expect(200);
  const { bill } = (await owner.get(`/api/jobs/${jobId}/bill`)).body as { bill: BillDto };
  const mistake = bill.payments.find(({ method }) => method === 'cash');
  await owner
    .post(`/api/payments/${mistake?.id}/refunds`)
    .send({ ...{ key: key(), kind: 'mistake', amountCents: 500, lines: [], reasonId: null }, note: 'Typed twice' })
    .expect(200);
  const answer = await fileOf((await company.dispatcher()).get(path()));
  expect([answer.status, answer.type]).toEqual([200, 'application/pdf']);
  expect(answer.bytes.toString('latin1')).toMatch(/\/FontFile[23]/);
  const words = pdfText(answer.bytes).split('\n');
  for (const line of [
    ...['Invoice 1001', 'Nakagawa', '14 Saltpan Lane', 'Wash and wax', 'grey 2019 hatchback', '240.00'],
    ...[
      'City tax, 6.25 percent',
      'Ternmouth, on 240.00',
      '15.00',
      'State tax, 0.5 percent',
      'Everywhere, on 240.00',
      '1.20',
      'Total',
      '256.20',
    ],
    ...['Check', 'May 14, 2026, Check 1043', '-100.00', 'Owed', '156.20', 'Page 1 of 1'],
  ])
    expect(words).toContain(line);
  const lefts = printedOn(answer.bytes).filter(({ x }) => x === 54);
  const gaps = lefts.slice(1).map(({ y }, index) => (lefts[index]?.y ?? 0) - y);
  // No line is written over the one before: the smallest are 8 points high.
  expect(Math.min(...gaps)).toBeGreaterThanOrEqual(8);
  expect(words.join()).not.toMatch(/Typed twice|Cash|4471|Dog|555-0142/);
});

it('is handed out by the customer’s own link', async () => {
  const { url } = (await owner.post(`/api/jobs/${jobId}/pay-link`).expect(200)).body as { url: string };
  const token = url.split('/c/')[1] ?? '';
  const answer = await fileOf(test.anonymous().get(`/api/customer-pages/${token}/invoice.pdf`));
  expect(answer.status).toBe(200);
  expect(pdfText(answer.bytes)).toContain('Invoice 1001');
  await test
    .anonymous()
    .get(`/api/customer-pages/${'A'.repeat(43)}/invoice.pdf`)
    .expect(404);
});
