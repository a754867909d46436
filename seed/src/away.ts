import { addDays } from '@driprail/shared/domain/time/zone';
import type { Calendar } from './calendar.ts';
import type { DemoPeople, DemoPerson } from './people.ts';
import { named } from './people.ts';
import type { DemoRows } from './rows.ts';

/** Forgot to clock out and has been away since: a person has one open entry at most. */
export const FORGETFUL = 'Cal Webb';
/** Had a week of paid time off. */
export const RESTED = 'Juno Marsh';

interface Away {
  name: string;
  startsOn: string;
  endsOn: string;
  note: string;
}

function awaySpans({ thisWeek, forgottenOn }: Calendar): Away[] {
  const restedFrom = addDays(thisWeek, -7 * 7);
  return [
    { name: FORGETFUL, startsOn: addDays(forgottenOn, 1), endsOn: addDays(thisWeek, 6), note: 'Family visit' },
    { name: RESTED, startsOn: restedFrom, endsOn: addDays(restedFrom, 5), note: 'Vacation' },
  ];
}

export function isAway(person: DemoPerson, day: string, calendar: Calendar): boolean {
  return awaySpans(calendar).some(
    ({ name, startsOn, endsOn }) => name === person.name && startsOn <= day && day <= endsOn,
  );
}

export function writeTimeOff(rows: DemoRows, ids: () => string, calendar: Calendar, people: DemoPeople): void {
  for (const { name, ...off } of awaySpans(calendar)) {
    rows.timeOff.push({ id: ids(), personId: named(people.technicians, name).id, ...off });
  }
}
