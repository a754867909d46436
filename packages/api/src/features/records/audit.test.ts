import { beforeAll, expect, test } from 'vitest';
import type { AuditEntryDto } from '@driprail/shared/contracts/records.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(app);
});

test('the owner reads who changed what, before and after, page by page; nobody else does', async () => {
  const owner = await company.owner();
  const rate = {
    kind: 'hourly',
    personId: company.people.sefa.id,
    serviceId: null,
    clockKind: null,
    value: '19.5',
    startsOn: '2026-05-01',
  };
  await owner.post('/api/pay/rates').send(rate).expect(200);
  const page = async (query: string) =>
    (await owner.get(`/api/records/audit?${query}`).expect(200)).body as {
      entries: AuditEntryDto[];
      next: number | null;
    };
  const rates = await page('entity=pay_rate');
  expect(rates.entries).toMatchObject([
    { by: 'Rowan Tern', action: 'set', details: { value: '19.5', startsOn: '2026-05-01' } },
  ]);
  const first = await page('limit=2');
  const second = await page(`limit=2&before=${first.next}`);
  expect(first.entries.map((e) => e.id).concat(second.entries.map((e) => e.id))).toEqual(
    [...first.entries, ...second.entries].map((e) => e.id).sort((a, b) => b - a),
  );
  await owner.get('/api/records/audit?entity=gossip').expect(400);
  await (await company.dispatcher()).get('/api/records/audit').expect(403);
});
