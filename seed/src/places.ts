import type { Coordinates } from '@driprail/shared/domain/board/travel';
import type { Random } from './random.ts';

/**
 * Ternmouth is invented: its coordinates lie in open sea, so that no map shows a real home.
 * The town is about nine by eight kilometers; drives take 5 to 25 minutes.
 */
const MIDDLE: Coordinates = { lat: 40.62, lng: -70.35 };
const KM_PER_DEGREE = 111.2;

export interface Area {
  name: string;
  streets: readonly string[];
  place: Coordinates;
}

/** Where the vans stand at night, on Slip End by the water. */
export const SHOP: Coordinates = placeAt(0.4, -0.6);

export const areas: readonly Area[] = [
  area('Saltpan Lane', -3.9, 1.2, ['Saltpan Lane', 'Brine Street', 'Rake Lane']),
  area('Old Slip', 0.6, -1.5, ['Old Slip', 'Capstan Street', 'Rope Walk']),
  area('Harbor Row', 1.3, -0.7, ['Harbor Row', 'Lantern Steps', 'Net Street']),
  area('Mill Reach', -1.2, 2.4, ['Mill Reach', 'Sluice Road', 'Grist Lane']),
  area('Larch Hill', 1.0, 3.4, ['Larch Hill', 'Ridge Loop', 'Cone Street']),
  area('Fennel Court', 2.6, 1.8, ['Fennel Court', 'Dill Lane', 'Sorrel Street']),
  area('Cold Harbor', 4.6, -1.9, ['Cold Harbor Road', 'Beacon Loop', 'Shingle Lane']),
  area('Quay Flats', -1.4, -1.6, ['Quay Flats', 'Eelgrass Street', 'Mudlark Lane']),
];

/** A doorstep somewhere in an area. */
export function placeIn({ place }: Area, random: Random): Coordinates {
  const spread = () => (random.next() - 0.5) * 1.1;
  return shifted(place, spread(), spread());
}

function area(name: string, east: number, north: number, streets: readonly string[]): Area {
  return { name, streets, place: placeAt(east, north) };
}

function placeAt(east: number, north: number): Coordinates {
  return shifted(MIDDLE, east, north);
}

/** Moves a place by kilometers. */
function shifted({ lat, lng }: Coordinates, east: number, north: number): Coordinates {
  const round = (degrees: number) => Math.round(degrees * 1e5) / 1e5;
  const kmPerDegreeEast = KM_PER_DEGREE * Math.cos((MIDDLE.lat * Math.PI) / 180);
  return { lat: round(lat + north / KM_PER_DEGREE), lng: round(lng + east / kmPerDegreeEast) };
}
