import { sizeClasses } from '@driprail/shared/contracts/fields';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { parseMoney } from '../../../lib/format.ts';

/** Prices and minutes as they are typed. */
export type PriceTexts = Record<SizeClass, { price: string; minutes: string }>;

export function textsOf(service: ServiceDto | null): PriceTexts {
  const entries = sizeClasses.map((size) => {
    const price = service?.prices.find((p) => p.sizeClass === size);
    return [
      size,
      { price: price ? (price.priceCents / 100).toFixed(2) : '', minutes: price ? String(price.minutes) : '' },
    ];
  });
  return Object.fromEntries(entries) as PriceTexts;
}

/** What was typed as prices, or what is wrong at which field. */
export function readPrices(texts: PriceTexts) {
  const fields: Record<string, string> = {};
  const prices = sizeClasses.flatMap((size) => {
    const { price, minutes } = texts[size];
    if (price.trim() === '' && minutes.trim() === '') return [];
    const priceCents = parseMoney(price);
    const whole = /^\d{1,5}$/.test(minutes.trim()) ? Number(minutes) : 0;
    if (priceCents === null || priceCents < 0) fields[`price.${size}`] = 'Give an amount like 240.00.';
    if (whole < 5) fields[`minutes.${size}`] = 'At least 5 minutes.';
    return [{ sizeClass: size, priceCents: priceCents ?? 0, minutes: whole }];
  });
  if (prices.length === 0) fields['prices'] = 'Give a price for at least one size class.';
  return { prices, fields };
}
