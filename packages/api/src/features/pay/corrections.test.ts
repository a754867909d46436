import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, expect, test } from 'vitest';
import type { PayWeekDto, StatementDto } from '@driprail/shared/contracts/pay.contract';
import { OutboxMail } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { payWeeks } from '../../testing/pay-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
});

const read = (day: string) => payWeeks(owner).read(day);
const lockWeek = (day: string) => payWeeks(owner).lock(day);
const clock = (startedAt: string, endedAt: string) =>
  owner
    .post('/api/clock/entries')
    .send({
      personId: company.people.sefa.id,
      visitId: null,
      kind: 'shop',
      startedAt,
      endedAt,
      isInterrupted: false,
      reason: 'Forgot to clock in',
    })
    .expect(200);

test('time written down after the lock shows as a difference until a correction that names the line makes it up', async () => {
  const personId = company.people.sefa.id;
  const hourly = { kind: 'hourly', personId, serviceId: null, clockKind: null, value: '20', startsOn: '2026-01-01' };
  await owner.post('/api/pay/rates').send(hourly).expect(200);
  await clock('2026-05-04T13:00:00Z', '2026-05-04T15:00:00Z');
  await lockWeek('2026-05-04');
  await clock('2026-05-05T13:00:00Z', '2026-05-05T14:30:00Z');

  const mails = await OutboxMail.findAll();
  expect(mails.map((mail) => mail.recipient)).toEqual(['sefa@ternandtide.example']);
  expect(first(mails).body).toContain(`/statements/2026-05-04/${personId}`);
  expect(first(mails).body).not.toMatch(/\d\.\d\d/);

  const locked = await read('2026-05-04');
  // 2 h at 20.00 was locked; 3.5 h at 20.00 would be 70.00 (arithmetic).
  expect(first(locked.people).totals.gross).toBe(4000);
  expect(locked.lateDifferences).toEqual([
    { personId, name: 'Sefa Lund', lockedCents: 4000, nowCents: 7000, correctedCents: 0 },
  ]);

  const [key, lineId] = first(Object.entries(locked.lineIds));
  const correction = {
    personId,
    kind: 'correction',
    amountCents: 3000,
    reason: 'Shop time of May 5',
    correctsLineId: lineId,
  };
  const open = await owner.post('/api/pay/weeks/2026-05-11/adjustments').send(correction).expect(200);
  const named = { startsOn: '2026-05-04', number: 19, label: 'Hours by the clock', position: 0 };
  expect((open.body as PayWeekDto).correctedLines[lineId]).toEqual({
    ...named,
    key: key.split(':').slice(1).join(':'),
  });
  expect((await read('2026-05-04')).lateDifferences).toEqual([]);

  app.time.now = '2026-05-18T12:00:00Z';
  await lockWeek('2026-05-11');
  const sefa = await company.sefa();
  const statement = (await sefa.get(`/api/pay/statements/2026-05-11/${personId}`).expect(200)).body as StatementDto;
  expect(statement.correctedLines[lineId]).toMatchObject(named);
  const { weeks } = (await owner.get('/api/pay/weeks').expect(200)).body as { weeks: PayWeekDto['week'][] };
  expect(weeks.find((week) => week.startsOn === '2026-05-04')).toMatchObject({
    grossCents: 4000,
    tipCents: 0,
    salesCents: 0,
  });
});

test('a warning’s entry says when it began', async () => {
  app.time.now = '2026-05-20T13:00:00Z';
  const sefa = await company.sefa();
  const start = { key: '0b0e7c57-3a5c-4b8e-9d0c-0d8f5a0c9a11', action: 'start', kind: 'shop', deviceAt: app.time.now };
  await sefa.post('/api/clock/actions').send(start).expect(200);
  app.time.now = '2026-05-20T14:00:00Z';
  const week = await read('2026-05-18');
  const warning = first(first(week.people).warnings);
  expect(warning.code).toBe('open_entry');
  expect(week.warningTimes).toEqual({ [warning.entryId ?? '']: '2026-05-20T13:00:00.000Z' });
});
