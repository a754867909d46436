import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { shortText } from '@driprail/shared/domain/money/rounding';
import { rateText } from './ledger.ts';

/** Rates that have started and that no later one of the same kind, person, service and kind of work has followed. */
export function ratesOn(rates: readonly RateDto[], day: string): RateDto[] {
  const newest = new Map<string, RateDto>();
  for (const rate of [...rates].sort((a, b) => a.startsOn.localeCompare(b.startsOn))) {
    if (rate.startsOn <= day) newest.set(rateKey(rate), rate);
  }
  return [...newest.values()];
}

/** What makes one row of start-dated bands. */
export function rateKey({ kind, personId, serviceId, clockKind }: RateDto): string {
  return [kind, personId, serviceId, clockKind].join(':');
}

/** How a person is paid on a day, in a few words: "19.50 an hour, 6% on 3 services"; short, "Hourly, 6% on 3 services". */
export function planWords(rates: readonly RateDto[], personId: string, day: string, isShort = false): string {
  const own = ratesOn(rates, day).filter((rate) => rate.personId === null || rate.personId === personId);
  const hourly = own.filter((rate) => rate.kind === 'hourly' && rate.clockKind === null && rate.serviceId === null);
  const hour = hourly.find((rate) => rate.personId !== null) ?? hourly[0];
  const hourWords = isShort ? 'Hourly' : `${rateText(hour?.value ?? null)} an hour`;
  const parts = [hour ? hourWords : 'No hourly rate', ...commissionWords(own)];
  if (!isShort && own.some((rate) => rate.kind === 'flat_service' && exact(rate.value).gt(0))) parts.push('flat lines');
  return parts.join(', ');
}

function commissionWords(own: readonly RateDto[]): string[] {
  const byService = new Map<string | null, RateDto>();
  for (const rate of own.filter((r) => r.kind === 'commission_percent')) {
    if (rate.personId !== null || !byService.has(rate.serviceId)) byService.set(rate.serviceId, rate);
  }
  const counts = new Map<string, number>();
  for (const [serviceId, { value }] of byService) {
    if (exact(value).lte(0)) continue;
    const percent = `${shortText(exact(value))}%`;
    counts.set(percent, serviceId === null ? Infinity : (counts.get(percent) ?? 0) + 1);
  }
  return [...counts].map(([percent, count]) =>
    count === Infinity ? `${percent} of each line` : `${percent} on ${count === 1 ? '1 service' : `${count} services`}`,
  );
}

/** The rules in force on a day; before the first ones, the first ones. */
export function rulesOn(rules: readonly PayRulesDto[], day: string): PayRulesDto | null {
  const sorted = [...rules].sort((a, b) => b.startsOn.localeCompare(a.startsOn));
  return sorted.find((rule) => rule.startsOn <= day) ?? sorted.at(-1) ?? null;
}
