/** What a crew reports from a visit, in the order in which it is offered. */
export const troubleKinds = [
  'nobody_home',
  'no_access',
  'no_water',
  'weather',
  'damage',
  'unsafe',
  'van_trouble',
  'running_late',
  'other',
] as const;
export const troubleNames: Record<(typeof troubleKinds)[number], string> = {
  nobody_home: 'Nobody home',
  no_access: 'No access',
  no_water: 'No water',
  weather: 'Weather',
  damage: 'Damage found',
  unsafe: 'Unsafe',
  van_trouble: 'Van trouble',
  running_late: 'Running late',
  other: 'Other',
};
