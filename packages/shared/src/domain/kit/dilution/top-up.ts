import { ONE, ZERO, type Exact } from '../../money/exact.ts';
import { concentrateShare, MixError, ratioFromAmounts, type DilutionRatio } from './dilution-ratio.ts';
import { mixToFill, needsMore } from './mix.ts';

export interface PartFullBottle {
  /** Same unit for both. */
  size: Exact;
  left: Exact;
  ratio: DilutionRatio;
}

export interface TopUp {
  addConcentrate: Exact;
  addWater: Exact;
  /** What stands in the bottle afterwards. */
  total: Exact;
  ratio: DilutionRatio;
}

/**
 * What the bottle really holds when it is filled up with a mix of another ratio.
 * @throws {MixError} for a level under zero or over the bottle's size
 */
export function topUpWith(bottle: PartFullBottle, ratio: DilutionRatio): TopUp {
  checkLevel(bottle);
  const room = bottle.size.sub(bottle.left);
  const added = room.equals(0) ? { concentrate: ZERO, water: ZERO } : mixToFill(room, ratio);
  const concentrate = bottle.left.mul(concentrateShare(bottle.ratio)).add(added.concentrate);
  return {
    addConcentrate: added.concentrate,
    addWater: added.water,
    total: bottle.size,
    ratio: ratioFromAmounts(concentrate, bottle.size.sub(concentrate)),
  };
}

/**
 * What to add so that the full bottle has the target ratio.
 * @throws {MixError} where it can't be reached by adding only: says how much to pour off first
 */
export function topUpTo(bottle: PartFullBottle, target: DilutionRatio): TopUp {
  checkLevel(bottle);
  const share = concentrateShare(bottle.ratio);
  const wanted = mixToFill(bottle.size, target);
  const addConcentrate = wanted.concentrate.sub(bottle.left.mul(share));
  const addWater = bottle.size.sub(bottle.left).sub(addConcentrate);
  if (addConcentrate.lt(0) || addWater.lt(0)) {
    throw new MixError(
      addConcentrate.lt(0)
        ? 'What is left holds more concentrate than the full bottle may: pour some off, or empty and rinse the bottle.'
        : 'What is left holds more water than the full bottle may: pour some off, or empty and rinse the bottle.',
    );
  }
  return { addConcentrate, addWater, total: bottle.size, ratio: target };
}

/** The most that may be left in the bottle for `topUpTo` to work; pour off down to it. */
export function mostLeftFor(bottle: PartFullBottle, target: DilutionRatio): Exact {
  checkLevel(bottle);
  const [share, wanted] = [concentrateShare(bottle.ratio), concentrateShare(target)];
  if (share.equals(wanted)) return bottle.size;
  // Too strong: the left concentrate is all there may be. Too weak: the left water is all there may be.
  const most = share.gt(wanted) ? wanted.div(share) : ONE.sub(wanted).div(ONE.sub(share));
  return bottle.size.mul(most);
}

export type TopUpHindrance = 'acid' | 'bleach' | 'expired' | 'unknown';

const HINDRANCES: Record<TopUpHindrance, string> = {
  acid: 'An acid is never topped up',
  bleach: 'A bleach is never topped up',
  expired: 'This mix is past its date',
  unknown: 'What is left is not known',
};

/** Why a bottle is emptied and rinsed instead of topped up; null where it may be topped up. Common practice, no source. */
export function topUpHindrance(reasons: readonly TopUpHindrance[]): string | null {
  const [first] = reasons;
  return first === undefined ? null : `${HINDRANCES[first]}: empty the bottle, rinse it, and mix afresh.`;
}

function checkLevel({ size, left }: PartFullBottle): void {
  needsMore(size, 'The size of the bottle');
  if (left.lt(0)) throw new MixError('What is left may not be negative.');
  if (left.gt(size)) throw new MixError('There can’t be more left than the bottle holds.');
}
