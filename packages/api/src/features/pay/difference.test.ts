import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { getPayDifference } from '@driprail/shared/contracts/pay-difference.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { payWeeks } from '../../testing/pay-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  app.time.now = '2026-05-18T12:00:00Z';
});

const difference = async (against: string) =>
  (await owner.get(`/api/pay/weeks/2026-05-11/difference?against=${against}`).expect(200)).body as OutputOf<
    typeof getPayDifference
  >;
const bonus = (day: string, personId: string, amountCents: number) =>
  owner
    .post(`/api/pay/weeks/${day}/adjustments`)
    .send({ personId, kind: 'bonus', amountCents, reason: 'Good reviews', correctsLineId: null })
    .expect(200);

test('a week is compared with the one before and with itself as it was last checked', async () => {
  const { sefa, idris } = company.people;
  await bonus('2026-05-04', sefa.id, 1000);
  await bonus('2026-05-11', sefa.id, 2500);
  await bonus('2026-05-11', idris.id, 500);
  const before = await difference('week_before');
  expect(before.against).toEqual({ startsOn: '2026-05-04', number: 19, checkedAt: null });
  expect(before.people?.map(({ name, parts }) => [name, parts])).toEqual([
    ['Sefa Lund', [{ part: 'adjustments', beforeCents: 1000, afterCents: 2500 }]],
    ['Idris Vale', [{ part: 'adjustments', beforeCents: 0, afterCents: 500 }]],
  ]);

  expect((await difference('last_checked')).people).toBeNull();
  const { week } = await payWeeks(owner).read('2026-05-11');
  await owner.post('/api/pay/weeks/2026-05-11/state').send({ to: 'checked', version: week.version }).expect(200);
  expect(await difference('last_checked')).toMatchObject({ people: [], unchanged: 2 });
  await bonus('2026-05-11', idris.id, 700);
  const after = await difference('last_checked');
  expect(after.against.checkedAt).toBe('2026-05-18T12:00:00.000Z');
  expect(after.people?.map(({ name, before: was, after: is }) => [name, was?.grossCents, is?.grossCents])).toEqual([
    ['Idris Vale', 500, 1200],
  ]);
  expect(after.unchanged).toBe(1);
});

test('nobody but the owner sees it, and the other side must be named', async () => {
  const sefa = await company.sefa();
  await sefa.get('/api/pay/weeks/2026-05-11/difference?against=week_before').expect(403);
  await owner.get('/api/pay/weeks/2026-05-11/difference?against=year').expect(400);
});
