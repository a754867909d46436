/** Great-circle distance on a sphere of the IUGG mean radius, 6371.0088 km; haversine formula (common knowledge). */
const EARTH_KM = 6371.0088;

export interface Coordinates {
  lat: number;
  lng: number;
}

export function kilometersBetween(a: Coordinates, b: Coordinates): number {
  const rad = Math.PI / 180;
  const dLat = (b.lat - a.lat) * rad;
  const dLng = (b.lng - a.lng) * rad;
  const h = Math.sin(dLat / 2) ** 2 + Math.cos(a.lat * rad) * Math.cos(b.lat * rad) * Math.sin(dLng / 2) ** 2;
  return 2 * EARTH_KM * Math.asin(Math.min(1, Math.sqrt(h)));
}

export const KM_PER_MILE = 1.609344;

/** Roads are longer than the crow flies, towns are slow, and a crew parks and packs: common practice, no source. */
const ROAD_FACTOR = 1.3;
const TOWN_KM_PER_HOUR = 38;
const PACK_MINUTES = 4;
const UNKNOWN_MINUTES = 15;

export interface Travel {
  minutes: number;
  /** Null where an address has no coordinates. */
  kilometers: number | null;
  isEstimate: true;
}

/** An estimate of the drive between two stops, in whole minutes; 0 at the same address. */
export function estimateTravel(a: Coordinates | null, b: Coordinates | null): Travel {
  if (!a || !b) return { minutes: UNKNOWN_MINUTES, kilometers: null, isEstimate: true };
  const kilometers = kilometersBetween(a, b) * ROAD_FACTOR;
  if (kilometers < 0.02) return { minutes: 0, kilometers: 0, isEstimate: true };
  return { minutes: Math.ceil((kilometers / TOWN_KM_PER_HOUR) * 60 + PACK_MINUTES), kilometers, isEstimate: true };
}
