import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import type { SettingsDto } from '@driprail/shared/contracts/settings.contract';
import { OutboxMail } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { payWeeks } from '../../testing/pay-weeks.ts';
import { hourly, worked } from './handover/testing/paid-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  await hourly(owner, company.people.sefa.id, '20');
  await hourly(owner, company.people.idris.id, '30');
});

const show = async (statementMailShowsFigures: boolean) => {
  const { settings } = (await owner.get('/api/settings').expect(200)).body as { settings: SettingsDto };
  await owner
    .put('/api/settings')
    .send({ ...settings, statementMailShowsFigures })
    .expect(200);
};
const mailed = async (week: string, to: string) => {
  const mails = await OutboxMail.findAll({ where: { recipient: to } });
  return mails.find((mail) => mail.body.includes(`/statements/${week}/`))?.body ?? '';
};

test('the mail at the lock is a link without figures, until the owner chooses otherwise', async () => {
  await worked(company.people.sefa.id, '2026-04-27', '07:00', '09:30');
  await payWeeks(owner).lock('2026-04-27');
  const plain = await mailed('2026-04-27', 'sefa@ternandtide.example');
  expect(plain).toContain(`/statements/2026-04-27/${company.people.sefa.id}`);
  expect(plain).not.toMatch(/\d\.\d\d|[Gg]ross/);

  await show(true);
  await worked(company.people.sefa.id, '2026-05-04', '07:00', '09:30');
  await worked(company.people.idris.id, '2026-05-04', '07:00', '08:00');
  await payWeeks(owner).lock('2026-05-04');
  // 2.5 h at 20.00 and 1 h at 30.00 (arithmetic); each mail has the own figures alone.
  const sefa = await mailed('2026-05-04', 'sefa@ternandtide.example');
  expect(sefa).toContain('is ready. Gross 50.00 for 2.50 h, before any withholding. Sign in to read it:');
  expect(sefa).not.toContain('30.00');
  expect(await mailed('2026-05-04', 'idris@ternandtide.example')).toContain('Gross 30.00 for 1.00 h');

  await show(false);
  await worked(company.people.sefa.id, '2026-05-11', '07:00', '09:30');
  app.time.now = '2026-05-18T12:00:00Z';
  await payWeeks(owner).lock('2026-05-11');
  expect(await mailed('2026-05-11', 'sefa@ternandtide.example')).not.toMatch(/\d\.\d\d|[Gg]ross/);
});
