import { describe, expect, test } from 'vitest';
import type { WalkPhotoDto, WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import type { KeptPress } from '../../../lib/outbox/store.ts';
import { withWaiting } from './shown-walk.ts';
import { beginDraft, readOdometer, viewsTaken } from './walk-draft.ts';

const NOW = '2026-05-14T15:00:00.000Z';
const photo: WalkPhotoDto = {
  ...{ id: 'p1', vehicleId: 'car', view: 'front', moment: 'before', bytes: 900, receivedBytes: 300, isStored: false },
  ...{ width: null, height: null, isAddition: false, at: NOW, by: 'Sefa Lund' },
};
const sheet: WalkSheetDto = {
  ...{
    visitId: 'v1',
    jobNumber: 4218,
    customerName: 'Nakagawa',
    progress: 'on_site',
    startedAt: null,
    startReason: '',
  },
  cars: [
    {
      ...{ vehicleId: 'car', vehicle: 'grey 2019 hatchback', sizeClass: 'sedan', photoSet: 'quick' },
      ...{ walkRound: null, lastMarks: [], lastAt: null, photos: [photo] },
    },
  ],
};
const mark = {
  ...{
    id: 'm1',
    x: 500,
    y: 200,
    place: 'hood',
    kind: 'chip',
    size: 'small',
    note: '',
    carriedFrom: null,
    answer: null,
  },
} as const;
const facts = {
  ...{ vehicleId: 'car', body: 'hatchback', paint: 'good', interior: 'fair', odometer: 41_200, hasItems: false },
  ...{
    itemsNote: '',
    mayMove: true,
    isTooDirty: true,
    missingReason: 'Raining',
    absentReason: 'At work',
    initials: null,
  },
  ...{ marks: [mark], photoViews: [], offsetMs: 0 },
};
const press = (path: KeptPress['path'], body: Record<string, unknown>, targetId = 'v1'): KeptPress => ({
  ...{
    key: typeof body['key'] === 'string' ? body['key'] : path,
    userId: 'u',
    at: 0,
    path,
    targetId,
    words: '',
    refused: null,
  },
  body: { deviceAt: NOW, ...body },
});
const shown = (...waiting: KeptPress[]) => withWaiting(sheet, waiting, 'Sefa Lund');
const carOf = (...waiting: KeptPress[]) => {
  const [car] = shown(...waiting).cars;
  if (!car) throw new Error('the sheet has a car');
  return car;
};

describe('what waits on the phone', () => {
  test('is shown as done: a finished walk-round, then a mark and the second look', () => {
    const car = carOf(
      press('walk', facts),
      press('walk_addition', { kind: 'mark', vehicleId: 'car', mark: { ...mark, id: 'm2', kind: 'swirl' } }),
      press('walk_addition', { kind: 'second_look', vehicleId: 'car', outcome: 'new_marks', note: '' }),
    );
    expect(car).toMatchObject({
      isWaiting: true,
      walkRound: { by: 'Sefa Lund', secondLook: { outcome: 'new_marks' } },
    });
    expect(car.walkRound?.marks.map(({ kind, isAddition }) => [kind, isAddition])).toEqual([
      ['chip', false],
      ['swirl', true],
    ]);
  });

  test('of another visit or car changes nothing', () => {
    expect(carOf(press('walk', facts, 'v2')).walkRound).toBeNull();
    expect(carOf(press('walk', { ...facts, vehicleId: 'other' })).walkRound).toBeNull();
  });

  test('are photos once each, whether the server knows them yet or not', () => {
    const waiting = { vehicleId: 'car', moment: 'before', bytes: 900 };
    const car = carOf(
      press('photo', { ...waiting, key: 'p1', view: 'front' }),
      press('photo', { ...waiting, key: 'p2', view: 'left' }),
    );
    expect(car.photos.map(({ id, isHere, receivedBytes }) => [id, isHere, receivedBytes])).toEqual([
      ['p1', true, 300],
      ['p2', true, 0],
    ]);
    expect(viewsTaken(car).map(({ view }) => view)).toEqual(['front', 'left']);
  });

  test('taken back from Done leaves the work begun', () => {
    const done = { ...sheet, progress: 'done' } as const;
    const taken = press('visit', { kind: 'undo' });
    expect(withWaiting(done, [taken], '').hasBegun).toBe(true);
    expect(withWaiting({ ...sheet, progress: 'working' }, [taken], '').hasBegun).toBe(false);
  });

  test('begins work, until that is taken back', () => {
    expect(shown().hasBegun).toBe(false);
    expect(shown(press('visit', { kind: 'start_work' })).hasBegun).toBe(true);
    expect(shown(press('visit', { kind: 'start_work' }), press('visit', { kind: 'undo' })).hasBegun).toBe(false);
  });
});

describe('a draft', () => {
  test('begins with the outline of the car, or with what was finished', () => {
    expect(beginDraft(carOf())).toMatchObject({ body: 'hatchback', odometer: '', marks: [] });
    expect(beginDraft(carOf(press('walk', facts)))).toMatchObject({
      odometer: '41200',
      marks: [mark],
      isTooDirty: true,
    });
  });
  test.each([
    ['', null],
    ['41,200', 41_200],
    [' 7 ', 7],
    ['about 40', undefined],
    ['123456789', undefined],
  ])('reads the odometer %s', (text, value) => {
    expect(readOdometer(text)).toBe(value);
  });
});
