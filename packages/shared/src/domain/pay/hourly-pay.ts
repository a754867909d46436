import { exact, fractionText, hoursOf, ZERO, type Exact } from '../money/exact.ts';
import { centsText, shortText, toCents } from '../money/rounding.ts';
import { formatDate } from '../time/format.ts';
import { rateInForce } from './dated-rates.ts';
import { aLine } from './pay-line.ts';
import type { DatedRate, PayLine, PayPerson } from './pay-week.types.ts';
import { hoursAndMinutes, kindWords, rateSource, rateText, workedDays } from './working-words.ts';
import type { WorkSpan } from './work-spans.ts';

interface RateGroup {
  rate: DatedRate;
  spans: WorkSpan[];
}

export interface HourlyPay {
  lines: PayLine[];
  /** Exact hours for which no hourly rate had started. */
  unpaidHours: Exact;
}

/** One line per dated rate: the hours it applied to times the rate, rounded once, half up. */
export function hourlyPay(person: PayPerson, spans: readonly WorkSpan[], rates: readonly DatedRate[]): HourlyPay {
  const groups = new Map<string, RateGroup>();
  let unpaidHours = ZERO;
  for (const span of spans) {
    const rate = rateInForce(rates, {
      kind: 'hourly',
      personId: person.id,
      serviceId: null,
      clockKind: span.kind,
      date: span.date,
    });
    if (rate === null) {
      unpaidHours = unpaidHours.add(hoursOf(span.to - span.from));
      continue;
    }
    const group = groups.get(rate.id) ?? { rate, spans: [] };
    group.spans.push(span);
    groups.set(rate.id, group);
  }
  return { lines: [...groups.values()].map((group) => hourlyLine(person, group)), unpaidHours };
}

function hourlyLine(person: PayPerson, { rate, spans }: RateGroup): PayLine {
  const hours = hoursOf(spans.reduce((total, span) => total + span.to - span.from, 0));
  const amountCents = toCents(hours.mul(exact(rate.value)));
  const price = rateText(rate.value);
  return aLine({
    key: `hourly:${rate.id}:${rate.clockKind ?? 'all'}`,
    personId: person.id,
    kind: 'hourly',
    label: rate.clockKind === null ? 'Hours by the clock' : `${kindWords(rate.clockKind)}, by the clock`,
    hours: fractionText(hours),
    rate: rate.value,
    amountCents,
    inRegularRate: true,
    rule: 'Worked time times the dated rate; 29 CFR 778.110',
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
        note: `${price} since ${formatDate(rate.startsOn)}`,
        arithmetic: `${shortText(hours)} h times ${price}`,
        result: centsText(amountCents),
        sources: [rateSource(rate)],
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
