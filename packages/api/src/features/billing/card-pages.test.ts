import { beforeAll, expect, it, vi } from 'vitest';
import type { Response } from 'supertest';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import { CardAttempt } from '../../db/models/index.ts';
import { PaymentError, paymentsFor } from '../../integrations/payments/index.ts';
import type { Payments } from '../../integrations/payments/index.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { useCardsApp } from '../../testing/local-cards.ts';
import { aDoneJob } from '../../testing/pay-weeks.ts';
import { lookUpOpenPages } from './index.ts';

const test = useCardsApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(test);
});

/** A done job with the token of its customer's page. */
async function aPage() {
  const owner = await company.owner();
  const { job } = await aDoneJob(test, company, owner);
  const { url } = (await owner.post(`/api/jobs/${job.id}/pay-link`).expect(200)).body as { url: string };
  const card = (tipCents = 0) =>
    test
      .anonymous()
      .post(`/api/customer-pages/${url.split('/c/')[1] ?? ''}/card`)
      .send({ tipCents });
  const owed = async () =>
    ((await owner.get(`/api/jobs/${job.id}/bill`).expect(200)).body as { bill: BillDto }).bill.owedCents;
  return { jobId: job.id, card, owed };
}
const urlOf = (answer: Response) => (answer.body as { url: string }).url;
const faultOf = (answer: Response) => (answer.body as ErrorBody).error;
const states = async (jobId: string) =>
  (await CardAttempt.findAll({ where: { jobId }, order: [['id', 'ASC']] })).map(({ state }) => state);

it('a card page that is gone is not handed out again: another is begun, and takes the money', async () => {
  const { jobId, card, owed } = await aPage();
  const before = urlOf(await card().expect(200));
  expect(urlOf(await card().expect(200))).toBe(before);
  await test.restartCards();
  const after = urlOf(await card().expect(200));
  expect(after).not.toBe(before);
  expect(await states(jobId)).toEqual(['expired', 'open']);
  await test.press(after, 'pay');
  await vi.waitFor(async () => expect(await owed()).toBe(0));
});

it('another tip begins anew although the page before is gone', async () => {
  const { jobId, card } = await aPage();
  await card(0).expect(200);
  await test.restartCards();
  await card(500).expect(200);
  expect(await states(jobId)).toEqual(['expired', 'open']);
});

it('a page that was paid while its event got lost is noted when it is asked for again', async () => {
  const { card, owed } = await aPage();
  const url = urlOf(await card().expect(200));
  await test.hook('/webhooks', { mode: 'drop' });
  await test.press(url, 'pay');
  await test.hook('/webhooks', { mode: 'deliver' });
  expect(faultOf(await card().expect(409)).code).toBe('being_paid');
  expect(await owed()).toBe(0);
});

it('a service that can’t be reached is said so, and is asked again', async () => {
  const { card } = await aPage();
  // The SDK tries three times.
  await test.hook('/faults', { when: 'before', times: 3 });
  const answer = await card().expect(503);
  expect(faultOf(answer)).toMatchObject({ code: 'cards_unreachable' });
  expect(faultOf(answer).message).toContain('Try again');
  await card().expect(200);
});

it('one page that can’t be looked up does not keep the others waiting', async () => {
  const pages = [await aPage(), await aPage(), await aPage()];
  for (const { card } of pages) await card().expect(200);
  const refs = new Map(
    (await CardAttempt.findAll({ where: { state: 'open' } })).map(({ jobId, providerRef }) => [jobId, providerRef]),
  );
  const [lost, gone, ended] = pages.map(({ jobId }) => refs.get(jobId) ?? '');
  const payments: Payments = {
    ...paymentsFor(null),
    lookUp(ref) {
      if (ref === lost) return Promise.reject(new PaymentError('unreachable', 'No answer.'));
      if (ref === gone) return Promise.reject(new PaymentError('unknown', 'Not known.'));
      return Promise.resolve({ state: ref === ended ? 'expired' : 'open', paymentRef: null });
    },
  };
  await lookUpOpenPages(payments, new Date(Date.parse(test.time.now) + 180_000));
  expect(await Promise.all(pages.map(async ({ jobId }) => (await states(jobId)).at(-1)))).toEqual([
    'open',
    'expired',
    'expired',
  ]);
});
