import { exact, type Exact } from '../money/exact.ts';
import { roundHalfUp } from '../money/rounding.ts';

/**
 * The nearest multiple of a step, halves up: for quarter hours 1 to 7 minutes go down and 8 to 14 up. Tolerated for
 * 5, 6 or 15 minutes only while it evens out over time (29 CFR 785.48(b)); off unless the owner turns it on.
 * @returns whole minutes
 */
export function roundToStep(minutes: Exact, step: Exact): Exact {
  return exact(roundHalfUp(minutes.div(step), 0)).mul(step);
}
