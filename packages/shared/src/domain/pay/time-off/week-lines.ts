import type { Exact } from '../../money/exact.ts';
import type { PayLine, PayPerson, PayWeekInput } from '../pay-week.types.ts';
import type { PersonInput } from '../week-groups.ts';
import type { WeekGrid, WorkSpan } from '../work-spans.ts';
import { hourlyRateInForce } from './hourly-rate-in-force.ts';
import { noShowTripLines } from './no-show-trip.ts';
import { showUpLines } from './show-up-pay.ts';

/** A person's trips of the week on which nobody was home. */
export function tripLines(person: PayPerson, own: PersonInput, input: PayWeekInput): PayLine[] {
  return noShowTripLines({
    person,
    trips: own.noShowTrips,
    rules: input.showUpRules ?? [],
    placeId: own.place?.placeId ?? null,
    split: input.rules.crewSplit,
    zone: input.zone,
  });
}

interface WorkedWeek {
  input: PayWeekInput;
  grid: WeekGrid;
  startsOn: string;
  spans: readonly WorkSpan[];
  minimumWage: Exact;
}

/** Pay for a person's days cut short. */
export function shortDayLines(
  person: PayPerson,
  own: PersonInput,
  { input, grid, startsOn, spans, minimumWage }: WorkedWeek,
): PayLine[] {
  const rules = input.showUpRules ?? [];
  if (rules.length === 0) return [];
  const { rates, plans } = own;
  const away = (input.daysAway ?? []).filter((days) => days.personId === person.id);
  return showUpLines({
    ...{ person, spans, rules, grid, minimumWage },
    entries: own.entries,
    placeId: own.place?.placeId ?? null,
    zone: input.zone,
    isOff: (day) =>
      own.adjustments.some((item) => item.timeOff?.on === day) ||
      away.some(({ startsOn: first, endsOn: last }) => first <= day && day <= last),
    rateOn: (on) => hourlyRateInForce({ personId: person.id, weekStartsOn: startsOn, on, rates, plans }),
  });
}
