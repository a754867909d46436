export type HeatRisk = 'Lower (Caution)' | 'Moderate' | 'High' | 'Very High to Extreme';

/** OSHA, Using the Heat Index to Protect Workers: heat index in °F. 103 stands in two printed bands: the higher is taken. */
export const HEAT_BANDS = [
  { below: 91, risk: 'Lower (Caution)' },
  { from: 91, to: 103, risk: 'Moderate' },
  { from: 103, to: 115, risk: 'High' },
  { above: 115, risk: 'Very High to Extreme' },
] as const satisfies readonly { risk: HeatRisk; below?: number; from?: number; to?: number; above?: number }[];

/** °F that direct sun may add to the heat index (OSHA, as above). */
export const SUN_ADDS_F = 15;

/** Page reproducing the National Weather Service's classification; an older table has 105 to 129 and 130. */
export const WEATHER_SERVICE_BANDS = {
  Caution: [80, 90],
  'Extreme Caution': [90, 103],
  Danger: [103, 124],
  'Extreme Danger': '125 or higher',
} as const;

/** NIOSH Heat Stress: Hydration. Fluid ounces. */
export const DRINKING = { ozEach: 8, everyMinutes: [15, 20], ozPerHour: [24, 32], maxOzPerHour: 48 } as const;

/** OSHA protective measures, at moderate risk. */
export const MODERATE_WATER = {
  cupsPerHour: 4,
  waterTempF: [50, 60],
  note: 'water before thirst, breaks in cool shade',
} as const;

/** OSHA's proposal of 2024, not law when read; states differ. Defaults for a setting, never a rule. */
export const PROPOSED_TRIGGERS = {
  initialTriggerHI: 80,
  highTriggerHI: 90,
  restMinutes: 15,
  everyHours: 2,
  restPaid: true,
  waterQuartsPerHour: 1,
} as const;

export interface WorkStrain {
  /** Strenuous work, heavy clothing or full sun: one band up. */
  isHard?: boolean;
}

/** Risk of a heat index in °F for people at work; careful at the edge of two bands. */
export function heatRisk(heatIndexF: number, { isHard = false }: WorkStrain = {}): HeatRisk {
  const [lower, moderate, high, extreme] = HEAT_BANDS;
  if (heatIndexF > extreme.above) return extreme.risk;
  if (heatIndexF >= high.from) return isHard ? extreme.risk : high.risk;
  if (heatIndexF >= moderate.from) return isHard ? high.risk : moderate.risk;
  return isHard ? moderate.risk : lower.risk;
}
