import { conditionPercents } from '../board/crew-time.ts';

export const surchargedConditions = ['dirty', 'very_dirty'] as const;
export type SurchargedCondition = (typeof surchargedConditions)[number];

/** What comes on top, percent of the line's own price and minutes. */
export interface Surcharge {
  pricePercent: number;
  minutesPercent: number;
}
export type Surcharges = Record<SurchargedCondition, Surcharge>;

/** Until the owner sets others: price and minutes grow alike (common practice, no source). */
export const usualSurcharges: Surcharges = {
  dirty: usual('dirty'),
  very_dirty: usual('very_dirty'),
};

function usual(condition: SurchargedCondition): Surcharge {
  const percent = conditionPercents[condition] - 100;
  return { pricePercent: percent, minutesPercent: percent };
}

export interface DatedSurcharge extends Surcharge {
  condition: SurchargedCondition;
  /** First day in force, company zone. */
  startsOn: string;
}

/** Of each condition the one that started last by a day; the usual one where there is none. */
export function surchargesOn(rows: readonly DatedSurcharge[], day: string): Surcharges {
  const of = (condition: SurchargedCondition): Surcharge => {
    const [last] = rows
      .filter((row) => row.condition === condition && row.startsOn <= day)
      .toSorted((a, b) => b.startsOn.localeCompare(a.startsOn));
    return last ? { pricePercent: last.pricePercent, minutesPercent: last.minutesPercent } : usualSurcharges[condition];
  };
  return { dirty: of('dirty'), very_dirty: of('very_dirty') };
}
