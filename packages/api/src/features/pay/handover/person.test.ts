import type TestAgent from 'supertest/lib/agent.js';
import { strFromU8, unzipSync } from 'fflate';
import { beforeAll, expect, test } from 'vitest';
import { v4 as key } from 'uuid';
import { useApp } from '../../../testing/app.ts';
import { aCompany, first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { aDoneJob, payWeeks } from '../../../testing/pay-weeks.ts';
import { bytesOf, hourly, rowsOf, worked } from './testing/paid-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let sefa: TestAgent;

/** Sefa and Idris share a visit with a commission and a tip; Sefa's clock was corrected, Idris has rates of the own. */
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  sefa = await company.sefa();
  const { people, vans } = company;
  await hourly(owner, people.sefa.id, '20');
  await hourly(owner, people.idris.id, '31.75');
  const percent = { kind: 'commission_percent', personId: null, serviceId: null, clockKind: null, value: '10' };
  await owner
    .post('/api/pay/rates')
    .send({ ...percent, startsOn: '2026-01-01' })
    .expect(200);
  const shift = { from: '2026-05-14T11:30:00.000Z', to: '2026-05-14T22:00:00.000Z' };
  await owner.put(`/api/vans/${vans.plover.id}/crew/2026-05-14`).send({ members: [] }).expect(200);
  await owner
    .put(`/api/vans/${vans.gannet.id}/crew/2026-05-14`)
    .send({ members: [people.sefa, people.idris].map(({ id }) => ({ personId: id, ...shift })) })
    .expect(200);
  const { visit, job } = await aDoneJob(app, company, owner);
  const tip = { key: key(), amountCents: 2001, method: 'card', alreadyReceived: false };
  await sefa.post(`/api/jobs/${job.id}/tips`).send(tip).expect(200);
  await worked(people.sefa.id, '2026-05-14', '11:30', '12:30', 'job', visit.id);
  await worked(people.idris.id, '2026-05-14', '11:30', '13:30', 'job', visit.id);
  await addedLater();
  const bonus = { kind: 'bonus', amountCents: 4321, reason: 'Quarter', correctsLineId: null };
  for (const { id } of [people.sefa, people.idris]) {
    await owner
      .post('/api/pay/weeks/2026-05-11/adjustments')
      .send({ ...bonus, personId: id })
      .expect(200);
  }
  app.time.now = '2026-05-18T12:00:00Z';
  await payWeeks(owner).lock('2026-05-11');
});

/** Time written down by the dispatcher, and corrected by the owner. */
async function addedLater(): Promise<void> {
  const dispatcher = await company.dispatcher();
  const span = {
    kind: 'shop',
    startedAt: '2026-05-12T12:00:00Z',
    endedAt: '2026-05-12T14:00:00Z',
    isInterrupted: false,
  };
  const whose = { personId: company.people.sefa.id, visitId: null };
  const added = await dispatcher
    .post('/api/clock/entries')
    .send({ ...whose, ...span, reason: 'Forgot to clock in' })
    .expect(200);
  const { entry } = added.body as { entry: { id: string; version: number } };
  await owner
    .put(`/api/clock/entries/${entry.id}`)
    .send({ ...span, endedAt: '2026-05-12T15:00:00Z', reason: 'Stayed longer', version: entry.version })
    .expect(200);
}

const pathOf = (personId: string) => `/api/pay/people/${personId}/export.zip`;
const open = async (agent: TestAgent, personId: string) => {
  const { status, type, body } = await bytesOf(agent, pathOf(personId));
  expect([status, type]).toEqual([200, 'application/zip']);
  const zip = unzipSync(body);
  return Object.fromEntries(Object.entries(zip).map(([name, bytes]) => [name, strFromU8(bytes, true)]));
};
const jsonOf = <T>(text: string | undefined) => JSON.parse(text ?? 'null') as T;

