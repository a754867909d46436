import { dollars, exact, sum, ZERO, type Exact } from '../money/exact.ts';
import type { TimePrice } from './hourly-pay.ts';
import { totalCents } from './pay-line.ts';
import type { PayLine } from './pay-week.types.ts';
import { halfTimeOnAmount } from './regular-rate.ts';
import type { WeekPremium } from './week-premium.ts';
import type { WorkSpan } from './work-spans.ts';

export interface RateInEffectQuestion {
  /** The federal premium by the weighted average, which it takes the place of. */
  average: WeekPremium;
  spans: readonly WorkSpan[];
  priceOf: (span: WorkSpan) => TimePrice | null;
  /** Lines inside the regular rate. */
  included: readonly PayLine[];
  hours: Exact;
  minimumWage: Exact;
}

/**
 * Overtime by the rate in effect when the overtime hours were worked, by an agreement made before the work (29 USC
 * 207(g)(2); 29 CFR 778.419), with separate half time on everything else that counts. Where a rate is missing or under
 * the minimum wage the agreement does not hold and the weighted average stands (29 CFR 778.115).
 */
export function rateInEffectPremium(question: RateInEffectQuestion): WeekPremium {
  const { average, included, hours, minimumWage, spans, priceOf } = question;
  const rates = spans.map((span) => priceOf(span)?.value ?? '0');
  if (average.split.overtime.lte(0) || rates.some((rate) => exact(rate).lt(minimumWage))) return average;
  const parts = overtimeParts(question);
  const worth = sum(parts.map(({ hours: length, rate }) => length.mul(exact(rate))));
  const other = dollars(totalCents(included.filter((line) => line.kind !== 'hourly')));
  const onOther = halfTimeOnAmount(other, hours, average.split.overtime);
  return { ...average, inEffect: { parts, onOther }, premium: worth.div(2).add(onOther) };
}

/** The last hours of the week, beyond the straight ones, by the rate each was worked at; in the order of the week. */
function overtimeParts({ average, spans, priceOf }: RateInEffectQuestion): { hours: Exact; rate: string }[] {
  const byRate = new Map<string, Exact>();
  let straight = average.split.straight.mul(3600);
  for (const span of [...spans].sort((a, b) => a.from - b.from)) {
    const length = exact(span.to - span.from);
    const beyond = length.sub(straight);
    straight = straight.gt(length) ? straight.sub(length) : ZERO;
    if (beyond.lte(0)) continue;
    const rate = priceOf(span)?.value ?? '0';
    byRate.set(rate, (byRate.get(rate) ?? ZERO).add(beyond.div(3600)));
  }
  return [...byRate].map(([rate, hours]) => ({ rate, hours }));
}
