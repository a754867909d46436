import { kilometersBetween, type Coordinates } from '../board/travel.ts';

/** WGS 84 semi-axes, meters. */
export const WGS84 = { a: 6_378_137, b: 6_356_752.3142 } as const;

/** IUGG mean radius R1 = (2a + b) / 3, in the unit of the axes. */
export function meanRadius(a: number, b: number): number {
  return (2 * a + b) / 3;
}

/** The mean radius in kilometers to four places, as it is used: 6371.0088. */
export const IUGG_KM = Math.round(meanRadius(WGS84.a, WGS84.b) * 10) / 10_000;

/** The angle between two places seen from the center of the earth, in radians. */
export function centralAngle(from: Coordinates, to: Coordinates): number {
  return kilometersBetween(from, to) / IUGG_KM;
}

/** Road distance / straight line: research on transport (first two, a wikibook quoting it); the default is common practice. */
export const CIRCUITY = {
  urbanRandomPoints: 1.2,
  stationCatchments: [1.21, 1.23],
  default: 1.3,
  range: [1.2, 1.4],
} as const;

/**
 * Drive of a straight-line distance.
 * @param circuity at least 1
 * @param speed per hour in the distance's unit, more than 0
 * @throws {RangeError} for anything else
 */
export function roadTrip(straight: number, circuity: number, speed: number): { road: number; minutes: number } {
  if (!(straight >= 0)) throw new RangeError('A distance may not be negative.');
  if (!(circuity >= 1))
    throw new RangeError('A road is never shorter than the straight line: the factor is 1 or more.');
  if (!(speed > 0)) throw new RangeError('A speed is more than 0.');
  const road = straight * circuity;
  return { road, minutes: (road / speed) * 60 };
}
