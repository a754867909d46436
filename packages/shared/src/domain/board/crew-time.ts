/**
 * Two people do not halve a job: each further pair of hands adds less (common practice, no source).
 * Factors of the one-person time for a crew of 1, 2, 3, 4 and more; trainees add no speed.
 */
const CREW_FACTORS = [1, 1, 0.6, 0.45, 0.38] as const;

/** Condition grows a job's minutes: common practice, no source. */
export const conditionPercents = { clean: 100, normal: 100, dirty: 120, very_dirty: 150 } as const;
export type Condition = keyof typeof conditionPercents;

/** Minutes of a visit for its lines' one-person minutes, the crew without trainees, and the car's condition; steps of 5. */
export function visitMinutes(lineMinutes: number[], crewSize: number, condition: Condition = 'normal'): number {
  const total = lineMinutes.reduce((sum, minutes) => sum + minutes, 0);
  const factor = CREW_FACTORS[Math.min(Math.max(crewSize, 1), CREW_FACTORS.length - 1)] ?? 1;
  return Math.max(5, Math.ceil((total * factor * conditionPercents[condition]) / 100 / 5) * 5);
}
