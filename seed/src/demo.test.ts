import { beforeAll, describe, expect, test } from 'vitest';
import { validate, version } from 'uuid';
import { addDays, dayOf, weekdayOf } from '@driprail/shared/domain/time/zone';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import { lackingIn } from '@driprail/shared/domain/walk-round/lacking';
import { placeAt } from '@driprail/shared/domain/walk-round/places';
import { buildDemo } from './build-demo.ts';
import type { Demo } from './build-demo.ts';
import { ZONE, nextWorkDays } from './calendar.ts';
import { at } from './random.ts';
import type { DemoRows } from './rows.ts';

type Visit = DemoRows['visits'][number];

const from = (visit: Visit): number => instantOf(visit.planned?.[0]);
const to = (visit: Visit): number => instantOf(visit.planned?.[1]);
const dayOfVisit = (visit: Visit) => dayOf(new Date(from(visit)).toISOString(), ZONE);

function instantOf(bound: unknown): number {
  if (!(bound instanceof Date)) throw new Error('the visit has no planned time');
  return bound.getTime();
}

function groupBy<T>(items: readonly T[], keyOf: (item: T) => string): T[][] {
  const groups = new Map<string, T[]>();
  for (const item of items) groups.set(keyOf(item), [...(groups.get(keyOf(item)) ?? []), item]);
  return [...groups.values()];
}

test('the same day gives the same rows, whatever the hour', () => {
  const morning = buildDemo(new Date('2026-05-14T12:00:00Z'));
  const evening = buildDemo(new Date('2026-05-14T23:00:00Z'));
  expect(evening).toEqual(morning);
  expect(morning.calendar.asOf.toISOString()).toBe('2026-05-14T15:00:00.000Z');
});

