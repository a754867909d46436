import { exact, type Exact } from '../../money/exact.ts';
import { convertVolume, convertWeight, type VolumeUnit, type WeightUnit } from '../units/units.ts';

export type MetricUnit = 'kg' | 'L' | 'mL';

interface PrintedLimit {
  us: Exact;
  unit: VolumeUnit | WeightUnit;
  limit: Exact;
  metricUnit: MetricUnit;
}

/** US figures that 49 CFR 171.8, 173.6 and 173.306 print beside their metric limits. */
export const PRINTED_LIMITS: readonly PrintedLimit[] = [
  printed('1', 'US liquid pt', '0.5', 'L'),
  printed('8', 'US gal', '30', 'L'),
  printed('119', 'US gal', '450', 'L'),
  printed('400', 'US gal', '1500', 'L'),
  printed('1', 'US fl oz', '30', 'mL'),
  printed('1', 'lb', '0.5', 'kg'),
  printed('66', 'lb', '30', 'kg'),
  printed('220', 'lb', '100', 'kg'),
  printed('440', 'lb', '200', 'kg'),
];

export interface MetricFigure {
  metric: Exact;
  unit: MetricUnit;
  /** The metric limit printed beside this US figure; null where the section prints none. */
  limit: Exact | null;
  /** True where keeping to the US figure would break the metric limit, which is the one to keep to. */
  usExceedsMetric: boolean | null;
}

/** A US figure beside its metric limit: 8 gal is 30.28 L, more than the 30 L that the law allows. */
export function metricFigure(value: Exact, unit: VolumeUnit | WeightUnit): MetricFigure {
  const found = PRINTED_LIMITS.find((item) => item.unit === unit && item.us.equals(value));
  const metricUnit = found?.metricUnit ?? (isWeight(unit) ? 'kg' : 'L');
  const metric = inMetric(value, unit, metricUnit);
  return {
    metric,
    unit: metricUnit,
    limit: found?.limit ?? null,
    usExceedsMetric: found ? metric.gt(found.limit) : null,
  };
}

function inMetric(value: Exact, unit: VolumeUnit | WeightUnit, to: MetricUnit): Exact {
  return isWeight(unit) ? convertWeight(value, unit, 'kg') : convertVolume(value, unit, to === 'kg' ? 'L' : to);
}

function isWeight(unit: VolumeUnit | WeightUnit): unit is WeightUnit {
  return unit === 'lb' || unit === 'oz (weight)' || unit === 'kg' || unit === 'g';
}

function printed(us: string, unit: VolumeUnit | WeightUnit, limit: string, metricUnit: MetricUnit): PrintedLimit {
  return { us: exact(us), unit, limit: exact(limit), metricUnit };
}
