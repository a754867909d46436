import { absentReasons, conditions } from '@driprail/shared/domain/walk-round/condition';
import { bodyOf } from '@driprail/shared/domain/walk-round/body';
import type { Mark, MarkAnswer } from '@driprail/shared/domain/walk-round/marks';
import { carry, marksToAsk } from '@driprail/shared/domain/walk-round/marks';
import { middleOf } from '@driprail/shared/domain/walk-round/places';
import type { Book } from './job-rows.ts';
import { at, randomFor } from './random.ts';
import type { Random } from './random.ts';
import type { DemoRows } from './rows.ts';
import { FLEET_SKIP, NO_PHOTOS, leftItems, seenMarks } from './walk-words.ts';

type Press = DemoRows['visitEvents'][number];

const DAY_MS = 86_400_000;
/** Every visit that began since then has its walk-rounds, and so has the time before of its cars. */
const SINCE_DAYS = 7;
/** From the start of work to the look after the wash. */
const LOOK_AFTER_MS = 25 * 60_000;
const MINUTE_MS = 60_000;

interface Walks {
  book: Book;
  carsOf: Map<string, string[]>;
  /** By car, as its last walk-round left them. */
  marksOf: Map<string, Mark[]>;
}

/**
 * Walk-rounds of the visits that began in the last days, and of the time before where such a car came again. A company’s
 * cars are known: work begins without one, and it is said why.
 */
export function writeWalkRounds(book: Book): void {
  const { rows, calendar } = book;
  const walks: Walks = { book, carsOf: carsByVisit(rows), marksOf: new Map() };
  const companies = companyVisits(rows);
  const since = calendar.asOf.getTime() - SINCE_DAYS * DAY_MS;
  const starts = rows.visitEvents
    .filter(({ kind }) => kind === 'start_work')
    .sort((a, b) => a.occurredAt.getTime() - b.occurredAt.getTime());
  const recent = starts.filter(({ occurredAt }) => occurredAt.getTime() >= since);
  const told = new Set([...recent, ...recent.flatMap((start) => timeBefore(walks, starts, start))]);
  for (const start of starts.filter((one) => told.has(one))) {
    if (companies.has(start.visitId)) start.reason = FLEET_SKIP;
    else for (const vehicleId of walks.carsOf.get(start.visitId) ?? []) writeWalkRound(walks, start, vehicleId);
  }
  const working = rows.visits.filter((visit) => visit.progress === 'working').map(({ id }) => id);
  const dirty = rows.walkRounds.findLast(({ visitId }) => working.includes(visitId));
  if (dirty) lookAgain(book, dirty, recent);
}

function carsByVisit({ visitLines, jobLines }: DemoRows): Map<string, string[]> {
  const vehicleOf = new Map(jobLines.map((line) => [line.id, line.vehicleId]));
  const cars = new Map<string, string[]>();
  for (const { visitId, jobLineId } of visitLines) {
    const vehicleId = vehicleOf.get(jobLineId);
    const known = cars.get(visitId) ?? [];
    if (vehicleId && !known.includes(vehicleId)) cars.set(visitId, [...known, vehicleId]);
  }
  return cars;
}

function companyVisits({ visits, jobs, customers }: DemoRows): Set<string> {
  const companies = new Set(customers.filter(({ isCompany }) => isCompany).map(({ id }) => id));
  const theirs = new Set(jobs.filter(({ customerId }) => companies.has(customerId)).map(({ id }) => id));
  return new Set(visits.filter(({ jobId }) => theirs.has(jobId)).map(({ id }) => id));
}

/** The last visit before this one of each of its cars. */
function timeBefore({ carsOf }: Walks, starts: Press[], start: Press): Press[] {
  const earlier = starts.slice(0, starts.indexOf(start));
  return (carsOf.get(start.visitId) ?? []).flatMap((vehicleId) => {
    return earlier.findLast(({ visitId }) => carsOf.get(visitId)?.includes(vehicleId)) ?? [];
  });
}