describe.each([
  ['a Thursday', '2026-05-14'],
  ['the Monday after the spring change', '2026-03-09'],
  ['the Monday after the autumn change', '2026-11-02'],
  ['a Sunday', '2026-06-21'],
  ['a Saturday', '2026-08-29'],
  ['New Year’s Day', '2027-01-01'],
])('%s, %s', (_name, day) => {
  let demo: Demo;
  let rows: DemoRows;
  beforeAll(() => {
    demo = buildDemo(new Date(`${day}T16:00:00Z`));
    rows = demo.rows;
  });

  test('has the size that the scenario names', () => {
    expect(rows.vans).toHaveLength(6);
    expect(rows.customers).toHaveLength(180);
    expect(rows.services).toHaveLength(14);
    expect(rows.payWeeks).toHaveLength(12);
    expect(rows.users.map((user) => user.role).sort()).toEqual([
      ...Array<string>(2).fill('dispatcher'),
      'owner',
      ...Array<string>(12).fill('technician'),
    ]);
    const pastDays = new Set(
      rows.visits.filter((v) => v.planned && dayOfVisit(v) < demo.calendar.thisWeek).map(dayOfVisit),
    );
    expect(pastDays.size).toBe(12 * 6);
    expect(rows.jobs.length).toBeGreaterThan(1500);
  });

  test('no van is at two stops at once', () => {
    const placed = rows.visits.filter((visit) => visit.planned && visit.progress !== 'called_off');
    for (const visits of groupBy(placed, (visit) => `${visit.vanId} ${dayOfVisit(visit)}`)) {
      const clash = visits.find((a) => visits.some((b) => a.stopId !== b.stopId && from(a) < to(b) && from(b) < to(a)));
      expect(clash).toBeUndefined();
    }
  });

  test('nobody rides in two vans at once, and every crew can do what its van is given', () => {
    for (const spans of groupBy(rows.vanCrew, (ride) => ride.personId)) {
      const sorted = spans.map((ride) => ride.span.map(instantOf)).sort((a, b) => at(a, 0) - at(b, 0));
      for (const [index, next] of sorted.slice(1).entries())
        expect(at(next, 0)).toBeGreaterThanOrEqual(at(at(sorted, index), 1));
    }
    const lines = new Map(rows.jobLines.map((line) => [line.id, line]));
    const linesOf = new Map(
      groupBy(rows.visitLines, (link) => link.visitId).map((links) => [at(links, 0).visitId, links]),
    );
    const ridesOf = new Map(
      groupBy(rows.vanCrew, (ride) => `${ride.vanId} ${instantOf(ride.span[0])}`).map((rides) => [
        `${at(rides, 0).vanId} ${dayOf(new Date(instantOf(at(rides, 0).span[0])).toISOString(), ZONE)}`,
        rides.map((ride) => rows.people.find((person) => person.id === ride.personId)),
      ]),
    );
    for (const visit of rows.visits.filter((one) => one.planned)) {
      const crew = ridesOf.get(`${visit.vanId} ${dayOfVisit(visit)}`)?.filter((person) => !person?.isTrainee) ?? [];
      const known = crew.flatMap((person) => person?.skills ?? []);
      const carried = rows.vans.find((van) => van.id === visit.vanId)?.equipment ?? [];
      expect(crew.length).toBeGreaterThan(0);
      for (const link of linesOf.get(visit.id) ?? []) {
        const service = rows.services.find((one) => one.id === lines.get(link.jobLineId)?.serviceId);
        expect(known).toEqual(expect.arrayContaining(service?.skills ?? []));
        expect(carried).toEqual(expect.arrayContaining(service?.equipment ?? []));
      }
    }
  });

  test('clock entries follow one another; two people have one open too many at most', () => {
    for (const entries of groupBy(rows.clockEntries, (entry) => entry.personId)) {
      const sorted = [...entries].sort((a, b) => a.startedAt.getTime() - b.startedAt.getTime());
      for (const [index, entry] of sorted.entries()) {
        const isOpen = !entry.endedAt;
        if (isOpen) expect(index).toBe(sorted.length - 1);
        else expect(entry.endedAt?.getTime()).toBeGreaterThan(entry.startedAt.getTime());
        const next = sorted[index + 1];
        if (next) expect(next.startedAt.getTime()).toBeGreaterThanOrEqual(entry.endedAt?.getTime() ?? Infinity);
      }
    }
    const stale = rows.clockEntries.filter(
      (entry) => !entry.endedAt && dayOf(entry.startedAt.toISOString(), ZONE) < demo.calendar.today,
    );
    expect(stale.map((entry) => dayOf(entry.startedAt.toISOString(), ZONE))).toEqual([demo.calendar.forgottenOn]);
    expect(weekdayOf(demo.calendar.forgottenOn)).toBe(3);
  });

  test('one person worked on one finished visit of the last week without clock time', () => {
    const clocked = new Set(rows.clockEntries.map((entry) => `${entry.visitId} ${entry.personId}`));
    const ended = new Map(rows.visits.filter((v) => v.progress === 'done').map((v) => [v.id, v]));
    const missing = rows.visitCrew.filter(
      ({ visitId, personId }) => ended.has(visitId) && !clocked.has(`${visitId} ${personId}`),
    );
    expect(missing.map(({ visitId }) => dayOfVisit(ended.get(visitId) as Visit))).toEqual([
      addDays(demo.calendar.thisWeek, -3),
    ]);
  });

  test('nothing has happened after 11:00 and nothing past is still open', () => {
    const { asOf, today } = demo.calendar;
    for (const event of rows.visitEvents) expect(event.occurredAt.getTime()).toBeLessThanOrEqual(asOf.getTime());
    for (const job of rows.jobs) expect(job.createdAt.getTime()).toBeLessThan(asOf.getTime());
    const past = rows.visits.filter((visit) => visit.planned && dayOfVisit(visit) < today);
    expect(new Set(past.map((visit) => visit.progress))).toEqual(new Set(['done', 'part_done', 'called_off']));
    const unfinished = rows.jobLines.filter((line) => !line.finishedAt).map((line) => line.jobId);
    const doneJobs = past.filter((visit) => visit.progress === 'done').map((visit) => visit.jobId);
    expect(doneJobs.filter((jobId) => unfinished.includes(jobId))).toEqual([]);
  });

  test('today’s board shows each state, one tight gap and one open trouble', () => {
    const { today } = demo.calendar;
    const board = rows.visits.filter((visit) => visit.planned && dayOfVisit(visit) === today);
    const count = (progress: string) => board.filter((visit) => visit.progress === progress).length;
    expect(['done', 'working', 'on_site', 'on_the_way', 'called_off', 'placed'].map(count)).toEqual([
      7, 2, 1, 1, 1, 12,
    ]);
    expect(rows.visits.filter((visit) => visit.progress === 'unplaced')).toHaveLength(4);
    expect(rows.visitEvents.filter((event) => event.kind === 'trouble')).toHaveLength(1);
    expect(
      board.filter((visit) => visit.progress === 'placed' && from(visit) < demo.calendar.asOf.getTime()),
    ).toHaveLength(1);
    const place = (visit: Visit) => {
      const address = rows.addresses.find(
        (one) => one.id === rows.stops.find((stop) => stop.id === visit.stopId)?.addressId,
      );
      return { lat: address?.lat ?? 0, lng: address?.lng ?? 0 };
    };
    const tight = groupBy(board, (visit) => visit.vanId ?? '').flatMap((visits) =>
      visits
        .sort((a, b) => from(a) - from(b))
        .slice(1)
        .filter((visit, index) => {
          const before = at(visits, index);
          return estimateTravel(place(before), place(visit)).minutes > (from(visit) - to(before)) / 60_000;
        }),
    );
    expect(tight).toHaveLength(1);
  });

  test('tomorrow two visits stand side by side at one stop', () => {
    const [tomorrow] = nextWorkDays(demo.calendar.today, 1);
    const visits = rows.visits.filter((visit) => visit.planned && dayOfVisit(visit) === tomorrow);
    const pairs = groupBy(visits, (visit) => visit.stopId).filter((group) => group.length > 1);
    expect(pairs.map((group) => group.length)).toEqual([2]);
    expect(new Set(at(pairs, 0).map((visit) => `${visit.vanId} ${from(visit)}`)).size).toBe(1);
  });

  test('crews of the last week walked round the car before work, and each mark lies where its words say', () => {
    const starts = rows.visitEvents.filter(({ kind }) => kind === 'start_work');
    const week = starts.filter(
      ({ occurredAt }) => occurredAt.getTime() > demo.calendar.asOf.getTime() - 7 * 86_400_000,
    );
    const walked = new Map(rows.walkRounds.map((round) => [round.visitId, round]));
    expect(week.filter(({ visitId, reason }) => (reason === '') !== walked.has(visitId))).toEqual([]);
    for (const round of rows.walkRounds) {
      const start = starts.find(({ visitId }) => visitId === round.visitId);
      expect(round.occurredAt.getTime()).toBeLessThan(start?.occurredAt.getTime() ?? 0);
      const facts = { paint: null, interior: null, hasItems: null, mayMove: null, initials: null, ...round };
      expect(lackingIn({ missingReason: '', absentReason: '', photoViews: [], ...facts }, 'quick')).toEqual({});
    }
    expect(rows.walkMarks.filter(({ x, y, place }) => placeAt(x, y) !== place)).toEqual([]);
  });

  test('a car that came again has the marks of last time answered', () => {
    const marks = new Map(rows.walkMarks.map((mark) => [mark.id, mark]));
    const carried = rows.walkMarks.filter((mark) => mark.carriedFrom);
    expect(carried.length).toBeGreaterThan(0);
    for (const mark of carried) {
      const last = marks.get(mark.carriedFrom ?? '');
      expect(last).toMatchObject({ vehicleId: mark.vehicleId, place: mark.place, kind: mark.kind });
      expect(last?.occurredAt.getTime()).toBeLessThan(mark.occurredAt.getTime());
    }
  });

  test('planned starts keep the promise', () => {
    const jobs = new Map(rows.jobs.map((job) => [job.id, job]));
    for (const visit of rows.visits.filter((one) => one.planned && one.part === 1)) {
      const job = jobs.get(visit.jobId);
      expect(from(visit)).toBeGreaterThanOrEqual(job?.windowFrom?.getTime() ?? Infinity);
      expect(from(visit)).toBeLessThanOrEqual(job?.windowTo?.getTime() ?? 0);
    }
  });

  test('ids are uuids of version 7, each there once', () => {
    const ids = Object.values(rows).flatMap((table: object[]) =>
      table.flatMap((row) => ('id' in row && typeof row.id === 'string' ? [row.id] : [])),
    );
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids.filter((id) => !validate(id) || version(id) !== 7)).toEqual([]);
  });
});

test('names, phones and addresses point to nobody', () => {
  const { rows } = buildDemo(new Date('2026-05-14T16:00:00Z'));
  const phones = [...rows.people, ...rows.customers, ...rows.settings].map((row) => row.phone);
  expect(phones.filter((phone) => !/^(?:(?:\(555\) )?555-01\d\d)?$/.test(phone ?? ''))).toEqual([]);
  const mails = [...rows.users, ...rows.customers].map((row) => row.email ?? '');
  expect(mails.filter((mail) => mail !== '' && !mail.endsWith('.example'))).toEqual([]);
  expect(new Set(rows.customers.map((customer) => customer.name)).size).toBe(rows.customers.length);
  expect(new Set(rows.vehicles.map((vehicle) => vehicle.plate)).size).toBe(rows.vehicles.length);
  const brands =
    /\b(ford|honda|toyota|tesla|chevrolet|chevy|bmw|audi|jeep|kia|mazda|nissan|subaru|volvo|porsche|meguiar|chemical guys|turtle wax)\b/i;
  const words = [rows.vehicles, rows.services, rows.customers, rows.addresses, rows.vans].map((table) =>
    JSON.stringify(table),
  );
  expect(words.filter((text) => brands.test(text))).toEqual([]);
});
