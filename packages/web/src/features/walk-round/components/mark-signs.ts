import type { MarkKind } from '@driprail/shared/domain/walk-round/marks';

/** A sign for each kind of mark on a grid of 20, strokes alone: what it looks like on the car. */
export const signOf: Record<MarkKind, string> = {
  scratch: 'M4 3l5 5-3 3 8 6',
  chip: 'M10 4l7 12H3z',
  dent: 'M17 10a7 7 0 1 1-14 0 7 7 0 0 1 14 0M11 10h-2',
  swirl: 'M10 10a2 2 0 1 1 3 2 5 5 0 1 1-1-8 8 8 0 0 1 4 9',
  stain: 'M4 4h12v12H4zM4 10l6-6M4 16 16 4M10 16l6-6',
  tear: 'M3 6l5 3 3-2 6 2M3 13l5-1 3 3 6-3',
  etching: 'M5 5v.1M10 4v.1M15 6v.1M6 10v.1M11 10v.1M15 12v.1M7 15v.1M12 16v.1',
  curb_rash: 'M3 14a8 8 0 0 1 14 0M6 16l1-3M10 15v-3M14 16l-1-3',
  cracked_glass: 'M10 10 3 5M10 10l8-5M10 10l-4 8M10 10l6 7M10 10V3',
  burn: 'M10 3c4 4 6 6 6 9a6 6 0 0 1-12 0c0-2 1-3 2-4 1 2 2 2 3 2 0-3 0-5 1-7z',
  loose_part: 'M4 4h8v8H4zM12 12l5 5M17 13v4h-4',
  warning_lamp: 'M10 3l8 14H2zM10 8v4M10 14.4v.2',
};
