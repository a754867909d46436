import { exact, fractionText, hoursOf, ZERO, type Exact } from '../money/exact.ts';
import { centsText, shortText, toCents } from '../money/rounding.ts';
import { formatDate } from '../time/format.ts';
import { rateInForce } from './dated-rates.ts';
import { aLine } from './pay-line.ts';
import type { DatedRate, DoneLine, PayLine, PayPerson, SourceRef } from './pay-week.types.ts';
import { hoursAndMinutes, kindWords, rateSource, rateText, workedDays } from './working-words.ts';
import type { WorkSpan } from './work-spans.ts';

/** What an hour of some worked time is paid. */
export interface TimePrice {
  /** One line for each; stable within a week. */
  key: string;
  label: string;
  /** Decimal dollars an hour. */
  value: string;
  startsOn: string;
  source: SourceRef;
  rule: string;
}

export interface HourlyPay {
  lines: PayLine[];
  /** Exact hours for which there was no price. */
  unpaidHours: Exact;
  /** Exact dollars of the lines that pay for rest breaks. */
  restPaid: Exact;
}

const RULE = 'Worked time times the dated rate; 29 CFR 778.110';

/** One line per price: the hours it applied to times the price, rounded once, half up. */
export function hourlyPay(
  person: PayPerson,
  spans: readonly WorkSpan[],
  priceOf: (span: WorkSpan) => TimePrice | null,
): HourlyPay {
  const groups = new Map<string, { price: TimePrice; spans: WorkSpan[] }>();
  let unpaidHours = ZERO;
  let restPaid = ZERO;
  for (const span of spans) {
    const price = priceOf(span);
    const hours = hoursOf(span.to - span.from);
    if (price === null) {
      unpaidHours = unpaidHours.add(hours);
      continue;
    }
    if (span.kind === 'rest_break') restPaid = restPaid.add(hours.mul(exact(price.value)));
    const group = groups.get(price.key) ?? { price, spans: [] };
    group.spans.push(span);
    groups.set(price.key, group);
  }
  const lines = [...groups.values()].map((group) => timeLine(person, group.price, group.spans));
  return { lines, unpaidHours, restPaid };
}

/**
 * The dated rate for a piece of worked time, as a price. Time on a visit whose finished services have an hourly rate
 * of their own takes the best of them.
 */
export function datedPrice(
  person: PayPerson,
  rates: readonly DatedRate[],
  doneLines: readonly DoneLine[],
): (span: WorkSpan) => TimePrice | null {
  return (span) => {
    const own = span.kind === 'job' ? doneLines.filter((line) => line.visitId === span.visitId) : [];
    const question = { kind: 'hourly', personId: person.id, clockKind: span.kind, date: span.date } as const;
    const found = [null, ...new Set(own.map((line) => line.serviceId))].flatMap((serviceId) => {
      const rate = rateInForce(rates, { ...question, serviceId });
      return rate === null ? [] : [rate];
    });
    const ofServices = found.filter((rate) => rate.serviceId !== null);
    const rate = best(ofServices.length > 0 ? ofServices : found);
    if (rate === null) return null;
    const service = own.find((line) => line.serviceId === rate.serviceId)?.serviceName;
    const what = service ?? (rate.clockKind === null ? null : kindWords(rate.clockKind));
    return {
      key: `hourly:${rate.id}:${rate.clockKind ?? 'all'}`,
      label: what === null ? 'Hours by the clock' : `${what}, by the clock`,
      value: rate.value,
      startsOn: rate.startsOn,
      source: rateSource(rate),
      rule: RULE,
    };
  };
}

function best(rates: readonly DatedRate[]): DatedRate | null {
  return rates.reduce<DatedRate | null>(
    (most, rate) => (most === null || exact(rate.value).gt(exact(most.value)) ? rate : most),
    null,
  );
}

/** Worked time times a price. */
export function timeLine(person: PayPerson, price: TimePrice, spans: readonly WorkSpan[]): PayLine {
  const hours = hoursOf(spans.reduce((total, span) => total + span.to - span.from, 0));
  const amountCents = toCents(hours.mul(exact(price.value)));
  const words = rateText(price.value);
  return aLine({
    key: price.key,
    personId: person.id,
    kind: 'hourly',
    label: price.label,
    hours: fractionText(hours),
    rate: price.value,
    amountCents,
    inRegularRate: true,
    rule: price.rule,
    working: [
      {
        label: `What ${person.name} worked`,
        note: workedDays(spans),
        arithmetic: hoursAndMinutes(hours),
        result: `${shortText(hours)} h`,
        sources: entrySources(spans),
      },
      {
        label: 'By the hour',
        note: `${words} since ${formatDate(price.startsOn)}`,
        arithmetic: `${shortText(hours)} h times ${words}`,
        result: centsText(amountCents),
        sources: [price.source],
      },
    ],
  });
}

function entrySources(spans: readonly WorkSpan[]): PayLine['working'][number]['sources'] {
  return [...new Map(spans.map((span) => [span.entryId, span])).values()].map((span) => ({
    kind: 'clock_entry' as const,
    id: span.entryId,
    label: `${kindWords(span.kind)}, ${span.date}`,
  }));
}
