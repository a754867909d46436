import type { TaxRateDto } from '@driprail/shared/contracts/taxes.contract';

export interface TaxGroup {
  key: string;
  name: string;
  place: string;
  taxClass: TaxRateDto['taxClass'];
  /** Newest first. */
  rates: { id: string; percent: string; startsOn: string; setBy: string; standing: 'past' | 'now' | 'ahead' }[];
}

const plain = (text: string) => text.trim().toLowerCase();

/** Rates of one name, place and class together, each with whether it holds today. @param rates newest first within each */
export function taxGroups(rates: readonly TaxRateDto[], today: string): TaxGroup[] {
  const groups = new Map<string, TaxGroup>();
  for (const rate of rates) {
    const { name, place, taxClass } = rate;
    const key = `${plain(name)}/${plain(place)}/${taxClass}`;
    const group = groups.get(key) ?? { key, name, place, taxClass, rates: [] };
    groups.set(key, group);
    const isNow = rate.startsOn <= today && !group.rates.some(({ standing }) => standing === 'now');
    const standing = rate.startsOn > today ? 'ahead' : isNow ? 'now' : 'past';
    group.rates.push({ id: rate.id, percent: rate.percent, startsOn: rate.startsOn, setBy: rate.setBy, standing });
  }
  return [...groups.values()];
}
