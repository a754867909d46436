export type HeatIndexBranch = 'simple' | 'regression' | 'low-humidity adjustment' | 'high-humidity adjustment';

export interface HeatIndex {
  /** Degrees Fahrenheit, unrounded. */
  value: number;
  branch: HeatIndexBranch;
}

/**
 * Heat index in the shade: the National Weather Service's regression (Technical Attachment SR 90-23) with its two
 * adjustments, and the simple formula where that averages under 80 °F.
 * @param fahrenheit air temperature
 * @param humidity relative, in percent
 * @throws {RangeError} for a humidity outside 0 to 100 or a temperature that air does not have
 */
export function heatIndex(fahrenheit: number, humidity: number): HeatIndex {
  if (!(humidity >= 0 && humidity <= 100)) throw new RangeError('Relative humidity is between 0 and 100 percent.');
  if (!(fahrenheit >= -130 && fahrenheit <= 140)) throw new RangeError('Air temperature is between -130 and 140 °F.');
  const simple = 0.5 * (fahrenheit + 61 + (fahrenheit - 68) * 1.2 + humidity * 0.094);
  const average = (simple + fahrenheit) / 2;
  if (average < 80) return { value: average, branch: 'simple' };
  const value = regression(fahrenheit, humidity);
  if (humidity < 13 && fahrenheit >= 80 && fahrenheit <= 112) {
    const dry = ((13 - humidity) / 4) * Math.sqrt((17 - Math.abs(fahrenheit - 95)) / 17);
    return { value: value - dry, branch: 'low-humidity adjustment' };
  }
  if (humidity > 85 && fahrenheit >= 80 && fahrenheit <= 87) {
    const damp = ((humidity - 85) / 10) * ((87 - fahrenheit) / 5);
    return { value: value + damp, branch: 'high-humidity adjustment' };
  }
  return { value, branch: 'regression' };
}

function regression(t: number, r: number): number {
  return (
    -42.379 +
    2.04901523 * t +
    10.14333127 * r -
    0.22475541 * t * r -
    0.00683783 * t * t -
    0.05481717 * r * r +
    0.00122874 * t * t * r +
    0.00085282 * t * r * r -
    0.00000199 * t * t * r * r
  );
}
