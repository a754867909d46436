import { exact, fractionText, type Exact } from '../money/exact.ts';
import { decimalText, shortText } from '../money/rounding.ts';
import { formatDay } from '../time/format.ts';
import type { ClockKind, DatedRate, SourceRef } from './pay-week.types.ts';
import type { WorkSpan } from './work-spans.ts';

const KIND_WORDS: Record<ClockKind, string> = {
  job: 'Job work',
  travel: 'Travel',
  waiting: 'Waiting',
  shop: 'Shop work',
  training: 'Training',
  rest_break: 'Rest break',
  meal_break: 'Meal break that counts as worked',
};

export function kindWords(kind: ClockKind): string {
  return KIND_WORDS[kind];
}

/** "42 h 15 min", to the second only where there are seconds. */
export function hoursAndMinutes(hours: Exact): string {
  const seconds = Number(fractionText(hours.mul(3600)));
  const parts = [`${Math.floor(seconds / 3600)} h`, `${Math.floor((seconds % 3600) / 60)} min`];
  if (seconds % 60 !== 0) parts.push(`${seconds % 60} s`);
  return parts.join(' ');
}

/** Worked seconds per company-zone day, in the order of the week. */
export function secondsByDay(spans: readonly WorkSpan[]): Map<string, number> {
  const byDay = new Map<string, number>();
  for (const span of [...spans].sort((a, b) => a.from - b.from)) {
    byDay.set(span.date, (byDay.get(span.date) ?? 0) + span.to - span.from);
  }
  return byDay;
}

/** "Mon May 4 8:41, Tue May 5 8:27". */
export function workedDays(spans: readonly WorkSpan[]): string {
  return [...secondsByDay(spans)].map(([day, seconds]) => `${formatDay(day)} ${clockText(seconds)}`).join(', ');
}

function clockText(seconds: number): string {
  const two = (value: number): string => String(value).padStart(2, '0');
  const text = `${Math.floor(seconds / 3600)}:${two(Math.floor((seconds % 3600) / 60))}`;
  return seconds % 60 === 0 ? text : `${text}:${two(seconds % 60)}`;
}

/** "19.50", or as many places as the rate has. */
export function rateText(value: string): string {
  const short = shortText(exact(value));
  const cents = decimalText(exact(value), 2);
  return exact(short).equals(exact(cents)) ? cents : short;
}

export function rateSource(rate: DatedRate): SourceRef {
  const value = rate.kind === 'commission_percent' ? `${shortText(exact(rate.value))} %` : rateText(rate.value);
  return { kind: 'rate', id: rate.id, label: `${value} since ${rate.startsOn}` };
}
