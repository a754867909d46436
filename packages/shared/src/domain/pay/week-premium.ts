import { exact, sum, type Exact } from '../money/exact.ts';
import { hasDailyOvertime, splitHours, splitPremium, type SplitHours } from './daily-overtime.ts';
import { overtimeRuleSet, type OvertimeRuleSet } from './overtime-rule-sets.ts';
import { halfTimePremium, hoursOver } from './regular-rate.ts';

export interface WeekPremium {
  /** The rule set that pays more; the federal one always runs beside the place's own (29 USC 218(a)). */
  ruleSet: OvertimeRuleSet;
  split: SplitHours;
  /** Exact dollars owed on top of straight pay. */
  premium: Exact;
}

export interface PremiumQuestion {
  ruleSetKey: string;
  /** Exact dollars an hour. */
  rate: Exact;
  hoursByWorkday: readonly Exact[];
  minimumWage: Exact;
}

/**
 * The week's overtime premium. A place's premium that is paid counts toward the federal one (29 USC 207(h)), so the
 * larger of the two is owed, once.
 */
export function weekPremium(question: PremiumQuestion): WeekPremium {
  const federal = federalPremium(question.rate, question.hoursByWorkday);
  const rules = overtimeRuleSet(question.ruleSetKey);
  if (rules.key === federal.ruleSet.key) return federal;
  const daily = hasDailyOvertime(rules, question.rate, question.minimumWage);
  const split = splitHours(question.hoursByWorkday, rules, { daily });
  const premium = splitPremium(question.rate, split);
  return premium.lt(federal.premium) ? federal : { ruleSet: rules, split, premium };
}

function federalPremium(rate: Exact, hoursByWorkday: readonly Exact[]): WeekPremium {
  const ruleSet = overtimeRuleSet('us_federal');
  const hours = sum(hoursByWorkday);
  const overtime = hoursOver(hours, exact(ruleSet.weeklyHours));
  return {
    ruleSet,
    split: { straight: hours.sub(overtime), overtime, double: exact(0) },
    premium: halfTimePremium(rate, overtime),
  };
}