function writeWalkRound(walks: Walks, start: Press, vehicleId: string): void {
  const { rows, ids, calendar } = walks.book;
  const { visitId, userId } = start;
  const vehicle = rows.vehicles.find(({ id }) => id === vehicleId);
  if (!vehicle || !userId) throw new Error('the visit names a car or a person that is not there');
  const random = randomFor(`walk-round ${vehicleId} ${start.occurredAt.toISOString()}`);
  const when = new Date(start.occurredAt.getTime() - MINUTE_MS);
  const stamps = { userId, receivedAt: when, occurredAt: when };
  const hasItems = random.chance(0.2);
  const isSigned = random.chance(0.6);
  const daysSinceRules = Math.floor((when.getTime() - Date.parse(calendar.rulesFrom)) / DAY_MS);
  rows.walkRounds.push({
    ...{ id: ids(), visitId, vehicleId, body: bodyOf(vehicle.sizeClass, vehicle.label) },
    ...{ paint: condition(random), interior: condition(random), odometer: milesOf(vehicleId) + 29 * daysSinceRules },
    ...{ hasItems, itemsNote: hasItems ? random.pick(leftItems) : '', mayMove: random.chance(0.9) },
    isTooDirty: false,
    ...{ missingReason: NO_PHOTOS, photoViews: [] },
    ...(isSigned
      ? { initials: pen(random), absentReason: '' }
      : { initials: null, absentReason: random.pick(absentReasons.slice(0, 3)) }),
    ...{ ...stamps, deviceAt: when },
  });
  const marks = marksOn(walks, vehicleId, random);
  walks.marksOf.set(vehicleId, marks);
  for (const [position, mark] of marks.entries())
    rows.walkMarks.push({ ...mark, visitId, vehicleId, position, ...stamps });
}

/** Mostly good. */
function condition(random: Random) {
  return random.chance(0.6) ? conditions[0] : random.chance(0.8) ? conditions[1] : conditions[2];
}

/** What the odometer stood at when the demo's rules began. */
function milesOf(vehicleId: string): number {
  return randomFor(`odometer ${vehicleId}`).int(6_000, 88_000);
}

/** Those of last time, each answered, and what is new; one car in three has none. */
function marksOn({ book, marksOf }: Walks, vehicleId: string, random: Random): Mark[] {
  const last = marksToAsk(marksOf.get(vehicleId) ?? []);
  const answers: readonly MarkAnswer[] = ['still_there', 'worse', 'gone'];
  const carried = last.map((mark, index) => carry(mark, book.ids(), at(answers, index % answers.length)));
  const isNew = seenMarks.filter(({ place }) => !last.some((mark) => mark.place === place));
  const first = random.int(0, isNew.length - 1);
  const count = last.length > 0 ? 1 : random.pick([0, 1, 2, 2, 3, 0]);
  const fresh = Array.from({ length: count }, (_, index): Mark => {
    const { note = '', ...seen } = at(isNew, (first + 5 * index) % isNew.length);
    const middle = middleOf(seen.place);
    if (!middle) throw new Error(`${seen.place} is not on the outline`);
    const [x, y] = [middle.x + random.int(-15, 15), middle.y + random.int(-15, 15)];
    return { id: book.ids(), x, y, ...seen, note, carriedFrom: null, answer: null };
  });
  return [...carried, ...fresh];
}

/** Two strokes on the pad of 300 by 100. */
function pen(random: Random): number[][] {
  const stroke = (from: number, turns: number) =>
    Array.from({ length: 14 }, (_, step) => [
      from + step * 6,
      50 + Math.round(30 * Math.sin((step / 13) * turns * Math.PI)) + random.int(-4, 4),
    ]).flat();
  return [stroke(50, random.int(2, 3)), stroke(160, random.int(3, 4))];
}

/** One car came too dirty to see its paint; the crew looked again after the wash. */
function lookAgain({ rows, ids }: Book, round: DemoRows['walkRounds'][number], starts: Press[]): void {
  const start = starts.find(({ visitId }) => visitId === round.visitId);
  if (!start) throw new Error('the visit has begun');
  round.isTooDirty = true;
  const when = new Date(start.occurredAt.getTime() + LOOK_AFTER_MS);
  rows.walkLooks.push({
    ...{ id: ids(), visitId: round.visitId, vehicleId: round.vehicleId ?? null, outcome: 'nothing_new' },
    ...{ userId: round.userId, deviceAt: when, receivedAt: when, occurredAt: when },
  });
}
