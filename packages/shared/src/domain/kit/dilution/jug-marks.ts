import type { Exact } from '../../money/exact.ts';
import { MixError, ratioFromAmounts, type DilutionRatio } from './dilution-ratio.ts';
import { mixToFill, needsMore, type Mix } from './mix.ts';

export interface MarkedMix {
  exact: Mix;
  /** Poured second: concentrate at the nearest mark. Poured first: water up to the fill line less that. */
  concentrateMark: Exact;
  water: Exact;
  /** The ratio that the mark really gives. */
  ratio: DilutionRatio;
  /** (mark - exact) / exact; more than zero is stronger. */
  deviation: Exact;
  steps: ['water', 'concentrate'];
}

export interface FillLine {
  /** Volume that the bottle holds to the brim, and the room left free below the neck for shaking; same unit. */
  brim: Exact;
  headroom: Exact;
}

/**
 * The volume a bottle is filled to.
 * @throws {MixError} where the headroom is negative or as much as the bottle holds
 */
export function fillLine({ brim, headroom }: FillLine): Exact {
  needsMore(brim, 'The size of the bottle');
  if (headroom.lt(0) || headroom.gte(brim))
    throw new MixError('The room below the neck must be less than the bottle holds.');
  return brim.sub(headroom);
}

/**
 * A mix measured with a jug that is marked at every `markStep`. Water goes in first, then the product: less foam, and acid
 * into water, never water into acid (supplier chart). A mark is never zero, and never more than the bottle.
 * @param total the fill line, in the jug's unit
 * @throws {MixError} where the jug's smallest mark is more than the bottle
 */
export function mixByMarks(total: Exact, ratio: DilutionRatio, markStep: Exact): MarkedMix {
  needsMore(markStep, 'The distance between marks');
  const mix = mixToFill(total, ratio);
  if (markStep.gt(total))
    throw new MixError('The jug’s smallest mark is more than the bottle holds: use a smaller jug.');
  if (ratio.waterParts.equals(0)) return marked(mix, mix.concentrate);
  const nearest = mix.concentrate.div(markStep).add('1/2').floor().mul(markStep);
  const mark = nearest.lt(markStep) ? markStep : nearest;
  return marked(mix, mark.gt(total) ? mix.concentrate : mark);
}

function marked(mix: Mix, mark: Exact): MarkedMix {
  const water = mix.total.sub(mark);
  return {
    exact: mix,
    concentrateMark: mark,
    water,
    ratio: ratioFromAmounts(mark, water),
    deviation: mark.sub(mix.concentrate).div(mix.concentrate),
    steps: ['water', 'concentrate'],
  };
}
