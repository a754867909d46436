import type { HandoverWeek, PaydayPerson } from '@driprail/shared/contracts/handover.contract';
import { addDays, weekdayOf } from '@driprail/shared/domain/time/zone';

const FRIDAY = 5;
/** More than these rarely go out together: then the owner ticks. */
const TICKED_AT_MOST = 3;

/** The first Friday after a week's last day. */
export function fridayAfter(endsOn: string): string {
  return addDays(endsOn, (FRIDAY - weekdayOf(endsOn) + 7) % 7 || 7);
}

/** The weeks to begin with: all that wait, when they are few. */
export function tickedAtFirst(waiting: readonly HandoverWeek[]): string[] {
  return waiting.length <= TICKED_AT_MOST ? waiting.map((week) => week.startsOn) : [];
}

/** The payday that goes with ticked weeks: the Friday after the newest ends, the coming one when that is past; empty without any. */
export function paydayFor(weeks: readonly HandoverWeek[], ticked: readonly string[], today: string): string {
  const ends = weeks.filter((week) => ticked.includes(week.startsOn)).map((week) => week.endsOn);
  const last = ends.sort().at(-1);
  if (!last) return '';
  const friday = fridayAfter(last);
  return friday < today ? fridayAfter(addDays(today, -1)) : friday;
}

/** "Week 18" or "Weeks 18, 19 and 20". */
export function weekNames(weeks: readonly Pick<HandoverWeek, 'number'>[]): string {
  const numbers = weeks.map((week) => String(week.number));
  const last = numbers.at(-1) ?? '';
  return numbers.length < 2 ? `Week ${last}` : `Weeks ${numbers.slice(0, -1).join(', ')} and ${last}`;
}

export interface Sums {
  grossCents: number;
  tipCents: number;
  reimbursementCents: number;
}

/** A person's or everybody's weeks added up. */
export function addedUp(weeks: readonly Sums[]): Sums {
  const total = (key: keyof Sums) => weeks.reduce((sum, week) => sum + week[key], 0);
  return {
    grossCents: total('grossCents'),
    tipCents: total('tipCents'),
    reimbursementCents: total('reimbursementCents'),
  };
}

/** What everybody has in one week. */
export function weekTotal(people: readonly PaydayPerson[], startsOn: string): Sums {
  return addedUp(people.flatMap((person) => person.weeks.filter((week) => week.startsOn === startsOn)));
}
