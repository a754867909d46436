import { exact, type Exact } from '../money/exact.ts';

/**
 * California's overtime on a flat-sum bonus: the bonus over the hours that were not overtime, then one and a half
 * (double) times that for each overtime (double time) hour (Alvarado v. Dart Container, 2018).
 * @returns exact dollars: the bonus an hour, and the overtime it brings
 */
export function flatSumBonusOvertime(
  bonus: Exact,
  straightHours: Exact,
  overtime: Exact,
  double: Exact,
): { perHour: Exact; due: Exact } {
  const perHour = bonus.div(straightHours);
  return { perHour, due: perHour.mul(overtime.mul(exact('1.5')).add(double.mul(2))) };
}
