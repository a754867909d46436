import { exact, sum, ZERO, type Exact } from './exact.ts';

/**
 * Divides whole cents by weights so that the parts add up to the total: each gets its share rounded down, and the
 * cents left go to the largest remainders, ties to the earlier place in the list.
 * @param cents signed integer cents
 * @param weights none negative; when all are zero the parts are equal
 * @returns one part per weight, in the same order; none for an empty list
 */
export function splitByLargestRemainder(cents: number, weights: readonly Exact[]): number[] {
  if (weights.length === 0) return [];
  const total = sum(weights);
  if (total.equals(ZERO))
    return splitByLargestRemainder(
      cents,
      weights.map(() => exact(1)),
    );
  const sign = cents < 0 ? -1 : 1;
  const shares = weights.map((weight) => exact(Math.abs(cents)).mul(weight).div(total));
  const parts = shares.map((share) => Number(share.floor().toFraction()));
  const left = Math.abs(cents) - parts.reduce((a, b) => a + b, 0);
  const order = shares
    .map((share, index) => ({ index, remainder: share.sub(share.floor()) }))
    .sort((a, b) => b.remainder.compare(a.remainder) || a.index - b.index);
  for (const { index } of order.slice(0, left)) parts[index] = (parts[index] ?? 0) + 1;
  return parts.map((part) => (part === 0 ? 0 : sign * part));
}
