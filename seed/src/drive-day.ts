import { estimateTravel } from '@driprail/shared/domain/board/travel';
import type { Coordinates } from '@driprail/shared/domain/board/travel';
import { minuteOf } from './calendar.ts';
import { MEAL_AFTER, MEAL_MINUTES } from './meal.ts';
import type { PlannedStop } from './plan-day.ts';
import { SHOP } from './places.ts';
import type { VisitTimes } from './progress-rows.ts';
import type { Random } from './random.ts';

/** How a planned day really went, in minutes from midnight. */
export interface DrivenDay {
  inAt: number;
  visits: VisitTimes[];
  /** The meal follows this visit; null when there was none. */
  mealAfter: number | null;
  /** Back at the shop, and off the clock; null while the crew is still out. */
  back: { at: number; out: number } | null;
}

/** Drives take a little more or less than the estimate, work a little more or less than the plan. */
export function driveDay(stops: readonly PlannedStop[], random: Random): DrivenDay {
  const inAt = minuteOf('07:30') + random.int(-4, 4);
  const visits: VisitTimes[] = [];
  let mealAfter: number | null = null;
  let place: Coordinates = SHOP;
  let free = inAt + 8;
  for (const [index, stop] of stops.entries()) {
    const drive = estimateTravel(place, stop.customer.place).minutes;
    const setOff = Math.max(free + random.int(0, 2), stop.from - drive - random.int(0, 3));
    const arrive = setOff + Math.max(2, drive + random.int(-2, 2));
    const start = arrive + random.int(2, 4);
    const end = start + Math.max(10, Math.round((stop.to - stop.from) * (0.9 + random.next() * 0.12)));
    visits.push({ setOff, arrive, start, end });
    place = stop.customer.place;
    free = end;
    if (mealAfter === null && stop.to >= MEAL_AFTER) {
      mealAfter = index;
      free += MEAL_MINUTES;
    }
  }
  const at = free + estimateTravel(place, SHOP).minutes;
  return { inAt, visits, mealAfter, back: { at, out: at + random.int(9, 16) } };
}
