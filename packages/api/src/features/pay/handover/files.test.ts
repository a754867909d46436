import type TestAgent from 'supertest/lib/agent.js';
import { strFromU8, unzipSync } from 'fflate';
import { beforeAll, expect, test } from 'vitest';
import { v4 as key } from 'uuid';
import type { PaydayDto } from '@driprail/shared/contracts/handover.contract';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { exact, sum } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import { useApp } from '../../../testing/app.ts';
import { aCompany, first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';
import { aDoneJob, payWeeks } from '../../../testing/pay-weeks.ts';
import { plainCents } from '../../../paper/csv.ts';
import { bytesOf, hourly, rowsOf, worked } from './testing/paid-weeks.ts';

const app = useApp();
let company: TestCompany;
let owner: TestAgent;
let payday: PaydayDto;
let weeks: PayWeekDto[];

/** Two weeks: Sefa over 40 h with a tip, a reimbursement and a deduction; Idris in California, long days, under 40 h. */
beforeAll(async () => {
  company = await aCompany(app);
  owner = await company.owner();
  const { sefa, idris } = company.people;
  await hourly(owner, sefa.id, '20');
  await hourly(owner, idris.id, '20');
  const california = { name: 'California', ruleSetKey: 'us_ca', ownRules: null, minimumWages: [] };
  const { place } = (await owner.post('/api/pay/places').send(california).expect(200)).body as {
    place: { id: string };
  };
  await owner
    .post('/api/pay/person-places')
    .send({ personId: idris.id, placeId: place.id, startsOn: '2026-04-27' })
    .expect(200);
  for (const day of ['04', '05', '06', '07', '08']) {
    await worked(sefa.id, `2026-05-${day}`, '07:00', '12:00');
    await worked(sefa.id, `2026-05-${day}`, '12:00', '12:30', 'meal_break');
    await worked(sefa.id, `2026-05-${day}`, '12:30', '16:50', 'travel');
  }
  await worked(idris.id, '2026-04-28', '07:00', '18:00');
  await worked(sefa.id, '2026-04-28', '22:00', '23:59');
  const wren = { name: '@Wren "Q", Calder', phone: '', skills: [], isTrainee: false, isActive: true, sharesTips: true };
  const made = (await owner.post('/api/people').send(wren).expect(200)).body as { person: { id: string } };
  await hourly(owner, made.person.id, '18');
  await worked(made.person.id, '2026-05-12', '07:00', '08:00');
  await driveAndTip();
  const add = (kind: string, amountCents: number) =>
    owner
      .post('/api/pay/weeks/2026-05-04/adjustments')
      .send({ personId: sefa.id, kind, amountCents, reason: '=HYPERLINK("x")', correctsLineId: null })
      .expect(200);
  await add('reimbursement', 1234);
  await add('deduction', -500);
  await add('discretionary_bonus', 2500);
  for (const day of ['2026-04-27', '2026-05-04', '2026-05-11']) {
    if (day === '2026-05-11') app.time.now = '2026-05-18T12:00:00Z';
    await payWeeks(owner).lock(day);
  }
  const named = { paysOn: '2026-05-22', note: '', weeks: ['2026-04-27', '2026-05-04', '2026-05-11'] };
  payday = ((await owner.post('/api/pay/paydays').send(named).expect(200)).body as { payday: PaydayDto }).payday;
  weeks = await Promise.all(named.weeks.map(payWeeks(owner).read));
});

/** A job of today done by Sefa, with a tip by card and cash kept on the spot. */
async function driveAndTip(): Promise<void> {
  const { visit, job } = await aDoneJob(app, company, owner);
  await worked(company.people.sefa.id, '2026-05-14', '11:30', '12:30', 'job', visit.id);
  const sefa = await company.sefa();
  for (const [method, amountCents, alreadyReceived] of [
    ['card', 1500, false],
    ['invoice', 300, false],
    ['cash', 700, true],
  ]) {
    const tip = { key: key(), amountCents, method, alreadyReceived };
    await sefa.post(`/api/jobs/${job.id}/tips`).send(tip).expect(200);
  }
}

const text = async (path: string) =>
  (
    await owner
      .get(path)
      .expect(200)
      .expect('content-type', /text\/csv/)
  ).text;
const files = async (agent: TestAgent, path: string) => {
  const { status, type, body } = await bytesOf(agent, path);
  expect([status, type]).toEqual([200, 'application/zip']);
  return unzipSync(body);
};
const dollarsOf = (row: Record<string, string>, names: string[]) =>
  decimalText(sum(names.map((name) => exact(row[name] ?? ''))), 2);

const KINDS = [
  ...['straight_pay', 'flat', 'commission', 'bonus', 'percentage_bonus', 'discretionary_bonus', 'flsa_premium'],
  ...['state_only_premium', 'plan_top_up', 'minimum_wage_make_up', 'tips_card', 'tips_invoice', 'tips_cash'],
  ...['reimbursement', 'paid_time_off', 'show_up_pay', 'deductions', 'corrections'],
];

test('the kinds of each person and week add up to the statement, to the cent', async () => {
  const rows = rowsOf(await text(`/api/pay/paydays/${payday.id}/kinds.csv`));
  const statements = weeks.flatMap(({ week, people }) =>
    people.map((person) => [week.startsOn, person.personId, plainCents(person.totals.gross)]),
  );
  expect(rows.map((row) => [row['week_start'], row['person_id'], row['gross']])).toEqual(statements);
  for (const row of rows) expect(dollarsOf(row, KINDS)).toBe(row['gross']);

  const sefa = rows.filter((row) => row['person'] === 'Sefa Lund');
  // 46 h 40 min at 20.00 is 933.33; half of 20.00 (933.33 / 46.667 h) for 6 h 40 min is 66.67 (arithmetic).
  expect(sefa[1]).toMatchObject({
    schema_version: '1',
    hours_worked: '46.6667',
    overtime_hours: '6.6667',
    straight_pay: '933.33',
    flsa_premium: '66.67',
    state_only_premium: '0.00',
    reimbursement: '12.34',
    deductions: '-5.00',
    discretionary_bonus: '25.00',
    gross: '1032.34',
  });
  expect(sefa[2]).toMatchObject({ tips_card: '15.00', tips_invoice: '3.00', tips_already_received: '7.00' });
  // California: 11 h in a day are 3 h over 8 at half of 20.00; the federal rule asks for none (Labor Code 510).
  expect(rows.find((row) => row['person'] === 'Idris Vale')).toMatchObject({
    overtime_hours: '3.0000',
    flsa_premium: '0.00',
    state_only_premium: '30.00',
  });
});

test('the hours of each person and week add up to those that were paid', async () => {
  const rows = rowsOf(await text(`/api/pay/paydays/${payday.id}/hours.csv`));
  for (const { week, people } of weeks) {
    for (const person of people) {
      const own = rows.filter((row) => row['week_start'] === week.startsOn && row['person_id'] === person.personId);
      const hours = sum(own.map((row) => exact(row['hours'] ?? '')));
      expect(decimalText(hours, 2)).toBe(decimalText(exact(person.hoursWorked), 2));
    }
  }
  expect(
    rows.filter((row) => row['date'] === '2026-05-04').map((row) => [row['kind'], row['hours'], row['worked']]),
  ).toEqual([
    ['shop', '5.0000', 'yes'],
    ['meal_break', '0.0000', 'no'],
    ['travel', '4.3333', 'yes'],
  ]);
  const onJob = first(rows.filter((row) => row['kind'] === 'job'));
  expect(onJob).toMatchObject({ started: '2026-05-14T11:30:00-04:00', ended: '2026-05-14T12:30:00-04:00' });
  expect(Number(onJob['job'])).toBeGreaterThan(0);
});

test('a locked week has the same files by itself; an open one says what to do', async () => {
  expect(rowsOf(await text('/api/pay/weeks/2026-05-04/kinds.csv'))).toHaveLength(1);
  expect(rowsOf(await text('/api/pay/weeks/2026-05-04/hours.csv'))).toHaveLength(15);
  for (const file of ['kinds.csv', 'hours.csv', 'export.zip']) {
    const refused = await owner.get(`/api/pay/weeks/2026-05-18/${file}`).expect(422);
    expect((refused.body as { error: { message: string } }).error.message).toBe(
      'Week 21 is not locked. Lock it first, then hand it over.',
    );
  }
});

test('the archive holds a PDF per statement, the files and a README; no customer, no formula', async () => {
  const zip = await files(owner, `/api/pay/paydays/${payday.id}/export.zip`);
  expect(Object.keys(zip).sort()).toEqual([
    'README.txt',
    'hours.csv',
    'kinds.csv',
    'lines.csv',
    'people.csv',
    'statements/2026-04-27-idris-vale.pdf',
    'statements/2026-04-27-sefa-lund.pdf',
    'statements/2026-05-04-sefa-lund.pdf',
    'statements/2026-05-11-sefa-lund.pdf',
    'statements/2026-05-11-wren-q-calder.pdf',
  ]);
  const read = (name: string) => strFromU8(zip[name] ?? new Uint8Array());
  for (const [name, bytes] of Object.entries(zip)) {
    if (name.endsWith('.pdf')) expect(strFromU8(bytes.slice(0, 5))).toBe('%PDF-');
    else expect(read(name)).not.toContain('Nakagawa');
  }
  for (const name of ['kinds.csv', 'people.csv', 'lines.csv', 'hours.csv']) {
    expect(read(name)).not.toMatch(/(^|,)"?[=+@]/m);
    for (const column of Object.keys(first(rowsOf(read(name))))) expect(read('README.txt')).toContain(`  ${column} `);
  }
  expect(read('README.txt')).toContain('Tax withholding is left to a licensed payroll processor.');
  expect(read('kinds.csv')).toBe(await text(`/api/pay/paydays/${payday.id}/kinds.csv`));
  expect(read('lines.csv')).toBe(await text(`/api/pay/paydays/${payday.id}/lines.csv`));

  const people = rowsOf(read('people.csv'));
  const sefa = first(people.filter((row) => row['person'] === 'Sefa Lund'));
  const gross = weeks.flatMap((week) => week.people).filter((person) => person.name === 'Sefa Lund');
  expect([sefa['weeks'], sefa['first_week_start'], sefa['last_week_end'], sefa['gross']]).toEqual([
    '3',
    '2026-04-27',
    '2026-05-17',
    plainCents(gross.reduce((total, person) => total + person.totals.gross, 0)),
  ]);
  expect(Object.keys(await files(owner, '/api/pay/weeks/2026-04-27/export.zip'))).toContain(
    'statements/2026-04-27-idris-vale.pdf',
  );
});

test('a name that begins like a formula is text in every file', async () => {
  const name = `'@Wren "Q", Calder`;
  for (const file of ['kinds.csv', 'lines.csv', 'hours.csv']) {
    const rows = rowsOf(await text(`/api/pay/paydays/${payday.id}/${file}`));
    const persons = new Set(rows.map((row) => row['person']));
    expect([...persons].sort()).toEqual([name, 'Idris Vale', 'Sefa Lund']);
  }
});

test('files are the owner’s alone', async () => {
  for (const agent of [await company.dispatcher(), await company.sefa()]) {
    for (const path of [
      `paydays/${payday.id}/kinds.csv`,
      `paydays/${payday.id}/export.zip`,
      'weeks/2026-05-04/export.zip',
    ])
      await agent.get(`/api/pay/${path}`).expect(403);
  }
});
