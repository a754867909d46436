import type { Exact } from '../../money/exact.ts';
import { isStraight, MixError, type DilutionRatio } from './dilution-ratio.ts';
import { mixToFill, needsMore, type Mix } from './mix.ts';

export type DoseContainer = 'bucket' | 'lance' | 'tank';

/**
 * What to pour from a straight bottle into a bucket, foam lance or tank so that it holds the ratio when filled.
 * @param capacity and `filled` in one unit; `filled` is the volume the container is filled to
 * @throws {MixError} where it would be more than full
 */
export function doseInto(container: DoseContainer, capacity: Exact, filled: Exact, ratio: DilutionRatio): Mix {
  needsMore(capacity, `The size of the ${container}`);
  needsMore(filled, 'What is filled in');
  if (filled.gt(capacity)) throw new MixError(`That is more than the ${container} holds: fill in less.`);
  if (isStraight(ratio)) throw new MixError(`A dose for a ${container} needs a ratio; straight product is not dosed.`);
  return mixToFill(filled, ratio);
}

/**
 * A lance draws its mix into a stream of water: the bottle's ratio for a wanted ratio at the panel.
 * @param drawn parts of water that the lance adds to one part of bottle content (measured, or the maker's figure)
 * @throws {MixError} where the lance alone thins more than is wanted
 */
export function lanceBottleRatio(atPanel: DilutionRatio, drawn: Exact): DilutionRatio {
  if (drawn.lt(0)) throw new MixError('The water that the lance adds may not be negative.');
  const parts = atPanel.waterParts.add(1).div(drawn.add(1)).sub(1);
  if (parts.lt(0))
    throw new MixError('The lance alone thins more than that: set it to add less water, or choose a weaker ratio.');
  return { waterParts: parts };
}
