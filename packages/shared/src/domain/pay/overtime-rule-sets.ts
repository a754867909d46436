/** When a place's hours carry a premium. Hours are decimal strings; multipliers are of the regular rate. */
export interface OvertimeRuleSet {
  key: string;
  jurisdiction: string;
  name: string;
  /** null where the rule is older than any week this program could hold. */
  effectiveFrom: string | null;
  weeklyHours: string;
  /** Hours of a workday over which time and a half is owed; null where only the week counts. */
  dailyHours: string | null;
  /** Hours of a workday over which double time is owed. */
  dailyDoubleHours: string | null;
  /**
   * The seventh workday worked in a row inside the workweek: time and a half from the first hour, double time over
   * `doubleOver` hours; `onlyOverWeekly` where it takes a week over the weekly hours.
   */
  seventhDay: { doubleOver: string | null; onlyOverWeekly: boolean } | null;
  /** Daily overtime only below this multiple of the place's minimum wage. */
  dailyGateMultiple: string | null;
  /** A flat-sum bonus is divided by the hours that were not overtime and brings whole overtime, not half. */
  flatSumBonusApart: boolean;
  /** Card fees may come off a tip, and tips may count toward the cash wage. */
  allowsTipDeductions: boolean;
  /** Rest breaks of piece work are paid apart, at the week's average hour. */
  paysPieceRest: boolean;
  /** Whether an agreement may let flat amounts and commission cover the time beside the jobs. */
  mayCoverOtherTime: boolean;
  /** The most hours that a salary may be divided by; null without such a rule. */
  salaryHoursAtMost: string | null;
  source: string;
  /** How surely the rule was read. */
  certainty: 'read' | 'from memory' | 'set by the owner';
}

const weekly = {
  weeklyHours: '40',
  dailyHours: null,
  dailyDoubleHours: null,
  seventhDay: null,
  dailyGateMultiple: null,
  flatSumBonusApart: false,
  allowsTipDeductions: true,
  paysPieceRest: false,
  mayCoverOtherTime: true,
  salaryHoursAtMost: null,
} satisfies Partial<OvertimeRuleSet>;

export const OVERTIME_RULE_SETS: readonly OvertimeRuleSet[] = [
  {
    ...weekly,
    key: 'us_federal',
    jurisdiction: 'US-FLSA',
    name: 'Federal: over 40 hours a week',
    effectiveFrom: '1940-10-24',
    source: '29 USC 207(a)',
    certainty: 'read',
  },
  {
    ...weekly,
    key: 'us_ca',
    jurisdiction: 'US-CA',
    name: 'California: over 8 and 12 hours a day, 40 a week, seventh day',
    effectiveFrom: '2000-01-01',
    dailyHours: '8',
    dailyDoubleHours: '12',
    seventhDay: { doubleOver: '8', onlyOverWeekly: false },
    flatSumBonusApart: true,
    allowsTipDeductions: false,
    paysPieceRest: true,
    mayCoverOtherTime: false,
    salaryHoursAtMost: '40',
    source: 'California Labor Code 510, 226.2, 515(d)',
    certainty: 'read',
  },
  {
    ...weekly,
    key: 'us_ak',
    jurisdiction: 'US-AK',
    name: 'Alaska: over 8 hours a day, 40 a week',
    effectiveFrom: null,
    dailyHours: '8',
    source: 'AS 23.10.060; 8 AAC 15.100',
    certainty: 'read',
  },
  {
    ...weekly,
    key: 'us_nv',
    jurisdiction: 'US-NV',
    name: 'Nevada: over 8 hours in 24 below 1.5 times the minimum wage, 40 a week',
    effectiveFrom: null,
    dailyHours: '8',
    dailyGateMultiple: '1.5',
    source: 'NRS 608.018',
    certainty: 'read',
  },
  {
    ...weekly,
    key: 'us_co',
    jurisdiction: 'US-CO',
    name: 'Colorado: over 12 hours a day or in a row, 40 a week',
    effectiveFrom: '2020-03-16',
    dailyHours: '12',
    source: 'COMPS Order rule 4.1',
    certainty: 'read',
  },
  {
    ...weekly,
    key: 'us_ky',
    jurisdiction: 'US-KY',
    name: 'Kentucky: seventh day of a week over 40 hours',
    effectiveFrom: null,
    seventhDay: { doubleOver: null, onlyOverWeekly: true },
    source: 'KRS 337.050',
    certainty: 'from memory',
  },
  {
    ...weekly,
    key: 'us_pr',
    jurisdiction: 'US-PR',
    name: 'Puerto Rico: over 8 hours a day, 40 a week',
    effectiveFrom: null,
    dailyHours: '8',
    source: 'Local law',
    certainty: 'from memory',
  },
  {
    ...weekly,
    key: 'us_vi',
    jurisdiction: 'US-VI',
    name: 'US Virgin Islands: over 8 hours a day, 40 a week',
    effectiveFrom: null,
    dailyHours: '8',
    source: 'Local law',
    certainty: 'from memory',
  },
];

/** The rule set a company's setting names. @throws {RangeError} for an unknown key. */
export function overtimeRuleSet(key: string): OvertimeRuleSet {
  const found = OVERTIME_RULE_SETS.find((set) => set.key === key || set.jurisdiction === key);
  if (!found) throw new RangeError(`No overtime rules are known under "${key}".`);
  return found;
}
