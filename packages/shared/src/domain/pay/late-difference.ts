/**
 * What is still to be made up of a locked week, cents: what today's records come to, less what was locked and what
 * corrections in other weeks paid. Negative where too much was paid.
 */
export function missingCents(late: { nowCents: number; lockedCents: number; correctedCents: number }): number {
  return late.nowCents - late.lockedCents - late.correctedCents;
}
