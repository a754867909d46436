/**
 * The outline's sheet: left side, top and right side (front up), below them front and rear, and the four wheels.
 * All bodies share its grid, so that a mark stays in its place when another outline is chosen. Units of the drawing.
 */
export const sheetSize = { width: 348, height: 560 } as const;

interface Zone {
  place: string;
  /** x, y, width, height in units of the drawing. */
  box: readonly [number, number, number, number];
}

const zones: readonly Zone[] = [
  { place: 'left front fender', box: [0, 0, 110, 122] },
  { place: 'left front door', box: [0, 122, 110, 79] },
  { place: 'left rear door', box: [0, 201, 110, 68] },
  { place: 'left rear fender', box: [0, 269, 110, 105] },
  { place: 'front bumper', box: [110, 0, 128, 44] },
  { place: 'hood', box: [110, 44, 128, 72] },
  { place: 'windshield', box: [110, 116, 128, 44] },
  { place: 'roof', box: [110, 160, 128, 108] },
  { place: 'rear window', box: [110, 268, 128, 38] },
  { place: 'trunk', box: [110, 306, 128, 68] },
  { place: 'right front fender', box: [238, 0, 110, 122] },
  { place: 'right front door', box: [238, 122, 110, 79] },
  { place: 'right rear door', box: [238, 201, 110, 68] },
  { place: 'right rear fender', box: [238, 269, 110, 105] },
  { place: 'front, glass', box: [0, 374, 174, 44] },
  { place: 'front, lamps and grille', box: [0, 418, 174, 26] },
  { place: 'front bumper', box: [0, 444, 174, 36] },
  { place: 'rear, glass', box: [174, 374, 174, 44] },
  { place: 'tailgate and lamps', box: [174, 418, 174, 26] },
  { place: 'rear bumper', box: [174, 444, 174, 36] },
  { place: 'left front wheel', box: [0, 480, 87, 80] },
  { place: 'right front wheel', box: [87, 480, 87, 80] },
  { place: 'left rear wheel', box: [174, 480, 87, 80] },
  { place: 'right rear wheel', box: [261, 480, 87, 80] },
];

/** Places that have no outline; they are picked from the list alone. */
const insidePlaces = [
  'dash and console',
  'front seats',
  'rear seats',
  'carpet and mats',
  'headliner',
  'cargo area',
] as const;

/** Every place by its name, for those who would rather pick than touch. */
export const placeNames: readonly string[] = [...new Set([...zones.map((zone) => zone.place), ...insidePlaces])];

/** @param x thousandths of the sheet's width @param y thousandths of its height */
export function placeAt(x: number, y: number): string {
  const [atX, atY] = [(x / 1000) * sheetSize.width, (y / 1000) * sheetSize.height];
  const found = zones.find(({ box: [left, top, width, height] }) => {
    return atX >= left && atX < left + width && atY >= top && atY < top + height;
  });
  return found?.place ?? 'elsewhere';
}

/** The middle of a named place in thousandths; null for one inside the car, which no outline shows. */
export function middleOf(place: string): { x: number; y: number } | null {
  const zone = zones.find((other) => other.place === place);
  if (!zone) return null;
  const [left, top, width, height] = zone.box;
  return {
    x: Math.round(((left + width / 2) / sheetSize.width) * 1000),
    y: Math.round(((top + height / 2) / sheetSize.height) * 1000),
  };
}
