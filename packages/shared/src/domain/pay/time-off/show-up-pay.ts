import { exact, fractionText, greatest, hoursOf, type Exact } from '../../money/exact.ts';
import { centsText, decimalText, shortText, toCents } from '../../money/rounding.ts';
import { formatDate, formatDay } from '../../time/format.ts';
import { dayOf } from '../../time/zone.ts';
import { dayBounds } from '../../time/zone-instants.ts';
import { aLine } from '../pay-line.ts';
import type { PayEntry, PayLine, PayPerson } from '../pay-week.types.ts';
import { hoursAndMinutes, rateText } from '../working-words.ts';
import { secondsOf, type WeekGrid, type WorkSpan } from '../work-spans.ts';
import type { HourlyRate } from './hourly-rate-in-force.ts';
import { showUpRuleOn, type DatedShowUpRule } from './show-up-rule.ts';

/** A pause of up to this long after midnight still belongs to the evening's shift (common practice, no source). */
const SAME_SHIFT_SECONDS = 2 * 3600;
const BEFORE = 'before this week';

export interface ShowUpWeek {
  person: PayPerson;
  spans: readonly WorkSpan[];
  entries: readonly PayEntry[];
  rules: readonly DatedShowUpRule[];
  placeId: string | null;
  zone: string;
  /** A day that still runs at its `asOf` is not short yet. */
  grid: WeekGrid;
  minimumWage: Exact;
  /** Days of paid hours off and days away: leaving for them is not being sent home. */
  isOff: (day: string) => boolean;
  rateOn: (day: string) => HourlyRate | null;
}

/**
 * Pay for the hours that lack on days a person came and worked less than the rule's. These hours are not worked: they
 * stay out of the regular rate and out of overtime (29 CFR 778.220). Never below the minimum wage an hour. One line a
 * day, rounded once. A salary or a day rate pays its days whole and gets none.
 */
export function showUpLines(week: ShowUpWeek): PayLine[] {
  return [...secondsByShift(week)].flatMap(([day, seconds]) => {
    const dated = showUpRuleOn(week.rules, 'show_up', week.placeId, day);
    if (dated === null || week.isOff(day) || !isOver(day, week)) return [];
    const worked = hoursOf(seconds);
    const missing = exact(dated.rule.hours).sub(worked);
    const rate = week.rateOn(day);
    if (missing.lte(0) || rate?.isPaidWhole) return [];
    return [showUpLine(week, dated, day, { worked, missing, rate })];
  });
}

function showUpLine(
  { person, minimumWage }: ShowUpWeek,
  dated: DatedShowUpRule & { rule: { hours: string } },
  day: string,
  { worked, missing, rate }: { worked: Exact; missing: Exact; rate: HourlyRate | null },
): PayLine {
  const value = greatest(minimumWage, rate === null ? minimumWage : exact(rate.value));
  const isRaised = rate === null || value.gt(exact(rate.value));
  const amountCents = toCents(missing.mul(value));
  const least = `${shortText(exact(dated.rule.hours))} h`;
  const short = `${shortText(missing)} h`;
  return aLine({
    key: `show_up_pay:${day}`,
    personId: person.id,
    kind: 'show_up_pay',
    label: 'Show-up pay',
    workedOn: day,
    hours: fractionText(missing),
    rate: fractionText(value),
    amountCents,
    rule: '29 CFR 778.220; hours by the law of the place, as the owner entered them',
    working: [
      {
        label: `What ${person.name} worked that day`,
        note: formatDay(day),
        arithmetic: hoursAndMinutes(worked),
        result: `${shortText(worked)} h`,
        sources: [],
      },
      {
        label: `Up to ${least} are paid`,
        note: `Since ${formatDate(dated.startsOn)}. Hours that were not worked: outside the regular rate and overtime`,
        arithmetic: `${least} less ${shortText(worked)} h`,
        result: short,
        sources: [{ kind: 'rule', id: dated.id, label: `Show-up pay, ${least}` }],
      },
      {
        label: 'At the hourly rate',
        note: isRaised ? 'The minimum wage, as no higher hourly rate is set' : rate.note,
        arithmetic: `${short} times ${isRaised ? decimalText(value, 2) : rateText(rate.value)}`,
        result: centsText(amountCents),
        sources: isRaised || rate === null ? [] : [rate.source],
      },
    ],
  });
}

/**
 * Worked seconds by the day on which a shift began. Who came and was sent home at once shows by a clock entry. A shift
 * over the week's edge is looked at whole: its hours before the week are another week's day.
 */
function secondsByShift({ spans, entries, grid, zone }: ShowUpWeek): Map<string, number> {
  const byDay = new Map<string, number>();
  const entryOf = (id: string): PayEntry | undefined => entries.find((entry) => entry.id === id);
  let last: { day: string; to: number } | null = null;
  for (const span of [...spans].sort((a, b) => a.from - b.from)) {
    const entry = entryOf(span.entryId);
    const began = entry !== undefined && secondsOf(entry.startedAt) < grid.from ? BEFORE : span.date;
    const goesOn: boolean = last !== null && last.day !== span.date && span.from - last.to <= SAME_SHIFT_SECONDS;
    const day: string = goesOn && last !== null ? last.day : began;
    const beyond = span.to === grid.to && entry?.endedAt ? Math.max(0, secondsOf(entry.endedAt) - grid.to) : 0;
    byDay.set(day, (byDay.get(day) ?? 0) + span.to - span.from + beyond);
    last = { day, to: span.to };
  }
  byDay.delete(BEFORE);
  for (const { startedAt, endedAt, kind } of entries) {
    const at = secondsOf(startedAt);
    const day = dayOf(startedAt, zone);
    const isNew = endedAt !== null && kind !== 'meal_break' && at >= grid.from && at < grid.to;
    if (isNew && !byDay.has(day) && !spans.some((span) => span.date === day)) byDay.set(day, 0);
  }
  return new Map([...byDay].sort(([a], [b]) => (a < b ? -1 : 1)));
}

function isOver(day: string, { zone, grid }: ShowUpWeek): boolean {
  return secondsOf(dayBounds(day, zone).endsAt) <= grid.asOf;
}
