import type { ClockKind, DatedRate, RateKind } from './pay-week.types.ts';

export interface RateQuestion {
  kind: RateKind;
  personId: string;
  /** The service of a job line; null for time. */
  serviceId: string | null;
  /** The kind of work an hourly rate is asked for; null for job lines. */
  clockKind: ClockKind | null;
  /** Company-zone date of the work. */
  date: string;
}

/**
 * The rate that applied on a date: the most exact one (person and service or kind of work, person, company and
 * service or kind of work, company), and among those the latest that had started.
 * @returns null when none had started
 */
export function rateInForce(rates: readonly DatedRate[], question: RateQuestion): DatedRate | null {
  let best: DatedRate | null = null;
  for (const rate of rates) {
    if (!answers(rate, question)) continue;
    if (best === null || isBetter(rate, best)) best = rate;
  }
  return best;
}

function answers(rate: DatedRate, question: RateQuestion): boolean {
  return (
    rate.kind === question.kind &&
    rate.startsOn <= question.date &&
    (rate.personId === null || rate.personId === question.personId) &&
    (rate.serviceId === null || rate.serviceId === question.serviceId) &&
    (rate.clockKind === null || rate.clockKind === question.clockKind)
  );
}

function isBetter(rate: DatedRate, other: DatedRate): boolean {
  const gain = exactness(rate) - exactness(other);
  if (gain !== 0) return gain > 0;
  if (rate.startsOn !== other.startsOn) return rate.startsOn > other.startsOn;
  return rate.id > other.id; // Ids are made in the order of time: the later entry replaces the earlier.
}

function exactness(rate: DatedRate): number {
  return (rate.personId === null ? 0 : 2) + (rate.serviceId === null && rate.clockKind === null ? 0 : 1);
}
