import { visitMinutes } from '@driprail/shared/domain/board/crew-time';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import type { Coordinates } from '@driprail/shared/domain/board/travel';
import { minuteOf } from './calendar.ts';
import { MEAL_AFTER, MEAL_MINUTES } from './meal.ts';
import type { DemoCustomer, DemoVehicle } from './customers.ts';
import type { LineRow, OrderedJob } from './job-rows.ts';
import type { Menu } from './menu.ts';
import { isPaintWork, onMenu } from './menu.ts';
import type { PlannedItem } from './offers.ts';
import { offers } from './offers.ts';
import { SHOP } from './places.ts';
import type { Random } from './random.ts';
import type { VanDay } from './vans.ts';

/** One visit of a van's day; times are minutes from midnight. */
export interface PlannedStop {
  customer: DemoCustomer;
  items: PlannedItem[];
  from: number;
  to: number;
  /** The rest of a job begun on another day. */
  continues: Rest | null;
}

export interface Rest {
  customer: DemoCustomer;
  job: OrderedJob;
  lines: LineRow[];
}

/** Chooses customers so that nobody is seen twice a day and those seen longest ago come first. */
export class Rota {
  private readonly seenOn = new Map<string, string>();
  private readonly polished = new Set<string>();

  constructor(private readonly customers: readonly DemoCustomer[]) {}

  see(customer: DemoCustomer, day: string): void {
    this.seenOn.set(customer.id, day);
  }

  /** Paint is corrected or coated once in the time the demo tells of. */
  isPolished(vehicle: DemoVehicle): boolean {
    return this.polished.has(vehicle.id);
  }

  note(items: readonly PlannedItem[], menu: Menu): void {
    for (const { vehicle, service } of items) if (isPaintWork(menu, service)) this.polished.add(vehicle.id);
  }

  /** The one of eight seen longest ago; null when none of them will do. */
  choose(day: string, random: Random, willDo: (customer: DemoCustomer) => boolean): DemoCustomer | null {
    const drawn = Array.from({ length: 8 }, () => random.pick(this.customers));
    const fitting = drawn.filter((customer) => this.seenOn.get(customer.id) !== day && willDo(customer));
    const since = (customer: DemoCustomer) => this.seenOn.get(customer.id) ?? '';
    return fitting.sort((a, b) => since(a).localeCompare(since(b)))[0] ?? null;
  }
}

interface DayAsked {
  day: string;
  vanDay: VanDay;
  menu: Menu;
  rota: Rota;
  random: Random;
  /** No visit is planned to end later. */
  until: number;
  rest?: Rest | null;
}

const LONGEST_DRIVE = 17;
const TRIES = 6;

/** Fills a van's day in driving order: what the crew can do, where it can be in time, a meal around noon. */
export function planDay({ day, vanDay, menu, rota, random, until, rest }: DayAsked): PlannedStop[] {
  const speed = vanDay.crew.filter((person) => !person.isTrainee).length;
  const stops: PlannedStop[] = [];
  let place: Coordinates = SHOP;
  let free = minuteOf('07:40');
  let hasEaten = false;
  const add = (stop: PlannedStop) => {
    rota.see(stop.customer, day);
    stops.push(stop);
    place = stop.customer.place;
    free = stop.to;
    if (!hasEaten && free >= MEAL_AFTER) {
      hasEaten = true;
      free += MEAL_MINUTES;
    }
  };
  if (rest) {
    const from = arrival(free, place, rest.customer.place);
    add({
      customer: rest.customer,
      items: [],
      from,
      to:
        from +
        visitMinutes(
          rest.lines.map((line) => line.minutes),
          speed,
        ),
      continues: rest,
    });
  }
  for (let misses = 0; misses < TRIES;) {
    const here = place;
    const customer = rota.choose(day, random, (one) => estimateTravel(here, one.place).minutes <= LONGEST_DRIVE);
    const items = customer && offers(customer, vanDay, menu, random, (vehicle) => rota.isPolished(vehicle));
    const from = customer ? arrival(free, here, customer.place) : 0;
    const to = items ? from + visitMinutes(minutesOf(items, menu), speed) : Infinity;
    if (!customer || !items || to > until) {
      misses += 1;
      continue;
    }
    rota.note(items, menu);
    add({ customer, items, from, to, continues: null });
  }
  return stops;
}

/** Planned starts stand on five minutes. */
function arrival(free: number, from: Coordinates, to: Coordinates): number {
  return Math.ceil((free + estimateTravel(from, to).minutes) / 5) * 5;
}

export function minutesOf(items: readonly PlannedItem[], menu: Menu): number[] {
  return items.map(({ vehicle, service }) => onMenu(menu, service).prices[vehicle.sizeClass]?.minutes ?? 0);
}