test('a person’s own export holds statements, lines, hours, terms, the clock in both versions, tips and the audit', async () => {
  const zip = await open(sefa, company.people.sefa.id);
  expect(Object.keys(zip).sort()).toEqual([
    ...[
      'README.txt',
      'agreements.json',
      'audit.json',
      'clock-corrections.json',
      'clock-entries.csv',
      'hours-words.json',
      'hours.csv',
    ],
    ...['kinds.csv', 'lines.csv', 'places.json', 'plans.json', 'rates.json', 'rules.json'],
    ...['statements/2026-05-11-sefa-lund.pdf', 'time-off.json', 'tips.csv', 'workings.json'],
  ]);
  expect(zip['statements/2026-05-11-sefa-lund.pdf']?.startsWith('%PDF-')).toBe(true);
  // 10 % of 240.00 is 24.00, half is 12.00; 20.01 in half with the odd cent to the first of the crew (arithmetic).
  expect(rowsOf(zip['tips.csv'] ?? '').map((row) => [row['method'], row['own_share'], row['paid_out']])).toEqual([
    ['card', '10.01', 'yes'],
  ]);
  const commission = rowsOf(zip['lines.csv'] ?? '').find((row) => row['kind'] === 'commission');
  expect(commission?.['amount']).toBe('12.00');
  const entry = first(rowsOf(zip['clock-entries.csv'] ?? ''));
  expect(entry).toMatchObject({
    started: '2026-05-12T08:00:00-04:00',
    ended: '2026-05-12T11:00:00-04:00',
    original_started: '',
    corrections: '2',
    last_reason: 'Stayed longer',
  });
  const corrected = first(
    jsonOf<{ corrections: { by: string; before: unknown; reason: string }[] }[]>(zip['clock-corrections.json']),
  );
  expect(corrected.corrections).toMatchObject([
    { by: 'dispatcher', before: null, reason: 'Forgot to clock in' },
    { by: 'owner', before: { endedAt: '2026-05-12T14:00:00.000Z' }, reason: 'Stayed longer' },
  ]);
  const audit = jsonOf<{ entity: string; action: string }[]>(zip['audit.json']);
  expect(audit.map(({ entity, action }) => `${entity} ${action}`)).toEqual([
    ...['pay_rate set', 'clock_entry added', 'clock_entry corrected', 'pay_adjustment added'],
    ...['pay_week checked', 'pay_week locked'],
  ]);
  expect(jsonOf<unknown[]>(zip['rates.json'])).toMatchObject([
    { personId: null, kind: 'commission_percent', value: '10' },
    { personId: company.people.sefa.id, kind: 'hourly', value: '20' },
  ]);
});

test('nothing in it tells of a customer, of another person or of another’s share', async () => {
  const zip = await open(sefa, company.people.sefa.id);
  const { idris, maren } = company.people;
  for (const [name, content] of Object.entries(zip).filter(([path]) => !path.endsWith('.pdf'))) {
    for (const secret of ['Nakagawa', 'Idris', idris.id, 'Maren', maren.id, 'Rowan', '31.75', '20.01', '2001'])
      expect(content.includes(secret), `${name} holds ${secret}`).toBe(false);
  }
  const workings = first(
    jsonOf<{ lines: { kind: string; steps: { arithmetic: string }[] }[] }[]>(zip['workings.json']),
  );
  const shared = workings.lines.filter((line) => line.kind === 'commission' || line.kind === 'tip');
  expect(shared.map((line) => line.steps.map((step) => step.arithmetic))).toEqual([['own share'], ['own share']]);
  expect(zip['README.txt']).toContain('Tax withholding is left to a licensed payroll processor.');
});

test('the owner may take anybody’s, everybody else the own alone', async () => {
  const { idris, maren } = company.people;
  expect(Object.keys(await open(owner, idris.id))).toContain('statements/2026-05-11-idris-vale.pdf');
  expect(Object.keys(await open(owner, maren.id))).not.toContain('statements/2026-05-11-maren-holt.pdf');
  await owner.get(pathOf('00000000-0000-7000-8000-000000000000')).expect(404);
  const dispatcher = await company.dispatcher();
  expect(Object.keys(await open(dispatcher, maren.id))).toContain('audit.json');
  for (const id of [idris.id, company.people.sefa.id]) await dispatcher.get(pathOf(id)).expect(403);
  await sefa.get(pathOf(idris.id)).expect(403);
  await sefa.get(pathOf('00000000-0000-7000-8000-000000000000')).expect(403);
  await (await company.idris()).get(pathOf(company.people.sefa.id)).expect(403);
  await app.anonymous().get(pathOf(idris.id)).expect(401);
});
