/** Finishes of a wheel, the usual first. */
export const wheelFinishes = [
  'unsure',
  'painted',
  'clear_coated',
  'powder_coated',
  'chrome',
  'polished',
  'bare',
] as const;
export type WheelFinish = (typeof wheelFinishes)[number];
export const wheelFinishNames: Record<WheelFinish, string> = {
  unsure: 'Unsure, treat as bare metal',
  painted: 'Painted',
  clear_coated: 'Clear-coated',
  powder_coated: 'Powder-coated',
  chrome: 'Chrome',
  polished: 'Polished metal',
  bare: 'Bare metal',
};

/** Acid stays off these (the house's rule, common practice, no source). Unsure counts as bare: the careful mistake. */
export function countsAsBare(finish: WheelFinish): boolean {
  return finish === 'unsure' || finish === 'bare' || finish === 'polished';
}
