import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { select } from '../../db/sequelize.ts';
import { createService } from '../service-menu/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  dispatcher = await company.dispatcher();
});

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
const move = (visit: VisitDto, vanId: string | null, from = '', to = '') => ({
  visitId: visit.id,
  planVersion: visit.planVersion,
  vanId,
  from: vanId ? at(from) : null,
  to: vanId ? at(to) : null,
});
const save = (...moves: object[]) => dispatcher.post('/api/board/moves').send({ moves });
const placed = async (vanId: string, from: string, to: string) => {
  const { visit } = await company.aJob();
  const answer = await save(move(visit, vanId, from, to));
  expect(answer.status).toBe(200);
  return first((answer.body as { visits: VisitDto[] }).visits);
};
/** Each test has its own hours of the day, so that none stands in another's way. */
beforeEach(async () => {
  const board = (await dispatcher.get('/api/board/2026-05-14')).body as BoardDto;
  for (const visit of board.visits) await save(move(visit, null)).expect(200);
});

describe('a move', () => {
  test('names the version it saw; the later one gets the newer state and a sentence', async () => {
    const visit = await placed(company.vans.gannet.id, '15:00', '16:30');
    const [one, two] = await Promise.all([
      save(move(visit, company.vans.plover.id, '15:00', '16:30')),
      save(move(visit, company.vans.gannet.id, '17:00', '18:30')),
    ]);
    expect([one?.status, two?.status].sort()).toEqual([200, 409]);
    const refused = one?.status === 409 ? one : two;
    expect(refused?.body).toMatchObject({
      error: { code: 'stale_plan', hint: { current: { id: visit.id, planVersion: visit.planVersion + 1 } } },
    });
  });

  test('of one van to two stops is refused in words', async () => {
    await placed(company.vans.gannet.id, '15:00', '16:30');
    const other = await placedElsewhere();
    const answer = await save(move(other, company.vans.gannet.id, '16:00', '17:00')).expect(422);
    expect(answer.body).toMatchObject({
      error: {
        code: 'refused',
        message: 'Gannet is at Nakagawa until 12:30 pm. One van can’t be at two stops.',
        hint: { refusals: [{ code: 'van_overlap' }] },
      },
    });
  });

  test('is all of the list or nothing', async () => {
    const stays = await placed(company.vans.gannet.id, '15:00', '16:30');
    const other = await placedElsewhere();
    await save(move(other, company.vans.gannet.id, '18:00', '19:00'), move({ ...stays, planVersion: 99 }, null)).expect(
      409,
    );
    const board = (await dispatcher.get('/api/board/2026-05-14')).body as BoardDto;
    expect(board.unplaced.some((visit) => visit.id === other.id)).toBe(true);
  });

  test('swaps two visits between vans in one list', async () => {
    const one = await placed(company.vans.gannet.id, '15:00', '16:30');
    const two = await placed(company.vans.plover.id, '15:00', '16:30');
    await save(
      move(one, company.vans.plover.id, '15:00', '16:30'),
      move(two, company.vans.gannet.id, '15:00', '16:30'),
    ).expect(200);
  });

  test('onto a visit at the same address shares its parking place, side by side', async () => {
    const one = await placed(company.vans.gannet.id, '15:00', '16:30');
    const two = await placed(company.vans.gannet.id, '15:30', '17:00');
    expect(two.stopId).toBe(one.stopId);
  });

  test('that needs a reason is asked once, and not again when nothing changed', async () => {
    const polish = await createService(company.ctx, {
      name: `Polish ${Date.now()}`,
      kind: 'single',
      description: '',
      skills: ['correction'],
      equipment: [],
      isActive: true,
      position: 5,
      startsOn: '2026-01-01',
      prices: [{ sizeClass: 'sedan', priceCents: 30_000, minutes: 60 }],
    });
    const { job } = await company.aJob();
    const line = { serviceId: polish.id, vehicleId: first(company.customer.vehicles).id, sizeClass: 'sedan' };
    const body = {
      customerId: job.customerId,
      addressId: job.addressId,
      windowFrom: null,
      windowTo: null,
      notes: '',
      discountCents: 0,
      discountReason: '',
      lines: [line],
    };
    const made = (await dispatcher.post('/api/jobs').send(body).expect(200)).body as { job: { visits: VisitDto[] } };
    const visit = first(made.job.visits);
    const order = move(visit, company.vans.gannet.id, '15:00', '16:00');
    const asked = await save(order).expect(422);
    const [warning] = (asked.body as { error: { hint: { warnings: { key: string; code: string }[] } } }).error.hint
      .warnings;
    expect(warning?.code).toBe('missing_skill');
    const accept = [{ visitId: visit.id, key: warning?.key, reason: 'Idris comes over' }];
    const saved = await dispatcher
      .post('/api/board/moves')
      .send({ moves: [order], accept })
      .expect(200);
    const after = first((saved.body as { visits: VisitDto[] }).visits);
    expect(after.accepted[0]).toMatchObject({ reason: 'Idris comes over', by: 'Maren Holt' });
    await save(move(after, company.vans.gannet.id, '17:00', '18:00')).expect(200);
  });

  test('with a bad body says what to do at the field', async () => {
    const answer = await dispatcher
      .post('/api/board/moves')
      .send({ moves: [{ visitId: 'x', planVersion: 0, vanId: null, from: 'soon', to: null, rate: 1 }] })
      .expect(400);
    const { fields } = (answer.body as { error: { fields: Record<string, string> } }).error;
    expect(fields['moves.0.visitId']).toBe('Choose one from the list.');
    expect(fields['moves.0.from']).toBe('Give a date and time.');
  });
});

