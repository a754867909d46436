import { greatest, least, sum, ZERO, type Exact } from '../money/exact.ts';
import { halfTimePremium } from './regular-rate.ts';

/**
 * What is still owed when extra pay for hours over 8 a day, over 40 a week or on special days was already paid at a
 * true premium rate: such extra counts toward overtime (29 USC 207(h)). Flat sums for a special job or day are no
 * such premium: all of them is in the regular rate, none is credited (29 CFR 778.310, 778.311).
 */
export function premiumStillDue(premiumDue: Exact, creditable: Exact): { credit: Exact; due: Exact } {
  const credit = least(premiumDue, creditable);
  return { credit, due: greatest(ZERO, premiumDue.sub(credit)) };
}

export interface TaskDay {
  taskHours: Exact;
  dayPay: Exact;
  extraPay: Exact;
}

/**
 * A day's pay for a task however long it takes (29 CFR 778.313): finishing early makes no overtime. Of the extra pay
 * only the part above straight time for hours truly over 8 in the day is a premium.
 * @param hours all hours of the week
 */
export function taskPay(
  days: readonly TaskDay[],
  hours: Exact,
  overtimeHours: Exact,
): { contract: Exact; creditable: Exact; included: Exact; rate: Exact; premium: Exact } {
  const contract = sum(days.map((day) => day.dayPay.add(day.extraPay)));
  const creditable = sum(days.map(dailyPremium));
  const included = contract.sub(creditable);
  const rate = hours.lte(0) ? ZERO : included.div(hours);
  return { contract, creditable, included, rate, premium: halfTimePremium(rate, overtimeHours) };
}

/**
 * A third of extra pay at one and a half times is premium. After a task that was finished early the extra is paid
 * whether or not 8 hours were worked, so none of that counts.
 */
function dailyPremium(day: TaskDay): Exact {
  return day.taskHours.lt(8) ? ZERO : day.extraPay.div(3);
}
