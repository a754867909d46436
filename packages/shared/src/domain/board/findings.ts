/** A refusal cannot be saved. A warning is saved, with a reason where the owner asks for one. */

export const refusalCodes = ['van_overlap', 'locked_day', 'not_movable', 'bad_span', 'no_van'] as const;
export type RefusalCode = (typeof refusalCodes)[number];

export const warningCodes = [
  'tight_gap',
  'missing_skill',
  'missing_equipment',
  'missing_water',
  'missing_power',
  'outside_window',
  'outside_hours',
  'no_crew',
  'overtime_risk',
] as const;
export type WarningCode = (typeof warningCodes)[number];

export const warningNames: Record<WarningCode, string> = {
  tight_gap: 'Tight travel gap',
  missing_skill: 'Missing skill',
  missing_equipment: 'Missing equipment',
  missing_water: 'No water',
  missing_power: 'No power',
  outside_window: 'Outside the arrival window',
  outside_hours: 'Outside the day’s hours',
  no_crew: 'No crew in the van',
  overtime_risk: 'Overtime risk',
};

export interface Finding<C extends string = string> {
  visitId: string;
  code: C;
  /** Names the facts, so that a reason given once holds while nothing changed. */
  key: string;
  message: string;
}

export interface Findings {
  refusals: Finding<RefusalCode>[];
  warnings: Finding<WarningCode>[];
}
