import { beforeAll, expect, test } from 'vitest';
import { v4 as key } from 'uuid';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { useApp } from './testing/app.ts';
import { aCompany, first } from './testing/company.ts';
import type { TestCompany } from './testing/company.ts';

const app = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(app);
});

test('the main job: place, drive, do, lock, read the statement', async () => {
  const { visit } = await company.aJob();
  const owner = await company.owner();
  const dispatcher = await company.dispatcher();
  const sefa = await company.sefa();
  await owner
    .post('/api/pay/rates')
    .send({
      kind: 'hourly',
      personId: company.people.sefa.id,
      serviceId: null,
      clockKind: null,
      value: '20',
      startsOn: '2026-01-01',
    })
    .expect(200);
  await owner
    .post('/api/pay/rates')
    .send({
      kind: 'commission_percent',
      personId: null,
      serviceId: null,
      clockKind: null,
      value: '6',
      startsOn: '2026-01-01',
    })
    .expect(200);

  const move = {
    visitId: visit.id,
    planVersion: 0,
    vanId: company.vans.gannet.id,
    from: '2026-05-14T15:30:00Z',
    to: '2026-05-14T17:00:00Z',
  };
  await dispatcher
    .post('/api/board/moves')
    .send({ moves: [move] })
    .expect(200);
  const board = (await dispatcher.get('/api/board/2026-05-14').expect(200)).body as BoardDto;
  expect(board.visits.map((v) => [v.customerName, v.progress, v.from])).toEqual([
    ['Nakagawa', 'placed', '2026-05-14T15:30:00.000Z'],
  ]);
  expect(board.unplaced).toEqual([]);

  app.time.now = '2026-05-14T15:00:00Z';
  const press = (kind: string, at: string) => {
    app.time.now = at;
    return sefa.post(`/api/visits/${visit.id}/actions`).send({ key: key(), kind, deviceAt: at });
  };
  await sefa
    .post('/api/clock/actions')
    .send({ key: key(), action: 'start', kind: 'shop', deviceAt: '2026-05-14T15:00:00Z' })
    .expect(200);
  await press('set_off', '2026-05-14T15:15:00Z').expect(200);
  await press('arrive', '2026-05-14T15:30:00Z').expect(200);
  await press('start_work', '2026-05-14T15:35:00Z').expect(200);
  await press('finish', '2026-05-14T17:00:00Z').expect(200);
  app.time.now = '2026-05-14T17:10:00Z';
  await sefa
    .post('/api/clock/actions')
    .send({ key: key(), action: 'stop', deviceAt: '2026-05-14T17:10:00Z' })
    .expect(200);

  const sheet = (await sefa.get('/api/run-sheet/2026-05-14').expect(200)).body as RunSheetDto;
  expect(first(sheet.visits)).toMatchObject({ progress: 'done', gateCode: '4471', vanName: 'Gannet' });
  expect(sheet.clock?.today.map((entry) => entry.kind)).toEqual(['shop', 'travel', 'job', 'waiting']);

  app.time.now = '2026-05-18T12:00:00Z';
  const week = (await owner.get('/api/pay/weeks/2026-05-14').expect(200)).body as PayWeekDto;
  const person = first(week.people);
  // 2 h 10 at 20.00 is 43.33 (half up); 6 % of 240.00 is 14.40.
  expect(person.totals).toMatchObject({ hourly: 4333, commission: 1440, gross: 5773 });
  const statement = `/api/pay/statements/2026-05-11/${company.people.sefa.id}`;
  await sefa.get(statement).expect(403);
  await owner.post('/api/pay/weeks/2026-05-11/state').send({ to: 'checked', version: week.week.version }).expect(200);
  const locks = await Promise.all(
    [1, 2].map(() =>
      owner.post('/api/pay/weeks/2026-05-11/state').send({ to: 'locked', version: week.week.version + 1 }),
    ),
  );
  expect(locks.map((answer) => answer.status).sort()).toEqual([200, 409]);
  const own = await sefa.get(statement).expect(200);
  expect(own.body).toMatchObject({ person: { totals: { gross: 5773 } } });
  await dispatcher.get(statement).expect(403);
  await dispatcher.get('/api/pay/weeks/2026-05-11').expect(403);
  const csv = await owner.get('/api/pay/weeks/2026-05-11/export.csv').expect(200);
  expect(csv.text).toContain('Sefa Lund,commission');
});
