import { beforeAll, expect, test } from 'vitest';
import { ClockEntry, PayRate } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { fileOf, pdfText } from '../../testing/pdf-text.ts';
import { v7 as uuid } from 'uuid';

const app = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(app);
  const personId = company.people.sefa.id;
  await PayRate.create({ id: uuid(), kind: 'hourly', personId, value: '20', startsOn: '2026-01-01' });
  await ClockEntry.create({
    id: uuid(),
    personId,
    kind: 'shop',
    startedAt: new Date('2026-05-14T12:00:00Z'),
    endedAt: new Date('2026-05-14T14:00:00Z'),
  });
});

test('a statement is a PDF with its fonts in it, for the owner, not for others before the lock', async () => {
  const path = `/api/pay/statements/2026-05-11/${company.people.sefa.id}/statement.pdf`;
  const answer = await fileOf((await company.owner()).get(path));
  expect([answer.status, answer.type]).toEqual([200, 'application/pdf']);
  const pdf = answer.bytes.toString('latin1');
  expect(pdf.startsWith('%PDF-')).toBe(true);
  expect(pdf).toMatch(/\/FontFile[23]/);
  expect(pdf).toContain('RobotoFlex');
  expect(pdfText(answer.bytes)).toMatch(/Sefa Lund[^]*2\.00 h worked[^]*Gross\n40\.00/);
  await (await company.sefa()).get(path).expect(403);
  await (await company.idris()).get(path).expect(403);
});
