import { exact, greatest, least, type Exact } from '../money/exact.ts';
import { halfTimePremium, hoursOver } from './regular-rate.ts';

export type SalaryPeriod = 'weekly' | 'biweekly' | 'semimonthly' | 'monthly' | 'annual';

/** How many times a year each is paid; the week's part is salary x times / 52 (29 CFR 778.113(b)). */
const TIMES_A_YEAR: Record<SalaryPeriod, number> = {
  weekly: 52,
  biweekly: 26,
  semimonthly: 24,
  monthly: 12,
  annual: 1,
};

/** The week's part of a salary, exact dollars. */
export function weeklySalary(amount: Exact, period: SalaryPeriod): Exact {
  return amount.mul(TIMES_A_YEAR[period]).div(52);
}

export interface SalaryWeek {
  regularRate: Exact;
  /** Straight pay for hours beyond those the salary covers, up to the threshold. */
  straightBeyond: Exact;
  /** Everything owed for hours over the threshold beyond the salary itself. */
  overtimePay: Exact;
}

/**
 * A salary for a fixed number of hours: the rate is salary over those hours. Hours beyond them are owed in full;
 * every hour over the threshold carries half on top (29 CFR 778.113, 778.322).
 * @param weekly exact dollars a week
 * @param covers hours the salary is meant for, more than 0
 */
export function salaryWeek(weekly: Exact, covers: Exact, hours: Exact, threshold: Exact = exact(40)): SalaryWeek {
  const rate = weekly.div(covers);
  const beyond = hoursOver(hours, covers);
  const beyondAndOver = hoursOver(hours, greatest(covers, threshold));
  const straightHours = beyond.sub(beyondAndOver);
  return {
    regularRate: rate,
    straightBeyond: rate.mul(straightHours),
    overtimePay: rate.mul(beyondAndOver).add(halfTimePremium(rate, hoursOver(hours, threshold))),
  };
}

/** California divides a salary by no more than 40 hours (Labor Code 515(d)). */
export function coveredHours(covers: Exact, isCalifornia: boolean): Exact {
  return isCalifornia ? least(covers, exact(40)) : covers;
}
