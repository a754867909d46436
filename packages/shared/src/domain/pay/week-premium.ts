import { dollars, exact, greatest, sum, ZERO, type Exact } from '../money/exact.ts';
import { hasDailyOvertime, splitHours, splitPremium, type SplitHours } from './daily-overtime.ts';
import { flatSumBonusOvertime } from './flat-sum-bonus.ts';
import { overtimeRuleSet, type OvertimeRuleSet } from './overtime-rule-sets.ts';
import { halfTimePremium, hoursOver } from './regular-rate.ts';

export interface WeekPremium {
  /** The rule set that pays more; the federal one always runs beside the place's own (29 USC 218(a)). */
  ruleSet: OvertimeRuleSet;
  split: SplitHours;
  /** The rate the premium was taken from: the regular rate, without a bonus that has overtime of its own. */
  rate: Exact;
  /** Overtime on a flat-sum bonus where the place works it out apart; a part of the premium. */
  onBonus: Exact;
  /** By agreement: the overtime hours by the rate in effect, and half time on other pay. */
  inEffect?: { parts: { hours: Exact; rate: string }[]; onOther: Exact };
  /** Exact dollars owed on top of straight pay. */
  premium: Exact;
}

export interface PremiumQuestion {
  /** The place's rules; the federal ones run beside them. */
  place: OvertimeRuleSet;
  /** The regular rate, exact dollars an hour. */
  rate: Exact;
  hoursByWorkday: readonly Exact[];
  minimumWage: Exact;
  /** Cents of bonuses inside the regular rate. */
  bonusCents: number;
}

/**
 * The week's overtime premium. A place's premium that is paid counts toward the federal one (29 USC 207(h)), so the
 * larger of the two is owed, once.
 */
export function weekPremium(question: PremiumQuestion): WeekPremium {
  const federal = federalPremium(question);
  if (question.place.key === federal.ruleSet.key) return federal;
  const local = localPremium(question, question.place);
  return local.premium.lt(federal.premium) ? federal : local;
}

function federalPremium({ rate, hoursByWorkday }: PremiumQuestion): WeekPremium {
  const ruleSet = overtimeRuleSet('us_federal');
  const hours = sum(hoursByWorkday);
  const overtime = hoursOver(hours, exact(ruleSet.weeklyHours));
  const split = { straight: hours.sub(overtime), overtime, double: ZERO };
  return { ruleSet, split, rate, onBonus: ZERO, premium: halfTimePremium(rate, overtime) };
}

function localPremium(question: PremiumQuestion, ruleSet: OvertimeRuleSet): WeekPremium {
  const { hoursByWorkday, minimumWage } = question;
  const daily = hasDailyOvertime(ruleSet, question.rate, minimumWage);
  const split = splitHours(hoursByWorkday, ruleSet, { daily });
  const bonus = ruleSet.flatSumBonusApart && split.straight.gt(0) ? dollars(question.bonusCents) : ZERO;
  if (bonus.lte(0)) {
    return { ruleSet, split, rate: question.rate, onBonus: ZERO, premium: splitPremium(question.rate, split) };
  }
  const rate = greatest(question.rate.sub(bonus.div(sum(hoursByWorkday))), minimumWage);
  const onBonus = flatSumBonusOvertime(bonus, split.straight, split.overtime, split.double).due;
  return { ruleSet, split, rate, onBonus, premium: splitPremium(rate, split).add(onBonus) };
}
