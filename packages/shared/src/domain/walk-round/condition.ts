/** Condition of paint and interior in three steps: enough to agree on at the car. */
export const conditions = ['good', 'fair', 'poor'] as const;
export type Condition = (typeof conditions)[number];
export const paintNames: Record<Condition, string> = {
  good: 'Glossy',
  fair: 'Dull or swirled',
  poor: 'Failing',
};
export const interiorNames: Record<Condition, string> = {
  good: 'Tidy',
  fair: 'Soiled',
  poor: 'Heavily soiled',
};

/** Why nobody signed, to pick from. */
export const absentReasons = [
  'At work',
  'Asked to go ahead',
  'Did not want to sign',
  'Fleet lot, nobody there',
] as const;

/** What a second look found, after the wash and before any machine touches the paint. */
export const lookOutcomes = ['nothing_new', 'new_marks'] as const;
export type LookOutcome = (typeof lookOutcomes)[number];
export const lookOutcomeNames: Record<LookOutcome, string> = {
  nothing_new: 'Nothing new under the dirt',
  new_marks: 'New marks, put down',
};
