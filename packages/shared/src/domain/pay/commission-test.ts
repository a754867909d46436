import { exact } from '../money/exact.ts';
import { passesRateTest, passesShareTest } from './commission-exemption.ts';
import type { PersonWeek } from './pay-week.types.ts';

/** A locked week as the commission test of 29 USC 207(i) looks at it. */
export interface TestedWeek {
  /** The minimum wage of the week, decimal dollars. */
  minimumWage: string;
  person: Pick<PersonWeek, 'overtimeHours' | 'regularRate' | 'totals'>;
}

export interface CommissionTest {
  weeks: number;
  commissionCents: number;
  /** Hourly, flat and other pay; tips count on neither side. */
  otherCents: number;
  isMostlyCommission: boolean;
  overtimeWeeks: number;
  /** Overtime weeks with a regular rate of more than 1.5 times the minimum wage. */
  overtimeWeeksPassed: number;
}

/**
 * What two of the three tests of 29 USC 207(i) come to over some locked weeks. The third, a retail or service
 * establishment, is for a lawyer. It only informs: pay is never worked out by it.
 */
export function commissionTest(weeks: readonly TestedWeek[]): CommissionTest {
  const totals = weeks.map(({ person }) => person.totals);
  const commissionCents = totals.reduce((sum, one) => sum + one.commission, 0);
  const otherCents = totals.reduce((sum, one) => sum + one.hourly + one.flat + one.makeUp + one.overtimePremium, 0);
  const overtime = weeks.filter(({ person }) => exact(person.overtimeHours).gt(0));
  const passed = overtime.filter(
    ({ minimumWage, person }) =>
      person.regularRate !== null && passesRateTest(exact(person.regularRate), exact(minimumWage)),
  );
  return {
    weeks: weeks.length,
    commissionCents,
    otherCents,
    isMostlyCommission: passesShareTest(exact(commissionCents), exact(otherCents)),
    overtimeWeeks: overtime.length,
    overtimeWeeksPassed: passed.length,
  };
}
