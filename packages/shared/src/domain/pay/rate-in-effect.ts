import { exact, type Exact } from '../money/exact.ts';
import { halfTimeOnAmount, halfTimePremium, regularRate } from './regular-rate.ts';

/** A week of hourly or piece work of which some was done in overtime hours; exact dollars and hours. */
export interface AgreedWeek {
  /** Pay for the work done before the threshold. */
  straightPay: Exact;
  /** What the work done in overtime hours is worth at its own straight rates. */
  overtimeWorth: Exact;
  /** Other pay inside the regular rate: bonuses, commissions. */
  other: Exact;
  hours: Exact;
  overtimeHours: Exact;
}

export interface OvertimeChoice {
  overtimePay: Exact;
  /** Half time on other pay, which the rate in effect does not cover. */
  halfTimeOnOther: Exact;
  gross: Exact;
}

/**
 * One and a half times the rate of the work done in the overtime hours, by an agreement made before that work
 * (29 USC 207(g)(1), (2); 29 CFR 778.418, 778.419).
 */
export function rateInEffect({ straightPay, overtimeWorth, other, hours, overtimeHours }: AgreedWeek): OvertimeChoice {
  const overtimePay = overtimeWorth.mul(exact('3/2'));
  const halfTimeOnOther = halfTimeOnAmount(other, hours, overtimeHours);
  return { overtimePay, halfTimeOnOther, gross: straightPay.add(overtimePay).add(other).add(halfTimeOnOther) };
}

/** Without such an agreement: the weighted average of everything paid (29 CFR 778.115). */
export function weightedAverage(week: AgreedWeek): { rate: Exact; premium: Exact; gross: Exact } {
  const straight = week.straightPay.add(week.overtimeWorth).add(week.other);
  const rate = regularRate(straight, week.hours) ?? exact(0);
  const premium = halfTimePremium(rate, week.overtimeHours);
  return { rate, premium, gross: straight.add(premium) };
}
