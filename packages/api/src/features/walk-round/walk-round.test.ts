import { createHash } from 'node:crypto';
import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { WalkCarDto, WalkPhotoDto, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { SECRETS, jpegFile } from '@driprail/shared/domain/walk-round/testing/jpeg-file';
import { select } from '../../db/sequelize.ts';
import { createJob } from '../booking/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let sefa: TestAgent;
let idris: TestAgent;
let dispatcher: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  [sefa, idris, dispatcher] = await Promise.all([company.sefa(), company.idris(), company.dispatcher()]);
  await select(`UPDATE services SET photo_set = 'quick'`);
});

const clock = (time: string) => `2026-05-14T${time}:00.000Z`;
let visit: VisitDto;
let vehicleId: string;
const aVisit = async (): Promise<VisitDto> => {
  const { customer, wash } = company;
  const job = await createJob(company.ctx, {
    ...{ customerId: customer.id, addressId: first(customer.addresses).id, windowFrom: null, windowTo: null },
    ...{ notes: '', discountCents: 0, discountReason: '' },
    lines: [{ serviceId: wash.id, vehicleId, sizeClass: 'sedan' }],
  });
  const made = first(job.visits);
  const move = {
    visitId: made.id,
    planVersion: 0,
    vanId: company.vans.gannet.id,
    from: clock('15:30'),
    to: clock('16:20'),
  };
  const answer = await dispatcher.post('/api/board/moves').send({ moves: [move] });
  return first((answer.body as { visits: VisitDto[] }).visits);
};
beforeEach(async () => {
  app.time.now = clock('15:00');
  // A car of its own for each test: marks come along with the car.
  vehicleId = uuid();
  await select(
    `INSERT INTO vehicles (id, customer_id, label, size_class) VALUES (:vehicleId, :customerId, '2019 hatchback', 'sedan')`,
    { vehicleId, customerId: company.customer.id },
  );
  visit = await aVisit();
});

const press = (kind: string, more: object = {}, on = visit) =>
  sefa.post(`/api/visits/${on.id}/actions`).send({ key: uuid(), kind, deviceAt: app.time.now, ...more });
const sheetOf = async (agent: TestAgent = sefa, on = visit): Promise<WalkSheetDto> =>
  ((await agent.get(`/api/visits/${on.id}/walk-round`).expect(200)).body as { sheet: WalkSheetDto }).sheet;
const carOf = async (on = visit): Promise<WalkCarDto> => first((await sheetOf(sefa, on)).cars);
const aMark = (more: object = {}) => ({
  ...{
    id: uuid(),
    x: 500,
    y: 150,
    place: 'hood',
    kind: 'chip',
    size: 'small',
    note: '',
    carriedFrom: null,
    answer: null,
  },
  ...more,
});
const aRound = (more: object = {}) => ({
  ...{
    key: uuid(),
    deviceAt: app.time.now,
    vehicleId,
    body: 'hatchback',
    paint: 'good',
    interior: 'fair',
    odometer: 41_200,
  },
  ...{ hasItems: false, itemsNote: '', mayMove: true, isTooDirty: false, missingReason: 'Raining', absentReason: '' },
  ...{ initials: [[10, 10, 40, 60, 80, 20]], marks: [aMark()], photoViews: [] },
  ...more,
});
const finish = (body: object, on = visit) => sefa.post(`/api/visits/${on.id}/walk-round`).send(body);

