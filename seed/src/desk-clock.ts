import { weekdayOf } from '@driprail/shared/domain/time/zone';
import { minuteOf } from './calendar.ts';
import { writeClock } from './clock-rows.ts';
import type { Book } from './job-rows.ts';
import { MEAL_MINUTES } from './meal.ts';
import type { DemoPerson } from './people.ts';
import { randomFor } from './random.ts';

/** In and meal of each dispatcher; one of the two is always at the desk. */
const shifts = [
  { from: minuteOf('07:15'), meal: minuteOf('12:00') },
  { from: minuteOf('08:45'), meal: minuteOf('12:45') },
];
const SHIFT_MINUTES = 8 * 60 + 10;

/** The dispatchers' hours at the shop on a past day; their days off are left out. */
export function writeDeskClock(book: Book, day: string, dispatchers: readonly DemoPerson[]): void {
  writeDesk(
    book,
    day,
    dispatchers.filter((person) => person.dayOff !== weekdayOf(day)),
    dispatchers,
  );
}

/** Both are at the desk today, whatever the weekday. */
export function writeDeskClockToday(book: Book, dispatchers: readonly DemoPerson[]): void {
  writeDesk(book, book.calendar.today, dispatchers, dispatchers);
}

function writeDesk(book: Book, day: string, present: readonly DemoPerson[], all: readonly DemoPerson[]): void {
  const random = randomFor(`${day} desk`);
  for (const person of present) {
    const shift = shifts[all.indexOf(person)];
    if (!shift) continue;
    const from = shift.from + random.int(-5, 5);
    const back = shift.meal + MEAL_MINUTES;
    writeClock(book, day, person, [
      { kind: 'shop', visitId: null, from, to: shift.meal },
      { kind: 'meal_break', visitId: null, from: shift.meal, to: back },
      { kind: 'shop', visitId: null, from: back, to: from + SHIFT_MINUTES + random.int(0, 15) },
    ]);
  }
}