test('the database itself refuses one van at two stops, whatever the code does', async () => {
  const visit = await placed(company.vans.gannet.id, '15:00', '16:30');
  await expect(
    select(
      `INSERT INTO visits (id, job_id, stop_id, part, van_id, planned, minutes, progress)
       SELECT gen_random_uuid(), job_id, s.id, 99, van_id, planned, minutes, 'placed' FROM visits v, (SELECT id FROM stops WHERE id <> :stopId LIMIT 1) s WHERE v.id = :id`,
      { id: visit.id, stopId: visit.stopId },
    ),
  ).rejects.toMatchObject({ parent: { constraint: 'visits_van_at_one_stop' } });
});

test('a person can’t ride in two vans at once', async () => {
  const members = [{ personId: company.people.sefa.id, from: at('12:00'), to: at('20:00') }];
  const answer = await dispatcher
    .put(`/api/vans/${company.vans.plover.id}/crew/2026-05-14`)
    .send({ members })
    .expect(422);
  expect(answer.body).toMatchObject({ error: { code: 'person_overlap' } });
});

test('a day of a locked week can’t be planned', async () => {
  const visit = await placed(company.vans.gannet.id, '15:00', '16:30');
  await select(`INSERT INTO pay_weeks (id, starts_on, ends_on, starts_at, ends_at, state, locked_at, locked_by, snapshot)
    SELECT gen_random_uuid(), '2026-05-04', '2026-05-10', '2026-05-04T04:00:00Z', '2026-05-11T04:00:00Z', 'locked', now(), id, '{}' FROM users LIMIT 1`);
  const back = {
    visitId: visit.id,
    planVersion: visit.planVersion,
    vanId: company.vans.gannet.id,
    from: '2026-05-07T15:00:00Z',
    to: '2026-05-07T16:00:00Z',
  };
  const answer = await dispatcher
    .post('/api/board/moves')
    .send({ moves: [back] })
    .expect(422);
  expect(answer.body).toMatchObject({ error: { hint: { refusals: [{ code: 'locked_day' }] } } });
});

/** A visit at another address, so that it never shares a parking place. */
async function placedElsewhere(): Promise<VisitDto> {
  const made = await dispatcher
    .post('/api/customers')
    .send({ ...aCustomer('Iversen'), addresses: [{ ...first(aCustomer('').addresses), line: '8 Old Slip' }] })
    .expect(200);
  const { customer } = made.body as { customer: TestCompany['customer'] };
  const job = await dispatcher
    .post('/api/jobs')
    .send({
      customerId: customer.id,
      addressId: first(customer.addresses).id,
      windowFrom: null,
      windowTo: null,
      notes: '',
      discountCents: 0,
      discountReason: '',
      lines: [{ serviceId: company.wash.id, vehicleId: null, sizeClass: 'sedan' }],
    })
    .expect(200);
  return first((job.body as { job: { visits: VisitDto[] } }).job.visits);
}