describe('a walk-round', () => {
  test('is finished once, anew until work starts, and frozen from then on', async () => {
    await press('arrive').expect(200);
    const body = aRound();
    await finish(body).expect(200);
    expect((await finish(body).expect(200)).body).toMatchObject({ isRepeat: true });
    await finish({ ...body, paint: 'poor' }).expect(422);
    await finish(aRound({ paint: 'poor', marks: [aMark({ kind: 'dent' }), aMark()] })).expect(200);
    await press('start_work').expect(200);
    const clash = await finish(aRound()).expect(409);
    expect(clash.body).toMatchObject({ error: { code: 'clash' } });
    const car = await carOf();
    expect(car.walkRound).toMatchObject({
      paint: 'poor',
      by: 'Sefa Lund',
      isLate: false,
      initials: [[10, 10, 40, 60, 80, 20]],
    });
    expect(car.walkRound?.marks.map(({ kind }) => kind)).toEqual(['dent', 'chip']);
  });

  test.each([
    ['the walk-round', `UPDATE walk_rounds SET paint = 'good'`],
    ['the walk-round, taken away', 'DELETE FROM walk_rounds'],
    ['a mark', `UPDATE walk_marks SET size = 'large'`],
    ['a mark, taken away', 'DELETE FROM walk_marks'],
    [
      'a mark more that is not said to be added',
      `INSERT INTO walk_marks (id, visit_id, position, x, y, place, kind, size, user_id, received_at, occurred_at)
       SELECT gen_random_uuid(), visit_id, 1, 1, 1, 'hood', 'dent', 'small', user_id, now(), now() FROM walk_rounds`,
    ],
  ])('is frozen in the database too: %s', async (_what, sql) => {
    await press('arrive').expect(200);
    await finish(aRound()).expect(200);
    await press('start_work').expect(200);
    await expect(select(sql)).rejects.toMatchObject({ parent: { code: 'DR004' } });
  });

  test('lacks what it lacks, by field', async () => {
    const bare = aRound({ missingReason: '', initials: null, mayMove: null });
    const answer = await finish(bare).expect(422);
    const { fields } = (answer.body as { error: { fields: object } }).error;
    expect(Object.keys(fields)).toEqual(['missingReason', 'mayMove', 'initials']);
  });

  test('of another crew’s visit is not there; the desk reads it', async () => {
    await idris.get(`/api/visits/${visit.id}/walk-round`).expect(404);
    await idris.post(`/api/visits/${visit.id}/walk-round`).send(aRound()).expect(404);
    expect((await sheetOf(dispatcher)).cars).toHaveLength(1);
    app.time.now = '2026-05-17T15:00:00.000Z';
    await sefa.get(`/api/visits/${visit.id}/walk-round`).expect(404);
  });

  test('and photo made on the day are taken from a phone that was dead for two weeks, not later, not another’s', async () => {
    const [late, later] = [aRound(), aRound()];
    const photo = announced(jpegFile());
    app.time.now = '2026-05-28T14:00:00.000Z';
    await sefa.get(`/api/visits/${visit.id}/walk-round`).expect(404);
    await finish(aRound()).expect(404);
    await idris
      .post(`/api/visits/${visit.id}/walk-round`)
      .send({ ...late, key: uuid() })
      .expect(404);
    await finish(late).expect(200);
    await announce(photo).expect(200);
    app.time.now = '2026-05-28T16:00:00.000Z';
    await finish(later).expect(404);
    await finish(late).expect(200);
  });

  test('that arrives after work began is kept as late', async () => {
    await press('arrive').expect(200);
    await press('start_work', { reason: 'Phone does not work' }).expect(200);
    await finish(aRound()).expect(200);
    const { walkRound } = await carOf();
    expect(walkRound).toMatchObject({ isLate: true, marks: [{ isAddition: true }] });
  });
});

describe('work', () => {
  test('starts without a walk-round only with a reason, which the board shows', async () => {
    await press('arrive').expect(200);
    const asked = await press('start_work').expect(422);
    expect(asked.body).toMatchObject({
      error: { code: 'walk_round_needed', fields: { reason: expect.any(String) as string } },
    });
    await press('start_work', { reason: 'Raining hard' }).expect(200);
    const board = (await dispatcher.get('/api/board/2026-05-14')).body as { visits: VisitDto[] };
    expect(board.visits.find(({ id }) => id === visit.id)?.walkRound).toEqual({
      ...{ photoSet: 'quick', cars: 1, made: 0, due: [vehicleId], isSecondLookDue: false, startReason: 'Raining hard' },
    });
  });

  test('taken back thaws the walk-round', async () => {
    await press('arrive').expect(200);
    await finish(aRound()).expect(200);
    await press('start_work').expect(200);
    await press('undo').expect(200);
    await finish(aRound({ paint: 'fair' })).expect(200);
    expect((await carOf()).walkRound?.paint).toBe('fair');
  });
});

