import { exact, type Exact } from '../money/exact.ts';

/**
 * The overtime exemption for commissioned people of a retail or service establishment (29 USC 207(i)). It only
 * informs: the engine never applies it.
 * @returns the pay an hour that the regular rate must exceed, 1.5 x the minimum wage
 */
export function exemptionThreshold(minimumWage: Exact): Exact {
  return minimumWage.mul(exact('1.5'));
}

/** Tested in each overtime workweek; the threshold itself fails (29 CFR 779.419). */
export function passesRateTest(rate: Exact, minimumWage: Exact): boolean {
  return rate.gt(exemptionThreshold(minimumWage));
}

/** More than half of a representative period's pay from commissions; tips count on neither side (29 CFR 779.415). */
export function passesShareTest(commissions: Exact, otherPay: Exact): boolean {
  return commissions.gt(otherPay);
}
