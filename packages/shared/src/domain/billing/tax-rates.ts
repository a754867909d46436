import { exact } from '../money/exact.ts';

/** What a service is taxed as. Which services are taxed, and how much, differs by place: the owner enters it. */
export const taxClasses = ['standard', 'reduced', 'untaxed'] as const;
export type TaxClass = (typeof taxClasses)[number];
export const taxClassNames: Record<TaxClass, string> = {
  standard: 'Taxed',
  reduced: 'Taxed at another rate',
  untaxed: 'Not taxed',
};

export interface TaxRate {
  /** As on the invoice, "State sales tax". */
  name: string;
  taxClass: TaxClass;
  /** The town it holds in; empty for everywhere. */
  place: string;
  /** Percent as a decimal string; "0" ends a tax. */
  percent: string;
  /** First day in force, company zone. */
  startsOn: string;
}
export type TaxInForce = Omit<TaxRate, 'startsOn'>;

/**
 * The taxes in force on a day at a place: of each name and class the one that started last, a town's own before the one
 * that holds everywhere. Taxes of different names add up.
 * @param on company-zone day of the invoice
 * @param place the town of the job's address; capitals and spaces at the ends don't matter
 */
export function taxesInForce(rates: readonly TaxRate[], on: string, place: string): TaxInForce[] {
  const here = plain(place);
  const chosen = new Map<string, TaxRate>();
  for (const rate of rates) {
    if (rate.startsOn > on || !(rate.place === '' || plain(rate.place) === here)) continue;
    const key = `${plain(rate.name)}/${rate.taxClass}`;
    const other = chosen.get(key);
    if (!other || isCloser(rate, other)) chosen.set(key, rate);
  }
  return [...chosen.values()]
    .filter((rate) => !exact(rate.percent).equals(0))
    .map(({ startsOn: _startsOn, ...rate }) => rate)
    .sort((a, b) => a.name.localeCompare(b.name) || a.taxClass.localeCompare(b.taxClass));
}

function isCloser(rate: TaxRate, other: TaxRate): boolean {
  if ((rate.place === '') !== (other.place === '')) return rate.place !== '';
  return rate.startsOn > other.startsOn;
}

const plain = (text: string): string => text.trim().toLowerCase();