describe('marks of the car’s last visit', () => {
  test('come along, are answered, and stay when nobody was asked', async () => {
    await finish(
      aRound({ marks: [aMark({ kind: 'dent' }), aMark({ kind: 'stain' }), aMark({ kind: 'chip' })] }),
    ).expect(200);
    app.time.now = clock('15:10');
    const next = await aVisit();
    const { lastMarks } = await carOf(next);
    const [dent, stain] = ['dent', 'stain'].map((kind) => lastMarks.find((mark) => mark.kind === kind));
    const answers = [
      aMark({ kind: 'dent', carriedFrom: dent?.id, answer: 'worse' }),
      aMark({ kind: 'stain', carriedFrom: stain?.id, answer: 'gone' }),
    ];
    await finish(aRound({ marks: answers }), next).expect(200);
    const { walkRound } = await carOf(next);
    expect(walkRound?.marks.map(({ kind, answer }) => [kind, answer])).toEqual(
      expect.arrayContaining([
        ['dent', 'worse'],
        ['stain', 'gone'],
        ['chip', null],
      ]),
    );
    app.time.now = clock('15:20');
    const third = await carOf(await aVisit());
    expect(third.lastMarks.map(({ kind }) => kind).sort()).toContain('chip');
    expect(third.lastMarks.map(({ kind }) => kind)).not.toContain('stain');
  });
});

describe('too dirty to see', () => {
  test('waits for a second look, and says so until it is answered', async () => {
    const look = { key: uuid(), kind: 'second_look', outcome: 'new_marks', deviceAt: app.time.now, vehicleId };
    const add = (body: object) => sefa.post(`/api/visits/${visit.id}/walk-round/additions`).send(body);
    await add(look).expect(409);
    await press('arrive').expect(200);
    await finish(aRound({ isTooDirty: true })).expect(200);
    const shown = ((await press('start_work').expect(200)).body as { visit: VisitDto }).visit;
    expect(shown.walkRound).toMatchObject({ isSecondLookDue: true, made: 1, due: [] });
    await add({ ...look, key: uuid(), kind: 'mark', outcome: undefined, mark: aMark({ kind: 'swirl' }) }).expect(200);
    await add({ ...look, key: uuid() }).expect(200);
    expect(await carOf()).toMatchObject({
      walkRound: {
        secondLook: { outcome: 'new_marks' },
        marks: [{ isAddition: false }, { kind: 'swirl', isAddition: true }],
      },
    });
    const [row] = ((await dispatcher.get('/api/board/2026-05-14')).body as { visits: VisitDto[] }).visits.filter(
      ({ id }) => id === visit.id,
    );
    expect(row?.walkRound.isSecondLookDue).toBe(false);
  });
});

const hashOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const announced = (bytes: Uint8Array, more: object = {}) => ({
  ...{ key: uuid(), deviceAt: app.time.now, vehicleId, view: 'front', moment: 'before' },
  ...{ bytes: bytes.length, sha256: hashOf(bytes) },
  ...more,
});
const announce = (body: object, agent = sefa) => agent.post(`/api/visits/${visit.id}/photos`).send(body);
const put = (id: string, offset: number, piece: Uint8Array, agent = sefa) =>
  agent
    .put(`/api/photos/${id}/bytes?offset=${offset}`)
    .set('content-type', 'application/octet-stream')
    .send(Buffer.from(piece));
const photoIn = (body: unknown) => (body as { photo: WalkPhotoDto }).photo;
const currentIn = (body: unknown) => (body as { error: { hint: { current: WalkPhotoDto } } }).error.hint.current;

