import type { MarkKind, MarkSize } from '@driprail/shared/domain/walk-round/marks';

interface SeenMark {
  /** A place of the outline. */
  place: string;
  kind: MarkKind;
  size: MarkSize;
  note?: string;
}

/** What crews of the demo find on cars. */
export const seenMarks: readonly SeenMark[] = [
  { place: 'front bumper', kind: 'chip', size: 'small', note: 'Three stone chips' },
  { place: 'left front door', kind: 'dent', size: 'small', note: 'Door ding' },
  { place: 'right rear door', kind: 'scratch', size: 'medium' },
  { place: 'hood', kind: 'swirl', size: 'large' },
  { place: 'right front wheel', kind: 'curb_rash', size: 'medium' },
  { place: 'left rear wheel', kind: 'curb_rash', size: 'small' },
  { place: 'trunk', kind: 'etching', size: 'small', note: 'Bird lime, old' },
  { place: 'rear bumper', kind: 'scratch', size: 'large', note: 'Loading edge' },
  { place: 'windshield', kind: 'cracked_glass', size: 'small', note: 'Star, passenger side' },
  { place: 'roof', kind: 'etching', size: 'medium', note: 'Tree sap' },
  { place: 'left rear fender', kind: 'dent', size: 'medium' },
  { place: 'right front fender', kind: 'loose_part', size: 'small', note: 'Liner clip is missing' },
];

export const leftItems = ['Umbrella and a bag on the rear seat', 'Sunglasses in the console', 'Tool box in the trunk'];

/** The crews of the demo begin with marks and signatures; their photos would be somebody's cars. */
export const NO_PHOTOS = 'Photos begin with the new phones';
/** One of the reasons the phone offers. */
export const FLEET_SKIP = 'Fleet car, marks are known';
