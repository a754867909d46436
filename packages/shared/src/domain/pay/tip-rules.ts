import { exact, greatest, ZERO, type Exact } from '../money/exact.ts';
import type { OvertimeRuleSet } from './overtime-rule-sets.ts';

/** The most of the minimum wage that tips may stand for; none where the place forbids it (29 USC 203(m)(2)). */
export function largestTipCredit(minimumWage: Exact, cashWage: Exact, rules: OvertimeRuleSet): Exact {
  return rules.allowsTipDeductions ? greatest(ZERO, minimumWage.sub(cashWage)) : ZERO;
}

/** The least of a card tip that must be paid out: the actual fee may come off only where the place allows it (DOL Fact Sheet #15). */
export function leastCardTip(tip: Exact, feePercent: Exact, rules: OvertimeRuleSet): Exact {
  return rules.allowsTipDeductions ? tip.sub(tip.mul(feePercent).div(100)) : tip;
}

/** Cash wage of an overtime hour with a tip credit: 1.5 x the full minimum wage less the same credit (DOL Fact Sheet #15). */
export function overtimeCashWage(minimumWage: Exact, credit: Exact): Exact {
  return minimumWage.mul(exact('1.5')).sub(credit);
}

/** Facts that decide whether someone may draw from a tip pool (DOL Fact Sheet #15B): the duties, not the title's pay. */
export interface TipDuties {
  isManagerByDuties: boolean;
  /** Percent owned. */
  ownership: Exact;
  activelyManages: boolean;
}

/** Managers, supervisors and owners of 20 % or more who manage may never draw from a pool (29 USC 203(m)(2)(B)). */
export function mayShareTips({ isManagerByDuties, ownership, activelyManages }: TipDuties): boolean {
  return !isManagerByDuties && !(ownership.gte(20) && activelyManages);
}
