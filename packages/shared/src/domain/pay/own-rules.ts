import { z } from 'zod';
import { decimal, shortText } from '../../contracts/fields.ts';
import { overtimeRuleSet, type OvertimeRuleSet } from './overtime-rule-sets.ts';

const hours = decimal.refine((value) => Number(value) > 0, 'Give hours above zero.');
const dayHours = hours.refine((value) => Number(value) <= 24, 'A day has at most 24 hours.');

/** Overtime rules that the owner defines for a place; hours as decimals, null where a rule does not exist. */
export const ownRules = z
  .strictObject({
    weeklyOver: hours.refine((value) => Number(value) <= 168, 'A week has at most 168 hours.'),
    dailyOver: dayHours.nullable(),
    doubleAfter: dayHours.nullable(),
    /** The seventh day worked in a row: time and a half, double over so many hours. */
    seventhDay: z.strictObject({ doubleOver: dayHours.nullable(), onlyOverWeekly: z.boolean() }).nullable(),
    paysPieceRest: z.boolean(),
    mayCoverOtherTime: z.boolean(),
    /** Where the owner read it. */
    source: shortText.min(1, 'Say where the rule is written.'),
  })
  .refine(({ dailyOver, doubleAfter }) => doubleAfter === null || dailyOver !== null, {
    path: ['dailyOver'],
    message: 'Give the daily hours over which time and a half starts.',
  })
  .refine(
    ({ dailyOver, doubleAfter }) =>
      doubleAfter === null || dailyOver === null || Number(doubleAfter) > Number(dailyOver),
    { path: ['doubleAfter'], message: 'Double time starts after time and a half.' },
  );
export type OwnRules = z.infer<typeof ownRules>;

/** A place's rules: a known set by its key, or the owner's own. @throws {RangeError} for an unknown key */
export function ruleSetOf(placeId: string, name: string, key: string | null, own: OwnRules | null): OvertimeRuleSet {
  return own === null ? overtimeRuleSet(key ?? 'us_federal') : ownRuleSet(placeId, name, own);
}

/** The owner's rules as a rule set; the federal rules run beside it like beside any other. */
function ownRuleSet(placeId: string, name: string, rules: OwnRules): OvertimeRuleSet {
  return {
    key: `own:${placeId}`,
    jurisdiction: 'own',
    name,
    effectiveFrom: null,
    weeklyHours: rules.weeklyOver,
    dailyHours: rules.dailyOver,
    dailyDoubleHours: rules.doubleAfter,
    seventhDay: rules.seventhDay,
    dailyGateMultiple: null,
    flatSumBonusApart: false,
    allowsTipDeductions: false,
    paysPieceRest: rules.paysPieceRest,
    mayCoverOtherTime: rules.mayCoverOtherTime,
    salaryHoursAtMost: null,
    source: rules.source,
    certainty: 'set by the owner',
  };
}
