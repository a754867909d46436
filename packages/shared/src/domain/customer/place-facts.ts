/** Where the drain at an address leads. What may go into it is for the local code to say. */
export const drains = ['unknown', 'sewer', 'storm', 'soakaway'] as const;
export type Drain = (typeof drains)[number];
export const drainNames: Record<Drain, string> = {
  unknown: 'Not known',
  sewer: 'To the sewer',
  storm: 'To a creek or storm drain',
  soakaway: 'Soakaway or lawn',
};

/** What becomes of the wash water there. */
export const washWaters = ['reclaim', 'mat', 'lawn', 'wash_bay'] as const;
export type WashWater = (typeof washWaters)[number];
export const washWaterNames: Record<WashWater, string> = {
  reclaim: 'Reclaimed and taken along',
  mat: 'Caught on a mat',
  lawn: 'Onto the lawn',
  wash_bay: 'In a wash bay',
};
