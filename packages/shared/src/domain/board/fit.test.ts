import { describe, expect, test } from 'vitest';
import { judgeMoves, lateMinutes } from './fit.ts';
import type { BoardFacts, PlannedVan, PlannedVisit } from './plan.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;

function aVisit(id: string, more: Partial<PlannedVisit> = {}): PlannedVisit {
  return {
    id,
    jobId: `job-${id}`,
    jobNumber: 1,
    stopId: `stop-${id}`,
    addressId: `address-${id}`,
    vanId: null,
    from: null,
    to: null,
    minutes: 60,
    progress: 'unplaced',
    customerName: `Customer ${id}`,
    place: { lat: 41, lng: -70 },
    windowFrom: null,
    windowTo: null,
    skills: [],
    equipment: [],
    bringsWater: false,
    bringsPower: false,
    ...more,
  };
}
const placed = (id: string, from: string, to: string, more: Partial<PlannedVisit> = {}) =>
  aVisit(id, { vanId: 'gannet', from: at(from), to: at(to), progress: 'placed', ...more });

function aVan(id: string, more: Partial<PlannedVan> = {}): PlannedVan {
  const person = {
    personId: `p-${id}`,
    name: 'Sefa',
    skills: ['correction'],
    isTrainee: false,
    from: at('11:30'),
    to: at('22:00'),
    weekMinutes: 600,
  };
  return { id, name: id === 'gannet' ? 'Gannet' : 'Plover', equipment: ['polisher'], crew: [person], ...more };
}

function facts(visits: PlannedVisit[], more: Partial<BoardFacts> = {}): BoardFacts {
  return {
    day: '2026-05-14',
    zone: 'America/New_York',
    clock: '12',
    dayStartsAt: '07:30',
    dayEndsAt: '18:00',
    isLocked: false,
    overtimeAfterMinutes: 2400,
    vans: [aVan('gannet'), aVan('plover')],
    visits,
    ...more,
  };
}
const judge = (board: BoardFacts, visit: PlannedVisit, from: string, to: string, vanId = 'gannet') =>
  judgeMoves(board, new Map([[visit.id, visit]]), [{ visitId: visit.id, vanId, from: at(from), to: at(to) }]);
const codes = (found: { code: string }[]) => found.map((finding) => finding.code);

describe('refusals', () => {
  test('one van at two stops, also when the plans only overlap by a minute', () => {
    const board = facts([placed('a', '14:00', '15:00')]);
    expect(codes(judge(board, aVisit('b'), '14:59', '16:00').refusals)).toEqual(['van_overlap']);
    expect(codes(judge(board, aVisit('b'), '15:00', '16:00').refusals)).toEqual([]);
  });
  test('visits at one stop run side by side; so do those dropped at one address', () => {
    const board = facts([placed('a', '14:00', '15:00', { stopId: 'lot', addressId: 'lot' })]);
    expect(judge(board, aVisit('b', { stopId: 'lot' }), '14:00', '15:00').refusals).toEqual([]);
    const dropped = judge(board, aVisit('c', { addressId: 'lot' }), '14:30', '15:30');
    expect(dropped.refusals).toEqual([]);
    expect(dropped.after.get('c')?.stopId).toBe('lot');
  });
  test('a called-off visit stands in nobody’s way', () => {
    const board = facts([placed('a', '14:00', '15:00', { progress: 'called_off' })]);
    expect(judge(board, aVisit('b'), '14:00', '15:00').refusals).toEqual([]);
  });
  test.each(['on_site', 'working', 'done', 'part_done', 'called_off'] as const)('%s stays where it is', (progress) => {
    const visit = placed('a', '14:00', '15:00', { progress });
    expect(codes(judge(facts([visit]), visit, '16:00', '17:00').refusals)).toEqual(['not_movable']);
  });
  test('a locked day, a van that is off the road, no time at all', () => {
    expect(codes(judge(facts([], { isLocked: true }), aVisit('b'), '14:00', '15:00').refusals)).toEqual(['locked_day']);
    expect(codes(judge(facts([]), aVisit('b'), '14:00', '15:00', 'knot').refusals)).toEqual(['no_van']);
    expect(codes(judge(facts([]), aVisit('b'), '14:00', '14:04').refusals)).toEqual(['bad_span']);
  });
  test('a swap in one list is judged as it will be, not as it is', () => {
    const a = placed('a', '14:00', '15:00');
    const b = placed('b', '14:00', '15:00', { vanId: 'plover' });
    const both = new Map([a, b].map((visit) => [visit.id, visit]));
    const swap = [
      { visitId: 'a', vanId: 'plover', from: a.from, to: a.to },
      { visitId: 'b', vanId: 'gannet', from: b.from, to: b.to },
    ];
    expect(judgeMoves(facts([a, b]), both, swap).refusals).toEqual([]);
  });
});

