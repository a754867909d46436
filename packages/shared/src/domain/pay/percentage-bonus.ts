import { exact, ZERO, type Exact } from '../money/exact.ts';
import { halfTimeOnAmount } from './regular-rate.ts';

export interface PercentageBonus {
  straightPay: Exact;
  overtimePay: Exact;
  bonus: Exact;
  /** Owed when the bonus does not carry its own overtime. */
  additionalOvertime: Exact;
}

export interface PercentageBonusTerms {
  rate: Exact;
  straightHours: Exact;
  overtimeHours: Exact;
  /** Percent of each hour's straight-time rate. */
  straightPercent: Exact;
  /** Percent of each overtime hour's straight-time rate: 1.5 x the other when the bonus pays its own overtime. */
  overtimePercent: Exact;
}

/**
 * A bonus that is the same percentage of straight and overtime earnings has its overtime inside and needs no
 * recomputation (29 CFR 778.210); any other percentage joins the regular rate (29 CFR 778.209).
 */
export function percentageBonus(terms: PercentageBonusTerms): PercentageBonus {
  const { rate, straightHours, overtimeHours, straightPercent, overtimePercent } = terms;
  const straightPay = rate.mul(straightHours);
  const onOvertime = rate.mul(overtimeHours);
  const bonus = straightPay.mul(straightPercent).add(onOvertime.mul(overtimePercent)).div(100);
  const carriesOvertime = overtimePercent.gte(straightPercent.mul(exact('1.5')));
  return {
    straightPay,
    overtimePay: onOvertime.mul('1.5'),
    bonus,
    additionalOvertime: carriesOvertime
      ? ZERO
      : halfTimeOnAmount(bonus, straightHours.add(overtimeHours), overtimeHours),
  };
}
