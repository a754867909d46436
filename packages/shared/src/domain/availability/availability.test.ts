import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeMoves } from '../board/fit.ts';
import type { BoardFacts, PlannedVisit } from '../board/plan.ts';
import { addMinutes } from '../time/zone.ts';
import { findPlace } from './find-place.ts';
import { keepPromises, openWindows } from './open-windows.ts';
import type { BusySpan, FreeVan, WantedWork } from './plan.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
/** 07:30 to 18:00 in New York, four hours behind in May. */
const hours = { from: at('11:30'), to: at('22:00') };
const home = { lat: 41, lng: -70 };
const work: WantedWork = {
  ...{ lineMinutes: [60], skills: [], equipment: [], bringsWater: false, bringsPower: false, place: home },
};
const person = { from: at('11:30'), to: at('22:00'), skills: ['correction'], isTrainee: false };
const aVan = (more: Partial<FreeVan> = {}): FreeVan => ({
  id: 'gannet',
  equipment: [],
  crew: [person],
  busy: [],
  ...more,
});
const morning = { from: at('12:00'), to: at('14:00') };

describe('a place in a window', () => {
  it('starts as early as the window does, and lasts as the crew is quick', () => {
    expect(findPlace([aVan()], work, morning, hours)).toMatchObject({ from: at('12:00'), to: at('13:00') });
    // Two pairs of hands: 0.6 of one person's time, in steps of five.
    const two = aVan({ crew: [person, person] });
    expect(findPlace([two], work, morning, hours)?.to).toBe(at('12:40'));
    const learner = aVan({ crew: [person, { ...person, isTrainee: true }] });
    expect(findPlace([learner], work, morning, hours)?.to).toBe(at('13:00'));
  });
  it('leaves the drive before and after', () => {
    const far = { lat: 41.1, lng: -70 };
    const busy = [
      { from: at('11:30'), to: at('12:30'), place: far },
      { from: at('14:25'), to: at('15:00'), place: home },
    ];
    // 14.46 road kilometers at 38 an hour and 4 minutes to pack: 27 minutes, on the next five.
    expect(findPlace([aVan({ busy })], work, morning, hours)).toMatchObject({ from: at('13:00'), to: at('14:00') });
    expect(findPlace([aVan({ busy })], { ...work, lineMinutes: [90] }, morning, hours)).toBeNull();
  });
  it('asks for skill, equipment, water and power', () => {
    const polish = { ...work, skills: ['correction'], equipment: ['polisher'] };
    expect(findPlace([aVan()], polish, morning, hours)).toBeNull();
    expect(findPlace([aVan({ equipment: ['polisher'] })], polish, morning, hours)).not.toBeNull();
    const learner = [
      { ...person, isTrainee: true },
      { ...person, skills: [] },
    ];
    expect(findPlace([aVan({ equipment: ['polisher'], crew: learner })], polish, morning, hours)).toBeNull();
    expect(findPlace([aVan()], { ...work, bringsWater: true }, morning, hours)).toBeNull();
    expect(
      findPlace([aVan({ equipment: ['water_tank'] })], { ...work, bringsWater: true }, morning, hours),
    ).not.toBeNull();
    expect(findPlace([aVan({ equipment: ['water_tank'] })], { ...work, bringsPower: true }, morning, hours)).toBeNull();
  });
  it('takes no van without a crew, and nothing past the day’s end or the crew’s', () => {
    expect(findPlace([aVan({ crew: [] })], work, morning, hours)).toBeNull();
    expect(findPlace([aVan()], work, { from: at('21:30'), to: at('23:00') }, hours)).toBeNull();
    expect(findPlace([aVan({ crew: [{ ...person, to: at('12:30') }] })], work, morning, hours)).toBeNull();
  });
  it('chooses the van with the least driving on top', () => {
    const near = aVan({ id: 'plover', busy: [{ from: at('14:30'), to: at('15:00'), place: home }] });
    const far = aVan({ busy: [{ from: at('14:30'), to: at('15:00'), place: { lat: 41.05, lng: -70 } }] });
    expect(findPlace([far, near], work, morning, hours)?.vanId).toBe('plover');
  });
});

