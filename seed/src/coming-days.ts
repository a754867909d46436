import { visitMinutes } from '@driprail/shared/domain/board/crew-time';
import { isAway } from './away.ts';
import { minuteOf, nextWorkDays, instant } from './calendar.ts';
import type { DemoCustomer } from './customers.ts';
import type { Book } from './job-rows.ts';
import { goOut, orderJob, windowAround } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import type { PlannedItem } from './offers.ts';
import type { Rota } from './plan-day.ts';
import { minutesOf, planDay } from './plan-day.ts';
import { at, randomFor } from './random.ts';
import { recordStop } from './record-stop.ts';
import type { DemoVan, VanDay } from './vans.ts';
import { crewsOn, writeCrews } from './vans.ts';

/** Until when each of the next seven working days is filled: tomorrow well, the days after less and less. */
const filledUntil = ['14:30', '13:15', '12:15', '11:30', '11:00', '10:15', '09:45'];

const FLEET_VAN = 'Fulmar';
const FLEET = 'Eastgate Clinic';
const FLEET_FROM = minuteOf('13:45');

/** Crews and visits of the next seven working days; tomorrow one van looks after two cars of a fleet side by side. */
export function writeComingDays(
  book: Book,
  people: DemoPeople,
  vans: readonly DemoVan[],
  customers: readonly DemoCustomer[],
  rota: Rota,
): void {
  for (const [index, day] of nextWorkDays(book.calendar.today, filledUntil.length).entries()) {
    const vanDays = crewsOn(day, vans, people.technicians, (person) => isAway(person, day, book.calendar));
    writeCrews(book.rows, book.ids, day, vanDays);
    const fleet = customers.find((customer) => customer.name === FLEET);
    const isTomorrow = index === 0;
    if (isTomorrow && fleet) rota.see(fleet, day);
    for (const vanDay of vanDays.filter(({ crew }) => crew.length > 0)) {
      const hasFleet = isTomorrow && vanDay.van.name === FLEET_VAN;
      const until = minuteOf(hasFleet ? '12:30' : at(filledUntil, index));
      const random = randomFor(`${day} ${vanDay.van.name}`);
      for (const stop of planDay({ day, vanDay, menu: book.menu, rota, random, until })) {
        recordStop(book, day, vanDay.van, stop, random);
      }
      if (hasFleet && fleet) writeFleetStop(book, day, vanDay, fleet);
    }
  }
}

/** Two jobs of one fleet at one parking place at the same time, each with its own invoice. */
function writeFleetStop(book: Book, day: string, { van }: VanDay, fleet: DemoCustomer): void {
  const random = randomFor(`${day} fleet`);
  const job = (items: PlannedItem[]) =>
    orderJob(book, {
      ...{ customer: fleet, items, random, window: windowAround(day, FLEET_FROM) },
      createdAt: instant(book.calendar.today, minuteOf('08:20')),
    });
  const [first, second] = [0, 1].map((number) =>
    job([{ vehicle: at(fleet.vehicles, number), service: 'Maintenance wash' }]),
  );
  if (!first || !second) return;
  const placing = (minutes: number) => ({ day, van, from: FLEET_FROM, to: FLEET_FROM + minutes });
  const minutes = (number: number) =>
    visitMinutes(minutesOf([{ vehicle: at(fleet.vehicles, number), service: 'Maintenance wash' }], book.menu), 1);
  const beside = goOut(book, first, { lines: first.lines, minutes: minutes(0), placing: placing(minutes(0)) });
  goOut(book, second, { lines: second.lines, minutes: minutes(1), placing: placing(minutes(1)), beside });
}
