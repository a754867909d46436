import type { SizeClass } from '../../contracts/fields.ts';

/** Bodies that have an outline. */
export const bodies = ['coupe', 'sedan', 'hatchback', 'suv', 'pickup', 'van'] as const;
export type Body = (typeof bodies)[number];
export const bodyNames: Record<Body, string> = {
  coupe: 'Coupe',
  sedan: 'Sedan',
  hatchback: 'Hatchback or wagon',
  suv: 'SUV',
  pickup: 'Pickup',
  van: 'Van',
};

const bySize: Record<SizeClass, Body> = {
  coupe: 'coupe',
  sedan: 'sedan',
  small_suv: 'suv',
  large_suv: 'suv',
  van: 'van',
};

/** The outline to begin with: what the car's words say, else its size class. The crew may choose another. */
export function bodyOf(sizeClass: SizeClass, label: string): Body {
  if (/hatch|wagon/i.test(label)) return 'hatchback';
  if (/pickup|truck/i.test(label)) return 'pickup';
  return bySize[sizeClass];
}
