import { exact, greatest, least, ZERO, type Exact } from '../money/exact.ts';

/**
 * The most that may be taken from a week's pay for what is mainly the employer's (uniforms, tools, damage,
 * shortages): nothing below the minimum wage, nothing out of overtime (29 CFR 531.35), and in an overtime week no
 * more than a 40-hour week would allow (29 CFR 531.37). The rate is the regular rate before deductions.
 * @returns exact dollars, never negative
 */
export function deductionRoom(rate: Exact, minimumWage: Exact, hours: Exact): Exact {
  return greatest(ZERO, rate.sub(minimumWage).mul(least(hours, exact(40))));
}
