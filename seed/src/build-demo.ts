import { writeTimeOff } from './away.ts';
import { writeBilling } from './billing-rows.ts';
import type { Calendar } from './calendar.ts';
import { ZONE, calendarOf, instant, minuteOf } from './calendar.ts';
import { writeComingDays } from './coming-days.ts';
import { writeCustomerFacts } from './customer-facts.ts';
import { writeCustomers } from './customers.ts';
import { writeHistory } from './history.ts';
import type { Book } from './job-rows.ts';
import { writeMenu } from './menu.ts';
import { writePay } from './pay-rows.ts';
import { writePeople } from './people.ts';
import { writePlans } from './plan-rows.ts';
import { Rota } from './plan-day.ts';
import type { DemoRows } from './rows.ts';
import { idsFrom, noRows } from './rows.ts';
import { writeTimeOffPay } from './time-off-rows.ts';
import { writeToday } from './today.ts';
import { writeVans } from './vans.ts';
import { writeWalkRounds } from './walk-rows.ts';
import { writeWork } from './work-rows.ts';

export interface Demo {
  calendar: Calendar;
  rows: DemoRows;
  ownerUserId: string;
}

/**
 * The demo company as rows, with no clock and no I/O: the same day gives the same rows.
 * @param now any instant of the day that is today; the demo's clock stands at 11:00 of it
 */
export function buildDemo(now: Date): Demo {
  const calendar = calendarOf(now);
  const rows = noRows();
  const ids = idsFrom(instant(calendar.rulesFrom, minuteOf('09:00')));
  rows.settings.push({
    ...{ id: 1, name: 'Tern & Tide Mobile Detailing', phone: '555-0100', email: 'desk@ternandtide.example' },
    ...{ zone: ZONE, clock: '12', units: 'us', dayStartsAt: '07:30', dayEndsAt: '18:00' },
    mealReminderMinutes: 300,
    billsFrom: instant(calendar.rulesFrom, minuteOf('00:00')),
  });
  const people = writePeople(rows, ids, calendar.rulesFrom);
  writeTimeOff(rows, ids, calendar, people);
  const vans = writeVans(rows, ids);
  const menu = writeMenu(rows, ids, calendar.rulesFrom);
  const customers = writeCustomers(rows, ids);
  const book: Book = {
    ...{ rows, ids, calendar, menu },
    bookedBy: (random) => random.pick(people.dispatchers).userId,
  };
  const rota = new Rota(customers);
  // Today first: its script needs particular cars, the days around take what is left.
  writeToday(book, people, vans, customers, rota);
  writeHistory(book, people, vans, rota);
  writeComingDays(book, people, vans, customers, rota);
  writePay(book, people);
  writePlans(book, people);
  writeTimeOffPay(book, people);
  writeWork(book, people);
  writeWalkRounds(book);
  writeCustomerFacts(book, people);
  writeBilling(book, people);
  rows.jobs.sort((a, b) => a.createdAt.getTime() - b.createdAt.getTime());
  return { calendar, rows, ownerUserId: people.ownerUserId };
}
