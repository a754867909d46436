import { addDays, dayOf } from '../time/zone.ts';
import { personWeek } from './person-week.ts';
import type { PayWeekInput, PayWeekResult, PersonWeek } from './pay-week.types.ts';
import { weekGroups } from './week-groups.ts';
import { weekGrid } from './work-spans.ts';

/** Stored with every locked week; changed whenever the same input would give another result. */
export const ENGINE_VERSION = '2';

/**
 * Works out one workweek for everyone. Pure and exact: the same input gives the same result, to the byte.
 * Earning lines are rounded half up first and crew shares add up to the cent; the regular rate is the exact quotient of
 * those cents over all hours worked; the overtime premium is rounded once per person.
 * @throws {RangeError} when a rate is not a number or the overtime rule set is unknown
 */
export function computePayWeek(input: PayWeekInput): PayWeekResult {
  const grid = weekGrid(input);
  const groups = weekGroups(input, grid);
  const startsOn = dayOf(input.startsAt, input.zone);
  const shared = { input, grid, startsOn, settles: isLastOfMonth(startsOn), weekOf };
  return {
    engineVersion: ENGINE_VERSION,
    people: input.people.map((person) => personWeek(person, groups(person.id), shared)),
  };
}

function weekOf(input: PayWeekInput, personId: string): PersonWeek | undefined {
  return computePayWeek({ ...input, people: input.people.filter((person) => person.id === personId) }).people[0];
}

/** A month is the workweeks whose last day lies in it; the last of them settles it. */
export function isLastOfMonth(startsOn: string): boolean {
  return monthOfWeek(startsOn) !== monthOfWeek(addDays(startsOn, 7));
}

/** "2026-05": the month a workweek belongs to. */
export function monthOfWeek(startsOn: string): string {
  return addDays(startsOn, 6).slice(0, 7);
}
