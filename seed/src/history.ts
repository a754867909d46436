import { addDays } from '@driprail/shared/domain/time/zone';
import { FORGETFUL, isAway } from './away.ts';
import { instant, minuteOf, workDays } from './calendar.ts';
import type { Segment } from './clock-rows.ts';
import { ownTimes, segmentsOf, writeClock } from './clock-rows.ts';
import { writeDeskClock } from './desk-clock.ts';
import { driveDay } from './drive-day.ts';
import type { Book } from './job-rows.ts';
import type { ServiceName } from './menu.ts';
import type { DemoPeople } from './people.ts';
import type { PlannedStop, Rest, Rota } from './plan-day.ts';
import { planDay } from './plan-day.ts';
import { press, tellVisit } from './progress-rows.ts';
import { at, randomFor } from './random.ts';
import { recordStop } from './record-stop.ts';
import type { Random } from './random.ts';
import { writeTip } from './tip-rows.ts';
import type { DemoVan, VanDay } from './vans.ts';
import { crewsOn, writeCrews } from './vans.ts';

const LAST_END = minuteOf('15:30');
const UNCLOCKED = 'Wyn Abara';
const callOffReasons = ['Customer is ill', 'Car is at the body shop', 'Rain all day', 'Customer forgot'] as const;

interface Past {
  book: Book;
  people: DemoPeople;
  rota: Rota;
  /** Jobs that wait for their van's next day. */
  rests: Map<string, Rest>;
}

/** Twelve weeks of finished days, and this week up to yesterday. */
export function writeHistory(book: Book, people: DemoPeople, vans: readonly DemoVan[], rota: Rota): void {
  const past: Past = { book, people, rota, rests: new Map() };
  const { firstWeek, today } = book.calendar;
  for (const day of workDays(firstWeek, today)) {
    const vanDays = crewsOn(day, vans, people.technicians, (person) => isAway(person, day, book.calendar));
    writeCrews(book.rows, book.ids, day, vanDays);
    for (const vanDay of vanDays) if (vanDay.crew.length > 0) writeVanDay(past, day, vanDay);
    writeDeskClock(book, day, people.dispatchers);
  }
}

function writeVanDay({ book, people, rota, rests }: Past, day: string, vanDay: VanDay): void {
  const { van, crew } = vanDay;
  const random = randomFor(`${day} ${van.name}`);
  const rest = rests.get(van.id) ?? null;
  rests.delete(van.id);
  const planned = planDay({ day, vanDay, menu: book.menu, rota, random, until: LAST_END, rest });
  const stops = [...planned];
  const dropped = stops.length > 2 && random.chance(0.06) ? stops.pop() : undefined;
  const driven = driveDay(stops, random);
  const visits = stops.map((stop, index) => {
    const leaves = index === stops.length - 1 && leavesRest(book, day, van);
    const { ordered, visit, lines } = recordStop(book, day, van, leaves ? withExtra(stop) : stop, random);
    const left = leaves ? lines.slice(-1) : [];
    const times = at(driven.visits, index);
    const reason = 'Rain set in, this needs a dry day';
    tellVisit(book, {
      ...{ day, visit, lines, crew, times },
      left: leaves ? { lineIds: left.map((line) => line.id), reason } : undefined,
    });
    if (leaves) rests.set(van.id, { customer: stop.customer, job: ordered, lines: left });
    else writeTip(book, ordered, instant(day, times.end + 3), at(crew, 0), random);
    return visit;
  });
  if (dropped) callOff(book, day, van, dropped, people, random);
  const segments = segmentsOf(
    driven,
    visits.map((visit) => visit.id),
  );
  for (const person of crew) {
    const own = ownTimes(segments, random.int(0, 5), random.int(0, 6));
    writeClock(book, day, person, asKept(own, person.name, day, book));
  }
}

/** Two jobs of the past weeks were left part done. */
function leavesRest({ calendar }: Book, day: string, van: DemoVan): boolean {
  const isIt = (weeksAgo: number, weekday: number, name: string) =>
    day === addDays(calendar.thisWeek, weekday - 1 - 7 * weeksAgo) && van.name === name;
  return isIt(5, 2, 'Plover') || isIt(2, 3, 'Dunlin');
}

/** One more service on the car, the one that will be left. */
function withExtra(stop: PlannedStop): PlannedStop {
  const taken = new Set<ServiceName>(stop.items.map((item) => item.service));
  const extra: ServiceName = taken.has('Clay lube decontamination') ? 'Engine bay' : 'Clay lube decontamination';
  return { ...stop, items: [...stop.items, { vehicle: at(stop.items, 0).vehicle, service: extra }] };
}

function callOff(
  book: Book,
  day: string,
  van: DemoVan,
  stop: PlannedStop,
  { dispatchers }: DemoPeople,
  random: Random,
): void {
  const { ordered, visit } = recordStop(book, day, van, stop, random);
  const reason = random.pick(callOffReasons);
  press(book, visit, 'call_off', instant(day, random.int(7 * 60 + 35, 9 * 60)), random.pick(dispatchers), reason);
  ordered.job.calledOffReason = reason;
}

/** The last past week leaves two things to settle: a forgotten clock-out, and a job done without clock time. */
function asKept(segments: Segment[], name: string, day: string, { calendar }: Book): Segment[] {
  if (name === FORGETFUL && day === calendar.forgottenOn) {
    const home = segments.findLastIndex((segment) => segment.kind === 'travel');
    return segments
      .slice(0, home + 1)
      .map((segment, index) => (index === home ? { ...segment, to: Infinity } : segment));
  }
  if (name === UNCLOCKED && day === addDays(calendar.thisWeek, -3)) {
    const lastVisit = segments.findLast((segment) => segment.kind === 'job')?.visitId;
    const unseen = segments.findIndex((segment) => segment.visitId === lastVisit);
    return segments.slice(0, unseen);
  }
  return segments;
}
