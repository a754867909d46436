import { exact, ZERO, type Exact } from '../money/exact.ts';
import { splitByLargestRemainder } from '../money/largest-remainder.ts';
import type { CrewShare, CrewSplit } from './pay-week.types.ts';

export interface PersonShare {
  personId: string;
  cents: number;
  /** The person's part of the whole, exact. */
  weight: Exact;
}

/**
 * Shares an earning of a job line among its crew: whole cents that add up to the whole, left-over cents by largest
 * remainder, ties by crew order. A trainee has no share. When a split by minutes or weights finds none at all, the
 * shares are equal; a crew of trainees alone gets nothing.
 */
export function shareEarning(cents: number, crew: readonly CrewShare[], split: CrewSplit): PersonShare[] {
  return share(
    cents,
    crew.filter((member) => !member.isTrainee),
    split,
  );
}

/** Shares a tip among everyone listed, trainees too: tips belong to the crew (29 USC 203(m)(2)(B)). */
export function shareTip(cents: number, crew: readonly CrewShare[], split: CrewSplit): PersonShare[] {
  return share(cents, crew, split);
}

function share(cents: number, members: readonly CrewShare[], split: CrewSplit): PersonShare[] {
  const ordered = [...members].sort((a, b) => a.position - b.position || (a.personId < b.personId ? -1 : 1));
  const weights = ordered.map((member) => weightOf(member, split));
  const parts = splitByLargestRemainder(cents, weights);
  const isEmpty = weights.every((weight) => weight.equals(ZERO));
  return ordered.map((member, index) => ({
    personId: member.personId,
    cents: parts[index] ?? 0,
    weight: isEmpty ? exact(1) : (weights[index] ?? ZERO),
  }));
}

function weightOf(member: CrewShare, split: CrewSplit): Exact {
  switch (split) {
    case 'equal':
      return exact(1);
    case 'weights':
      return exact(member.weight);
    case 'minutes':
      return exact(member.minutes);
  }
}

/** Whether a line's split came down to a single person. */
export function isShared(shares: readonly PersonShare[]): boolean {
  return shares.filter((item) => item.weight.gt(0)).length > 1;
}

/** "half", "1 of 3 equal shares", "50 of 120 minutes": a person's part in words. */
export function shareWords(shares: readonly PersonShare[], personId: string, split: CrewSplit): string {
  const own = shares.find((item) => item.personId === personId)?.weight ?? ZERO;
  const whole = shares.reduce((total, item) => total.add(item.weight), ZERO);
  const isEqual = shares.every((item) => item.weight.equals(own));
  if (isEqual) return shares.length === 2 ? 'half' : `1 of ${shares.length} equal shares`;
  const unit = split === 'minutes' ? 'minutes' : 'parts';
  return `${own.toString()} of ${whole.toString()} ${unit}`;
}
