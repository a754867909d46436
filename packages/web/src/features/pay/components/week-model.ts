import type { PayWeekDto, PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { exact, sum } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { PayWarning, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf, isBefore } from '@driprail/shared/domain/time/zone';

export type Totals = PersonWeek['totals'];

/** Sums of everybody's totals, cents by group. */
export function weekSums(people: readonly PersonWeek[]): Totals {
  const sums = {
    hourly: 0,
    flat: 0,
    commission: 0,
    overtimePremium: 0,
    makeUp: 0,
    tips: 0,
    tipsAlreadyReceived: 0,
    adjustments: 0,
    gross: 0,
  };
  for (const { totals } of people) {
    for (const key of Object.keys(sums) as (keyof Totals)[]) sums[key] += totals[key];
  }
  return sums;
}

/** Exact hours of everybody, as a fraction. */
export function hoursSum(people: readonly PersonWeek[], key: 'hoursWorked' | 'overtimeHours'): string {
  return sum(people.map((person) => exact(person[key]))).toFraction();
}

/** Pay as a share of sales, in percent to one place; tips come from customers and stay out. Null without sales. */
export function shareOfSales(grossCents: number, tipCents: number, salesCents: number): string | null {
  if (salesCents <= 0) return null;
  return decimalText(
    exact(grossCents - tipCents)
      .mul(100)
      .div(exact(salesCents)),
    1,
  );
}

export function isRunning(week: PayWeekHead, now: string): boolean {
  return isBefore(now, week.endsAt);
}

/** "Mon May 4 to Sun May 10". */
export function weekSpan({ startsOn, endsOn }: Pick<PayWeekHead, 'startsOn' | 'endsOn'>): string {
  return `${formatDay(startsOn)} to ${formatDay(endsOn)}`;
}

/** "Mon 4", the head of a day's column. */
export function dayHead(day: string): string {
  const [weekday = '', , date = ''] = formatDay(day).split(' ');
  return `${weekday} ${date}`;
}

/** "May 4". */
export function shortDate(day: string): string {
  return formatDay(day).slice(4);
}

/**
 * Weeks after the last locked one, the oldest first: a correction is paid in the first of them. Weeks that were
 * never run lie before it and are left out.
 */
export function openWeeks<W extends PayWeekHead>(weeks: readonly W[]): W[] {
  const lastLocked = weeks.filter((week) => week.state === 'locked').map((week) => week.startsOn);
  const after = lastLocked.sort().at(-1) ?? '';
  return weeks
    .filter((week) => week.state !== 'locked' && week.startsOn > after)
    .sort((a, b) => a.startsOn.localeCompare(b.startsOn));
}

/** The week the owner has to do with now: the last one that is over, until it is locked; then the running one. */
export function weekAtHand<W extends PayWeekHead>(weeks: readonly W[], now: string): W | null {
  const begun = weeks
    .filter((week) => !isBefore(now, week.startsAt))
    .sort((a, b) => b.startsOn.localeCompare(a.startsOn));
  const running = begun.find((week) => isRunning(week, now)) ?? null;
  const over = begun.find((week) => !isRunning(week, now));
  return over && over.state !== 'locked' ? over : (running ?? over ?? null);
}

/** Whether an open entry is only somebody at work just now. */
export function isAtWork(warning: PayWarning, { week, warningTimes }: PayWeekDto, now: string, zone: string): boolean {
  const since = warning.entryId ? warningTimes[warning.entryId] : undefined;
  return (
    warning.code === 'open_entry' &&
    isRunning(week, now) &&
    since !== undefined &&
    dayOf(since, zone) === dayOf(now, zone)
  );
}

/** What asks for somebody, the blocking first. */
export function troubles(dto: PayWeekDto, now: string, zone: string): PayWarning[] {
  if (dto.week.state === 'locked') return [];
  return dto.people
    .flatMap((person) => person.warnings)
    .filter((warning) => !isAtWork(warning, dto, now, zone))
    .sort((a, b) => Number(b.isBlocking) - Number(a.isBlocking));
}

/** The few words under a name. */
export const warningWords: Record<PayWarning['code'], string> = {
  open_entry: 'No clock-out',
  overlapping_entries: 'Entries overlap',
  short_meal_break: 'Short meal break',
  done_without_clock: 'Job without time',
  no_hourly_rate: 'No hourly rate',
  under_minimum_wage: 'Below minimum',
  deduction_refused: 'Deduction cut',
};
