import type { Geocoder } from './geocoder.ts';
import { localGeocoder } from './local-geocoder.ts';

export type { Geocoder } from './geocoder.ts';

/** The stand-in for the demo and tests; a company of its own has none yet, and types its places by hand. */
export function geocoderFor({ seedsDemo, isTest }: { seedsDemo: boolean; isTest: boolean }): Geocoder | null {
  return seedsDemo || isTest ? localGeocoder() : null;
}
