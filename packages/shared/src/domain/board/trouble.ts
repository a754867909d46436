/** What a crew reports from a visit, in the order in which it is offered. */
export const troubleKinds = [
  'nobody_home',
  'no_access',
  'no_water',
  'weather',
  'damage',
  'unsafe',
  'hurt',
  'crash',
  'unwell',
  'bottle',
  'van_trouble',
  'running_late',
  'other',
] as const;
export type TroubleKind = (typeof troubleKinds)[number];
export const troubleNames: Record<TroubleKind, string> = {
  nobody_home: 'Nobody home',
  no_access: 'No access',
  no_water: 'No water',
  weather: 'Weather',
  damage: 'Damage found',
  unsafe: 'Unsafe',
  hurt: 'Somebody is hurt',
  crash: 'Crash',
  unwell: 'I am unwell',
  bottle: 'Bottle wrong or leaking',
  van_trouble: 'Van broke down',
  running_late: 'Running late',
  other: 'Other',
};

/** People come before the board: with these the emergency number is shown first. */
export function comesAfterHelp(kind: TroubleKind): boolean {
  return kind === 'hurt' || kind === 'crash' || kind === 'unwell';
}

/** What the server reports by itself: a press on a phone that did not know what the board had changed. */
export const CLASH = 'clash';
export const clashName = 'Phone and board differ';
