import { exact } from '../money/exact.ts';
import { toCents } from '../money/rounding.ts';
import { dayOf } from '../time/zone.ts';
import { rateInForce } from './dated-rates.ts';
import type { DatedPlan } from './plans/pay-plan.ts';
import type { NoShowTrip } from './time-off/no-show-trip.ts';
import type {
  CarriedPay,
  DatedRate,
  DoneLine,
  PayAdjustment,
  PayEntry,
  PayTip,
  PayWeekInput,
  PersonPlace,
  SettledCommission,
} from './pay-week.types.ts';
import { entrySpan, secondsOf, type WeekGrid } from './work-spans.ts';

/** One person's part of the week's input, in an order that does not depend on the order it came in. */
export interface PersonInput {
  entries: PayEntry[];
  doneLines: DoneLine[];
  tips: PayTip[];
  adjustments: PayAdjustment[];
  /** The person's own rates and the company's. */
  rates: DatedRate[];
  plans: DatedPlan[];
  place: PersonPlace | null;
  carried: CarriedPay | null;
  noShowTrips: NoShowTrip[];
  settledCommissions: SettledCommission[];
  /** Whether an agreement on the rate in effect was signed before the week. */
  hasRateInEffect: boolean;
}

/**
 * Sorts the week's input by person once, so that a week's cost grows with its people and not with their square.
 * Entries that do not touch the week and lines done outside it fall away: commission lands in the workweek of Done.
 */
export function weekGroups(input: PayWeekInput, grid: WeekGrid): (personId: string) => PersonInput {
  const groups = new Map<string, PersonInput>();
  const companyRates = input.rates.filter((rate) => rate.personId === null);
  const of = (personId: string): PersonInput => {
    const group = groups.get(personId) ?? {
      entries: [],
      doneLines: [],
      tips: [],
      adjustments: [],
      rates: [...companyRates],
      plans: [],
      place: null,
      carried: null,
      noShowTrips: [],
      settledCommissions: [],
      hasRateInEffect: false,
    };
    groups.set(personId, group);
    return group;
  };
  for (const entry of [...input.entries].sort(
    by(
      (item) => item.startedAt,
      (item) => item.id,
    ),
  )) {
    const { from, to } = entrySpan(entry, grid);
    if (from < grid.to && (to > grid.from || from >= grid.from)) of(entry.personId).entries.push(entry);
  }
  for (const line of [...input.doneLines].sort(
    by(
      (item) => item.doneAt,
      (item) => item.lineId,
    ),
  )) {
    const done = secondsOf(line.doneAt);
    if (done < grid.from || done >= grid.to) continue;
    const costed = withProductCost(line, companyRates, input.zone);
    for (const personId of crewOf(line)) of(personId).doneLines.push(costed);
  }
  for (const tip of [...input.tips].sort(
    by(
      (item) => item.receivedAt,
      (item) => item.id,
    ),
  )) {
    for (const personId of crewOf(tip)) of(personId).tips.push(tip);
  }
  for (const item of [...input.adjustments].sort(by((adjustment) => adjustment.id)))
    of(item.personId).adjustments.push(item);
  for (const rate of input.rates) if (rate.personId !== null) of(rate.personId).rates.push(rate);
  for (const plan of input.plans) of(plan.personId).plans.push(plan);
  for (const place of input.places) of(place.personId).place = place;
  const startsOn = dayOf(input.startsAt, input.zone);
  for (const { personId, signedOn } of input.ratesInEffect ?? [])
    if (signedOn <= startsOn) of(personId).hasRateInEffect = true;
  for (const carried of input.carried) of(carried.personId).carried = carried;
  for (const trip of [...(input.noShowTrips ?? [])].sort(
    by(
      (item) => item.calledOffAt,
      (item) => item.visitId,
    ),
  )) {
    const at = secondsOf(trip.calledOffAt);
    if (at >= grid.from && at < grid.to) for (const personId of crewOf(trip)) of(personId).noShowTrips.push(trip);
  }
  for (const settled of [...(input.settledCommissions ?? [])].sort(by((item) => item.startsOn)))
    of(settled.personId).settledCommissions.push(settled);
  return of;
}

function withProductCost(line: DoneLine, rates: readonly DatedRate[], zone: string): DoneLine {
  const { serviceId, doneAt } = line;
  const date = dayOf(doneAt, zone);
  const rate = rateInForce(rates, { kind: 'product_cost', personId: '', serviceId, clockKind: null, date });
  return rate === null ? line : { ...line, productCostCents: toCents(exact(rate.value)) };
}

function crewOf({ crew }: Pick<DoneLine, 'crew'>): Set<string> {
  return new Set(crew.map((member) => member.personId));
}

function by<T>(...keys: ((item: T) => string)[]): (a: T, b: T) => number {
  return (a, b) => {
    for (const key of keys) if (key(a) !== key(b)) return key(a) < key(b) ? -1 : 1;
    return 0;
  };
}