it('a promise on Unplaced takes the last place', () => {
  const noon = { from: at('16:00'), to: at('16:00') };
  const vans = keepPromises([aVan()], [{ ...work, window: noon }], () => hours);
  expect(openWindows([aVan()], work, [noon], hours)[0]?.place).not.toBeNull();
  expect(openWindows(vans, work, [noon], hours)[0]?.place).toBeNull();
  expect(openWindows(vans, work, [morning], hours)[0]?.place).not.toBeNull();
});

const place = fc.option(fc.record({ lat: fc.double({ min: 40.9, max: 41.1, noNaN: true }), lng: fc.constant(-70) }));
const minute = fc.integer({ min: 0, max: 126 }).map((step) => addMinutes(hours.from, step * 5));
const span = (longest: number) =>
  fc
    .tuple(minute, fc.integer({ min: 1, max: longest }))
    .map(([from, steps]) => ({ from, to: addMinutes(from, steps * 5) }));
const skills = fc.subarray(['correction', 'interior']);
const tools = fc.subarray(['polisher', 'water_tank', 'generator']);
const vanOf = (id: string) =>
  fc.record({
    id: fc.constant(id),
    equipment: tools,
    crew: fc.array(
      fc.tuple(span(120), skills, fc.boolean()).map(([s, list, isTrainee]) => ({ ...s, skills: list, isTrainee })),
      { maxLength: 3 },
    ),
    busy: fc
      .array(
        fc.tuple(span(18), place).map(([s, there]) => ({ ...s, place: there })),
        { maxLength: 4 },
      )
      .map(apart),
  });
const wanted = fc.record({
  lineMinutes: fc.array(fc.integer({ min: 5, max: 120 }), { minLength: 1, maxLength: 3 }),
  ...{ skills, equipment: fc.subarray(['polisher']), bringsWater: fc.boolean(), bringsPower: fc.boolean(), place },
});

it('what is offered the board takes, without a refusal and without a warning but overtime’s', () => {
  let offered = 0;
  fc.assert(
    fc.property(fc.tuple(vanOf('gannet'), vanOf('plover')), wanted, minute, (vans, asked, from) => {
      const found = findPlace(vans, asked, { from, to: addMinutes(from, 120) }, hours);
      if (!found) return;
      offered += 1;
      const visit = aVisit('asked', asked);
      const board = boardOf(vans);
      const window = { windowFrom: from, windowTo: addMinutes(from, 120) };
      const judged = judgeMoves(board, new Map([['asked', { ...visit, ...window }]]), [{ visitId: 'asked', ...found }]);
      expect(judged.refusals).toEqual([]);
      expect(judged.warnings.filter(({ code }) => code !== 'overtime_risk')).toEqual([]);
    }),
    { numRuns: 2000 },
  );
  expect(offered).toBeGreaterThan(100);
});

/** A van's own day has no two stops at once. */
function apart(stops: BusySpan[]): BusySpan[] {
  const sorted = stops.toSorted((a, b) => Date.parse(a.from) - Date.parse(b.from));
  return sorted.filter((stop, index) => sorted.slice(0, index).every((other) => other.to <= stop.from));
}

function aVisit(
  id: string,
  { skills: asked, equipment, bringsWater, bringsPower, place: there }: WantedWork,
): PlannedVisit {
  return {
    ...{ id, jobId: id, jobNumber: 1, stopId: id, addressId: id, vanId: null, from: null, to: null, minutes: 60 },
    ...{ progress: 'unplaced', customerName: id, place: there, windowFrom: null, windowTo: null },
    ...{ skills: [...asked], equipment: [...equipment], bringsWater, bringsPower },
  };
}

function boardOf(vans: FreeVan[]): BoardFacts {
  return {
    ...{ day: '2026-05-14', zone: 'America/New_York', clock: '12', dayStartsAt: '07:30', dayEndsAt: '18:00' },
    ...{ isLocked: false, overtimeAfterMinutes: 2400 },
    vans: vans.map(({ id, equipment, crew }) => ({
      ...{ id, name: id, equipment: [...equipment] },
      crew: crew.map((one, index) => ({
        ...one,
        personId: `${id}${index}`,
        name: 'Sefa',
        skills: [...one.skills],
        weekMinutes: 0,
      })),
    })),
    visits: vans.flatMap(({ id, busy }) =>
      busy.map((stop, index) => ({
        ...aVisit(`${id}${index}`, { ...work, place: stop.place }),
        ...{ vanId: id, from: stop.from, to: stop.to, progress: 'placed' as const },
      })),
    ),
  };
}