describe('warnings', () => {
  test('say that nobody brings the water or the power that the place lacks', () => {
    const visit = aVisit('b', { bringsWater: true, bringsPower: true });
    expect(codes(judge(facts([]), visit, '14:00', '15:00').warnings)).toEqual(['missing_water', 'missing_power']);
    const laden = aVan('gannet', { equipment: ['water_tank', 'generator'] });
    expect(codes(judge(facts([], { vans: [laden] }), visit, '14:00', '15:00').warnings)).toEqual([]);
  });

  test('say the skill and the tool that are missing; a trainee brings none', () => {
    const trainee = aVan('gannet', { crew: [{ ...aVan('gannet').crew[0]!, isTrainee: true }] });
    const visit = aVisit('b', { skills: ['correction'], equipment: ['extractor'] });
    expect(codes(judge(facts([], { vans: [trainee] }), visit, '14:00', '15:00').warnings)).toEqual([
      'missing_skill',
      'missing_equipment',
    ]);
    expect(codes(judge(facts([]), visit, '14:00', '15:00').warnings)).toEqual(['missing_equipment']);
  });
  test('outside the promise and outside the day', () => {
    const visit = aVisit('b', { windowFrom: at('13:00'), windowTo: at('14:00') });
    expect(codes(judge(facts([]), visit, '14:01', '15:00').warnings)).toEqual(['outside_window']);
    expect(codes(judge(facts([]), visit, '14:00', '15:00').warnings)).toEqual([]);
    expect(codes(judge(facts([]), aVisit('b'), '21:30', '22:30').warnings)).toContain('outside_hours');
  });
  test('a tight gap names both numbers and both neighbours', () => {
    const far = { lat: 41.1, lng: -70 };
    const board = facts([placed('a', '12:00', '13:00', { place: far }), placed('c', '14:10', '15:00', { place: far })]);
    const { warnings } = judge(board, aVisit('b'), '13:05', '14:00');
    expect(codes(warnings)).toEqual(['tight_gap', 'tight_gap']);
    expect(warnings[0]?.message).toMatch(/^\d+ min of travel needed, 5 there, from Customer a\.$/);
    expect(warnings[1]?.message).toMatch(/10 there, to Customer c\.$/);
  });
  test('overtime is a risk in hours, and not twice for a visit that is there already', () => {
    const busy = aVan('gannet', { crew: [{ ...aVan('gannet').crew[0]!, weekMinutes: 2390 }] });
    expect(codes(judge(facts([], { vans: [busy] }), aVisit('b'), '14:00', '15:00').warnings)).toEqual([
      'overtime_risk',
    ]);
    const there = placed('b', '14:00', '15:00');
    expect(codes(judge(facts([there], { vans: [busy] }), there, '15:00', '16:00').warnings)).toEqual([]);
  });
  test('nobody in the van then', () => {
    expect(
      codes(judge(facts([], { vans: [aVan('gannet', { crew: [] })] }), aVisit('b'), '14:00', '15:00').warnings),
    ).toEqual(['no_crew']);
  });
  test('keep their key while the facts stay the same', () => {
    const visit = aVisit('b', { equipment: ['extractor'] });
    const key = (from: string, to: string) => judge(facts([]), visit, from, to).warnings[0]?.key;
    expect(key('14:00', '15:00')).toBe(key('16:00', '17:00'));
  });
});

test('late counts from the planned start, or from the planned end once the crew is there', () => {
  const plan = { from: at('14:00'), to: at('15:00') };
  expect(lateMinutes({ ...plan, progress: 'placed' }, at('14:35'))).toBe(35);
  expect(lateMinutes({ ...plan, progress: 'working' }, at('14:35'))).toBe(0);
  expect(lateMinutes({ ...plan, progress: 'working' }, at('15:10'))).toBe(10);
  expect(lateMinutes({ ...plan, progress: 'done' }, at('18:00'))).toBe(0);
});