describe('a photo', () => {
  test('arrives in pieces, goes on after a cut at any of them, and is stored once', async () => {
    const bytes = jpegFile({ scanBytes: 4000 });
    const steps = [0, 1, 700, 2000, bytes.length - 1, bytes.length];
    const body = announced(bytes);
    for (const [index, offset] of steps.slice(0, -1).entries()) {
      // The phone was closed: it announces anew and is told where to go on.
      expect(photoIn((await announce(body).expect(200)).body).receivedBytes).toBe(offset);
      const piece = bytes.subarray(offset, steps[index + 1]);
      const taken = photoIn((await put(body.key, offset, piece).expect(200)).body);
      expect(taken).toMatchObject({ receivedBytes: steps[index + 1], isStored: steps[index + 1] === bytes.length });
      // The answer was lost and the piece comes again: it is not taken twice.
      if (!taken.isStored) {
        const again = await put(body.key, offset, piece).expect(409);
        expect(currentIn(again.body).receivedBytes).toBe(steps[index + 1]);
      }
    }
    await put(body.key, 0, bytes).expect(200);
    expect((await carOf()).photos).toMatchObject([{ id: body.key, isStored: true, width: 640, height: 480 }]);
    expect(await select('SELECT 1 FROM photo_pieces WHERE photo_id = :id', { id: body.key })).toEqual([]);
  });

  test('comes back without position, preview or comment, to be kept by one browser alone', async () => {
    const bytes = jpegFile();
    const body = announced(bytes);
    await announce(body).expect(200);
    await put(body.key, 0, bytes).expect(200);
    const shown = await sefa.get(`/api/photos/${body.key}`).expect(200);
    expect(shown.headers).toMatchObject({
      ...{ 'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff', 'cache-control': 'private, no-cache' },
      'content-disposition': `inline; filename="job-${visit.jobNumber}-front-before.jpg"`,
    });
    const text = (shown.body as Buffer).toString('latin1');
    for (const secret of SECRETS) expect(text).not.toContain(secret);
    await sefa.get(`/api/photos/${body.key}`).set('if-none-match', String(shown.headers['etag'])).expect(304);
    const path = join(app.dataDir, 'photos', '2026-05', `${body.key}.jpg`);
    expect((await stat(path)).mode & 0o777).toBe(0o600);
    expect((await stat(join(app.dataDir, 'photos'))).mode & 0o777).toBe(0o700);
  });

  test('is there for its crew near the day and for the desk, for nobody else', async () => {
    const bytes = jpegFile();
    const body = announced(bytes);
    await announce(body, idris).expect(404);
    await announce(body).expect(200);
    await sefa.get(`/api/photos/${body.key}`).expect(404);
    await put(body.key, 0, bytes, idris).expect(404);
    await put(body.key, 0, bytes).expect(200);
    await idris.get(`/api/photos/${body.key}`).expect(404);
    await app.anonymous().get(`/api/photos/${body.key}`).expect(401);
    await app.anonymous().put(`/api/photos/${body.key}/bytes?offset=0`).expect(401);
    await dispatcher.get(`/api/photos/${body.key}`).expect(200);
    app.time.now = '2026-05-17T15:00:00.000Z';
    await sefa.get(`/api/photos/${body.key}`).expect(404);
  });

  test.each([
    ['a PDF named as a photo', Buffer.from('%PDF-1.7 and more'), /PDF, not a photo/],
    ['a photo cut off', Buffer.from(jpegFile().subarray(0, 300)), /damaged/],
    ['words', Buffer.from('no picture at all'), /no JPEG/],
  ])('that is %s is refused by its content, and again the same way', async (_what, bytes, message) => {
    const body = announced(bytes);
    await announce(body).expect(200);
    const refused = await put(body.key, 0, bytes).expect(422);
    expect((refused.body as { error: { message: string } }).error.message).toMatch(message);
    expect((await announce(body).expect(422)).body).toEqual(refused.body);
    await put(body.key, 0, bytes).expect(422);
    expect((await carOf()).photos).toEqual([]);
  });

  test('is limited in size, whole and by piece', async () => {
    await announce({ ...announced(jpegFile()), bytes: 60 * 1024 * 1024 }).expect(413);
    const bytes = jpegFile();
    const body = announced(bytes);
    await announce(body).expect(200);
    await put(body.key, 0, new Uint8Array(600 * 1024)).expect(413);
    await put(body.key, 0, new Uint8Array(bytes.length + 1)).expect(400);
  });

  test('keeps its key: other content under it is refused, and a damaged whole starts anew', async () => {
    const bytes = jpegFile();
    const body = announced(bytes);
    await announce(body).expect(200);
    await announce({ ...body, view: 'rear' }).expect(422);
    const other = Uint8Array.from(bytes, (byte, at) => (at === 250 ? byte ^ 1 : byte));
    expect(currentIn((await put(body.key, 0, other).expect(409)).body).receivedBytes).toBe(0);
    await put(body.key, 0, bytes).expect(200);
  });

  test('of the car as it came, taken after work began, is marked as added', async () => {
    await press('arrive').expect(200);
    await press('start_work', { reason: 'Raining hard' }).expect(200);
    const early = announced(jpegFile(), { deviceAt: clock('14:50') });
    expect(photoIn((await announce(early).expect(200)).body).isAddition).toBe(false);
    app.time.now = clock('15:05');
    expect(photoIn((await announce(announced(jpegFile())).expect(200)).body).isAddition).toBe(true);
  });

  test('once stored never changes', async () => {
    const bytes = jpegFile();
    const body = announced(bytes);
    await announce(body).expect(200);
    await put(body.key, 0, bytes).expect(200);
    await expect(select(`UPDATE photos SET view = 'rear'`)).rejects.toMatchObject({ parent: { code: 'DR004' } });
  });
});
