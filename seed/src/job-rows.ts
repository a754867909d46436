import { formatDay } from '@driprail/shared/domain/time/format';
import { clockOf } from '@driprail/shared/domain/time/zone';
import type { Calendar } from './calendar.ts';
import { ZONE, instant, minuteOf } from './calendar.ts';
import type { DemoCustomer } from './customers.ts';
import type { Menu } from './menu.ts';
import { onMenu } from './menu.ts';
import type { PlannedItem } from './offers.ts';
import type { Random } from './random.ts';
import type { DemoRows } from './rows.ts';
import type { DemoVan } from './vans.ts';

/** What every writer of rows needs. */
export interface Book {
  rows: DemoRows;
  ids: () => string;
  calendar: Calendar;
  menu: Menu;
  /** Takes the booking; the two dispatchers by turns. */
  bookedBy: (random: Random) => string;
}

type JobRow = DemoRows['jobs'][number];
export type LineRow = DemoRows['jobLines'][number];
type EventRow = DemoRows['visitEvents'][number];
export type VisitRow = DemoRows['visits'][number];

export interface OrderedJob {
  job: JobRow;
  lines: LineRow[];
  totalCents: number;
  parts: number;
}

export interface Order {
  customer: DemoCustomer;
  items: PlannedItem[];
  /** The arrival window promised. */
  window: { from: Date; to: Date };
  createdAt: Date;
  random: Random;
}

const DAY_STARTS = minuteOf('07:30');
const discountReasons = [
  'Second car at the same stop',
  'Neighbor’s referral',
  'We moved the day',
  'Tenth visit',
] as const;
const notes = [
  'Call ten minutes before.',
  'Owner leaves at noon.',
  'Car is in the garage.',
  'Sand from the beach.',
] as const;

/** Writes a job and its lines at the menu's prices. */
export function orderJob(book: Book, { customer, items, window, createdAt, random }: Order): OrderedJob {
  const { rows, ids, menu } = book;
  const id = ids();
  const lines = items.map(({ vehicle, service }, position): LineRow => {
    const entry = onMenu(menu, service);
    const price = entry.prices[vehicle.sizeClass];
    if (!price) throw new RangeError(`${service} is not sold for ${vehicle.sizeClass}`);
    const { priceCents, minutes } = price;
    const { sizeClass } = vehicle;
    return {
      ...{ id: ids(), jobId: id, serviceId: entry.id, vehicleId: vehicle.id, sizeClass, priceCents, minutes, position },
      ...{ finishedVisitId: null, finishedAt: null },
    };
  });
  const totalCents = lines.reduce((sum, line) => sum + line.priceCents, 0);
  const isReduced = random.chance(items.length > 1 ? 0.12 : 0.04);
  const job: JobRow = {
    id,
    customerId: customer.id,
    addressId: customer.addressId,
    windowFrom: window.from,
    windowTo: window.to,
    notes: random.chance(0.14) ? random.pick(notes) : '',
    discountCents: isReduced ? random.pick([1000, 1500, 2000]) : 0,
    discountReason: isReduced ? random.pick(discountReasons) : '',
    calledOffReason: null,
    createdBy: book.bookedBy(random),
    createdAt,
  };
  rows.jobs.push(job);
  rows.jobLines.push(...lines);
  return { job, lines, totalCents, parts: 0 };
}

export interface Placing {
  day: string;
  van: DemoVan;
  from: number;
  to: number;
}

interface Going {
  lines: readonly LineRow[];
  minutes: number;
  /** Left out: the visit waits on Unplaced. */
  placing?: Placing | undefined;
  /** Shares a parking place. */
  beside?: VisitRow | undefined;
}

/** Writes one going-out to a job. */
export function goOut({ rows, ids }: Book, ordered: OrderedJob, { lines, minutes, placing, beside }: Going): VisitRow {
  ordered.parts += 1;
  const stopId = beside?.stopId ?? ids();
  if (!beside) rows.stops.push({ id: stopId, addressId: ordered.job.addressId });
  const visit: VisitRow = {
    id: ids(),
    jobId: ordered.job.id,
    stopId,
    part: ordered.parts,
    vanId: placing?.van.id ?? null,
    planned: placing ? [instant(placing.day, placing.from), instant(placing.day, placing.to)] : null,
    minutes,
    progress: placing ? 'placed' : 'unplaced',
    progressSince: placing ? ordered.job.createdAt : null,
    reason: '',
    planVersion: placing ? 1 : 0,
    version: placing ? 1 : 0,
  };
  rows.visits.push(visit);
  rows.visitLines.push(...lines.map((line) => ({ visitId: visit.id, jobLineId: line.id })));
  if (placing) rows.visitEvents.push(planEvent(ids(), visit, ordered.job, placing));
  return visit;
}

/** The dispatcher placed the visit a few minutes after the booking. */
function planEvent(
  id: string,
  visit: VisitRow,
  { createdAt, createdBy }: JobRow,
  { day, van, from }: Placing,
): EventRow {
  const when = new Date(createdAt.getTime() + 4 * 60_000);
  const clock = clockOf(instant(day, from).toISOString(), ZONE);
  return {
    ...{ id, visitId: visit.id, kind: 'plan', fromProgress: 'unplaced', toProgress: 'placed' },
    ...{ userId: createdBy ?? null, personId: null, deviceAt: when, receivedAt: when, occurredAt: when },
    ...{ trouble: null, reason: `Placed on ${van.name}, ${formatDay(day)} ${clock}` },
  };
}

/** Two hours around the planned start, from the full hour on, but not before the company's day. */
export function windowAround(day: string, from: number): { from: Date; to: Date } {
  const opens = Math.max(Math.floor(from / 60) * 60, DAY_STARTS);
  return { from: instant(day, opens), to: instant(day, opens + 120) };
}
