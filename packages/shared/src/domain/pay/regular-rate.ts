import { exact, greatest, HALF, ZERO, type Exact } from '../money/exact.ts';

/** Hours over the threshold in one workweek, which always stands alone (29 CFR 778.104). */
export function hoursOver(hours: Exact, threshold: Exact = exact(40)): Exact {
  return greatest(ZERO, hours.sub(threshold));
}

/**
 * The regular rate: all pay the law does not leave out, over all hours worked (29 CFR 778.109), never under the
 * minimum wage (29 CFR 778.107).
 * @param included exact dollars, straight time for every hour included
 * @param hours exact hours worked in the week
 * @returns exact dollars an hour, null without hours
 */
export function regularRate(included: Exact, hours: Exact, minimumWage: Exact = ZERO): Exact | null {
  return hours.lte(0) ? null : greatest(included.div(hours), minimumWage);
}

/** What overtime hours are owed on top of the straight pay they already carry (29 CFR 778.110 to 778.118), exact dollars. */
export function halfTimePremium(rate: Exact, overtimeHours: Exact): Exact {
  return rate.mul(HALF).mul(overtimeHours);
}

/** What the week's pay lacks to the minimum wage for every hour worked (29 USC 206(a)), exact dollars, 0 when met. */
export function minimumWageShortfall(included: Exact, hours: Exact, minimumWage: Exact): Exact {
  return greatest(ZERO, minimumWage.mul(hours).sub(included));
}

/**
 * The extra half time that an amount paid for a week brings when it joins that week's regular rate:
 * amount x overtime hours / (2 x hours) (29 CFR 778.119, 778.209).
 */
export function halfTimeOnAmount(amount: Exact, hours: Exact, overtimeHours: Exact): Exact {
  return hours.lte(0) ? ZERO : halfTimePremium(amount.div(hours), overtimeHours);
}
