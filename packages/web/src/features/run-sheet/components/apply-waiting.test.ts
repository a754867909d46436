import { describe, expect, test } from 'vitest';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import type { KeptPress } from '../../../lib/outbox/store.ts';
import { applyWaiting } from './apply-waiting.ts';

const NOW = '2026-05-14T15:00:00.000Z';
const visit = {
  id: 'v1',
  progress: 'placed',
  since: null,
  reason: '',
  from: '2026-05-14T15:30:00.000Z',
  windowFrom: '2026-05-14T15:00:00.000Z',
  gateCode: '4471',
  phone: '555-0142',
  accessNotes: 'Dog',
  undoable: null,
  times: { setOffAt: null, arrivedAt: null, startedAt: null, endedAt: null },
} as unknown as RunVisitDto;
const sheet = {
  day: '2026-05-14',
  zone: 'America/New_York',
  visits: [visit],
  clock: { personId: 'p', open: null, inSince: null, today: [] },
} as unknown as RunSheetDto;
let at = 0;
const press = (path: KeptPress['path'], body: Record<string, unknown>): KeptPress => ({
  key: `k${at}`,
  userId: 'u',
  at: at++,
  path,
  targetId: 'v1',
  body: { deviceAt: NOW, ...body },
  words: '',
  refused: null,
});
const shown = (...waiting: KeptPress[]) => applyWaiting(sheet, waiting, NOW);

describe('what waits on the phone', () => {
  test('is shown as done, in order', () => {
    const kinds = ['set_off', 'arrive', 'start_work', 'finish'].map((kind) => press('visit', { kind }));
    expect(shown(...kinds).visits[0]).toMatchObject({
      progress: 'done',
      since: NOW,
      times: { arrivedAt: NOW, endedAt: NOW },
    });
    expect(shown(...kinds.slice(0, 2)).visits[0]?.progress).toBe('on_site');
  });
  test('takes a sent mark back', () => {
    const sent = {
      ...visit,
      progress: 'on_site',
      undoable: { action: 'arrive', until: NOW },
      times: { ...visit.times, setOffAt: NOW },
    } as RunVisitDto;
    const undone = applyWaiting({ ...sheet, visits: [sent] }, [press('visit', { kind: 'undo' })], NOW);
    expect(undone.visits[0]?.progress).toBe('on_the_way');
  });
  test('leaves a step that can’t follow for the server to judge', () => {
    expect(shown(press('visit', { kind: 'finish' })).visits[0]?.progress).toBe('placed');
  });
  test('a walk-round counts for its own car, once, also when it is made anew', () => {
    const walkRound = {
      photoSet: 'quick',
      cars: 3,
      made: 1,
      due: ['c2', 'c3'],
      isSecondLookDue: false,
      startReason: '',
    };
    const withCars = { ...sheet, visits: [{ ...visit, walkRound } as RunVisitDto] };
    const made = (...cars: string[]) =>
      applyWaiting(
        withCars,
        cars.map((vehicleId) => press('walk', { vehicleId })),
        NOW,
      ).visits[0]?.walkRound;
    expect(made('c1')).toMatchObject({ made: 1, due: ['c2', 'c3'] });
    expect(made('c2', 'c2')).toMatchObject({ made: 2, due: ['c3'] });
    expect(made('c2', 'c1', 'c3')).toMatchObject({ made: 3, due: [] });
  });
  test('runs and stops the clock', () => {
    const started = shown(press('clock', { action: 'start', kind: 'travel' })).clock;
    expect(started).toMatchObject({ inSince: NOW, open: { kind: 'travel' } });
    expect(
      shown(press('clock', { action: 'start', kind: 'travel' }), press('clock', { action: 'stop' })).clock,
    ).toMatchObject({ open: null, today: [{ endedAt: NOW }] });
  });
  test('a crew mate’s press leaves one’s own clock alone', () => {
    const mate = { personId: 'm', name: 'Juno', kind: null, since: null };
    const clock = { personId: 'p', open: null, inSince: null, today: [], crew: [mate] };
    const withMate = { ...sheet, clock } as unknown as RunSheetDto;
    const start = press('clock', { action: 'start', forPersonId: 'm' });
    expect(applyWaiting(withMate, [start], NOW).clock).toMatchObject({
      open: null,
      crew: [{ kind: 'shop', since: NOW }],
    });
    const stop = press('clock', { action: 'stop', forPersonId: 'm' });
    expect(applyWaiting(withMate, [start, stop], NOW).clock).toMatchObject({ crew: [{ kind: null, since: null }] });
  });
  test('a kept copy hides gate code and number after the day, as the server does', () => {
    expect(shown().visits[0]?.gateCode).toBe('4471');
    expect(applyWaiting(sheet, [], '2026-05-15T04:00:00.000Z').visits[0]).toMatchObject({
      gateCode: null,
      phone: null,
      accessNotes: null,
    });
  });
});
