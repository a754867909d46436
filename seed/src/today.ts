import { visitMinutes } from '@driprail/shared/domain/board/crew-time';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import type { Coordinates } from '@driprail/shared/domain/board/travel';
import { instant, minuteOf, nextWorkDays } from './calendar.ts';
import { segmentsOf, writeClock } from './clock-rows.ts';
import { writeDeskClockToday } from './desk-clock.ts';
import type { DemoCustomer } from './customers.ts';
import type { Book, VisitRow } from './job-rows.ts';
import { goOut, orderJob } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import { named } from './people.ts';
import type { PlannedStop, Rota } from './plan-day.ts';
import { minutesOf } from './plan-day.ts';
import { SHOP } from './places.ts';
import type { VisitTimes } from './progress-rows.ts';
import { press, tellVisit } from './progress-rows.ts';
import { at, randomFor } from './random.ts';
import { recordStop } from './record-stop.ts';
import { writeTip } from './tip-rows.ts';
import type { ScriptedVan, ScriptedVisit } from './today-script.ts';
import { todayScript, unplacedScript } from './today-script.ts';
import type { DemoVan } from './vans.ts';
import { writeCrews } from './vans.ts';

interface Today {
  book: Book;
  people: DemoPeople;
  customers: readonly DemoCustomer[];
  rota: Rota;
  taken: Set<DemoCustomer>;
}

/** Today's board as scripted, and what waits on Unplaced. */
export function writeToday(
  book: Book,
  people: DemoPeople,
  vans: readonly DemoVan[],
  customers: readonly DemoCustomer[],
  rota: Rota,
): void {
  const random = randomFor('today');
  const shuffled = customers
    .map((customer) => ({ customer, place: random.next() }))
    .sort((a, b) => a.place - b.place)
    .map(({ customer }) => customer);
  const today: Today = { book, people, customers: shuffled, rota, taken: new Set() };
  for (const scripted of todayScript) {
    const van = at(
      vans,
      vans.findIndex((one) => one.name === scripted.van),
    );
    writeScriptedVan(today, van, scripted);
  }
  for (const waiting of unplacedScript) writeUnplaced(today, waiting);
  writeDeskClockToday(book, people.dispatchers);
}

function writeScriptedVan(today: Today, van: DemoVan, { crew: names, inAt, visits }: ScriptedVan): void {
  const { book, people } = today;
  const day = book.calendar.today;
  const crew = names.map((name) => named(people.technicians, name));
  writeCrews(book.rows, book.ids, day, [{ van, crew }]);
  const random = randomFor(`today ${van.name}`);
  const speed = crew.filter((person) => !person.isTrainee).length;
  const driven: { visit: VisitRow; times: VisitTimes }[] = [];
  let last: { to: number; place: Coordinates } = { to: minuteOf(inAt), place: SHOP };
  for (const scripted of visits) {
    const stop = planned(today, scripted, speed, last);
    last = { to: stop.to, place: stop.customer.place };
    const { ordered, visit, lines } = recordStop(book, day, van, stop, random);
    if (scripted.calledOff) {
      const { at: clock, reason } = scripted.calledOff;
      press(book, visit, 'call_off', instant(day, minuteOf(clock)), at(people.dispatchers, 0), reason);
      ordered.job.calledOffReason = reason;
    }
    if (!scripted.times) continue;
    const [setOff, arrive, start, end] = scripted.times.map(minuteOf) as [number, number, number, number];
    const times = { setOff, arrive, start, end };
    driven.push({ visit, times });
    tellVisit(book, { day, visit, lines, crew, times });
    if (scripted.trouble) reportTrouble(book, visit, scripted.trouble, at(crew, 0));
    writeTip(book, ordered, instant(day, end + 3), at(crew, 0), random);
  }
  const morning = { inAt: minuteOf(inAt), visits: driven.map(({ times }) => times), mealAfter: null, back: null };
  const segments = segmentsOf(
    morning,
    driven.map(({ visit }) => visit.id),
  );
  for (const person of crew) writeClock(book, day, person, segments);
}

/** Finds a household with the right car that the van reaches in time; or, for the tight gap, does not. */
function planned(
  today: Today,
  { from: clock, services, size, isTight }: ScriptedVisit,
  speed: number,
  last: { to: number; place: Coordinates },
): PlannedStop {
  const from = minuteOf(clock);
  const reaches = ({ place }: DemoCustomer) => {
    const short = estimateTravel(last.place, place).minutes - (from - last.to);
    return isTight ? short >= 4 : short <= 0;
  };
  const { customer, items } = takeCustomer(today, services, size, 1, reaches);
  return { customer, items, from, to: from + visitMinutes(minutesOf(items, today.book.menu), speed), continues: null };
}

function takeCustomer(
  { customers, taken, rota, book }: Today,
  services: ScriptedVisit['services'],
  size: ScriptedVisit['size'],
  cars: number,
  willDo: (customer: DemoCustomer) => boolean,
): Pick<PlannedStop, 'customer' | 'items'> {
  const fitting = (customer: DemoCustomer) => customer.vehicles.filter((vehicle) => vehicle.sizeClass === size);
  const customer = customers.find(
    (one) => !taken.has(one) && one.isCompany === cars > 1 && fitting(one).length >= cars && willDo(one),
  );
  if (!customer) throw new Error(`no customer has ${cars} of size ${size} within reach`);
  taken.add(customer);
  rota.see(customer, book.calendar.today);
  const items = fitting(customer)
    .slice(0, cars)
    .flatMap((vehicle) => services.map((service) => ({ vehicle, service })));
  rota.note(items, book.menu);
  return { customer, items };
}

function reportTrouble(
  { rows, ids, calendar }: Book,
  visit: VisitRow,
  { at: clock, kind, note }: NonNullable<ScriptedVisit['trouble']>,
  by: { id: string; userId: string },
): void {
  const when = instant(calendar.today, minuteOf(clock));
  const progress = visit.progress ?? 'placed';
  rows.visitEvents.push({
    ...{ id: ids(), visitId: visit.id, kind: 'trouble', fromProgress: progress, toProgress: progress },
    ...{ userId: by.userId, personId: by.id, deviceAt: when, receivedAt: when, occurredAt: when },
    ...{ trouble: kind, reason: note },
  });
}

function writeUnplaced(today: Today, { services, size, days, window, cars }: (typeof unplacedScript)[number]): void {
  const { book } = today;
  const ahead = [book.calendar.today, ...nextWorkDays(book.calendar.today, 3)];
  const { customer, items } = takeCustomer(today, services, size, cars, () => true);
  const random = randomFor(`unplaced ${size} ${cars}`);
  const ordered = orderJob(book, {
    ...{ customer, items, random },
    window: {
      from: instant(at(ahead, days[0]), minuteOf(window[0])),
      to: instant(at(ahead, days[1]), minuteOf(window[1])),
    },
    createdAt: instant(book.calendar.today, random.int(8 * 60 + 10, 10 * 60 + 40)),
  });
  goOut(book, ordered, { lines: ordered.lines, minutes: visitMinutes(minutesOf(items, book.menu), 1) });
}
