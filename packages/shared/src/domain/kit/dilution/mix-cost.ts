import { ONE, type Exact } from '../../money/exact.ts';
import { convertVolume, type VolumeUnit } from '../units/units.ts';
import type { DilutionRatio } from './dilution-ratio.ts';
import { costOfMix, needsMore } from './mix.ts';

export interface SizedVolume {
  size: Exact;
  unit: VolumeUnit;
}

export interface PricedContainer extends SizedVolume {
  /** Dollars for the full container of concentrate. */
  price: Exact;
}

/** Exact dollars of chemistry in the finished mix; rounded only where they are shown. */
export interface MixCosts {
  perBottle: Exact;
  perGallon: Exact;
  perLiter: Exact;
}

/**
 * What the mix costs by the bottle, the US gallon and the liter, whatever unit the concentrate is bought in.
 * @throws {MixError} where a size is not more than zero or the price is negative
 */
export function mixCosts(container: PricedContainer, ratio: DilutionRatio, bottle: SizedVolume): MixCosts {
  needsMore(container.size, 'The size of the container');
  needsMore(bottle.size, 'The size of the bottle');
  const perMl = costOfMix(container.price.div(convertVolume(container.size, container.unit, 'mL')), ratio);
  const costOf = (volume: SizedVolume) => perMl.mul(convertVolume(volume.size, volume.unit, 'mL'));
  return {
    perBottle: costOf(bottle),
    perGallon: costOf({ size: ONE, unit: 'US gal' }),
    perLiter: costOf({ size: ONE, unit: 'L' }),
  };
}
