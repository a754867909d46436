import { exact, ONE, type Exact } from '../../money/exact.ts';
import { shortText } from '../../money/rounding.ts';

/** N parts of water to 1 part of concentrate, "N:1"; straight is no water at all. */
export interface DilutionRatio {
  waterParts: Exact;
}

/** A mix that can't be made: the message says why and what to do. */
export class MixError extends RangeError {}

export const STRAIGHT: DilutionRatio = { waterParts: exact(0) };

/**
 * @param waterParts parts of water to one part of concentrate
 * @throws {MixError} unless it is more than zero: "straight" is said in words, never with a zero
 */
export function ratioOf(waterParts: Exact): DilutionRatio {
  if (waterParts.lte(0)) throw new MixError('A ratio needs more than 0 parts of water; undiluted is called straight.');
  return { waterParts };
}

/**
 * The ratio two amounts make, both in one unit.
 * @throws {MixError} where there is no concentrate, or less than no water
 */
export function ratioFromAmounts(concentrate: Exact, water: Exact): DilutionRatio {
  if (concentrate.lte(0)) throw new MixError('Without concentrate there is no ratio: give more than 0 of it.');
  if (water.lt(0)) throw new MixError('The water may not be negative.');
  return { waterParts: water.div(concentrate) };
}

/**
 * The ratio of a share of the finished mix: 12.5 % is 7:1, and 10 % is 9:1, not 10:1.
 * @throws {MixError} unless the percentage is more than 0 and at most 100
 */
export function ratioOfPercent(percent: Exact): DilutionRatio {
  if (percent.lte(0) || percent.gt(100))
    throw new MixError('A percentage of concentrate is more than 0 and at most 100.');
  return { waterParts: exact(100).div(percent).sub(ONE) };
}

/** All parts together: the bottle is N + 1 of them. */
export function totalParts(ratio: DilutionRatio): Exact {
  return ratio.waterParts.add(ONE);
}

/** Concentrate's share of the finished mix by volume, 0 to 1. */
export function concentrateShare(ratio: DilutionRatio): Exact {
  return ONE.div(totalParts(ratio));
}

export function isStraight(ratio: DilutionRatio): boolean {
  return ratio.waterParts.equals(0);
}

/** "10:1", "85.3333:1" (at most four places) or "straight". */
export function ratioText(ratio: DilutionRatio): string {
  return isStraight(ratio) ? 'straight' : `${shortText(ratio.waterParts)}:1`;
}
