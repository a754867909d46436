/** What a service asks of the place and the weather. Temperatures are tenths of a degree Celsius, of the air. */
export interface ServiceNeeds {
  water: boolean;
  power: boolean;
  dry: boolean;
  daylight: boolean;
  coldestTenths: number | null;
  hottestTenths: number | null;
}

/** Exact at whole degrees Fahrenheit: 50 °F are 10 °C. */
export function tenthsOf(degrees: number, units: 'us' | 'metric'): number {
  return Math.round(units === 'us' ? ((degrees - 32) * 50) / 9 : degrees * 10);
}

/** Whole degrees as the company counts them. */
export function degreesOf(tenths: number, units: 'us' | 'metric'): number {
  // Adding nothing turns a rounded −0 into 0.
  return Math.round(units === 'us' ? (tenths * 9) / 50 + 32 : tenths / 10) + 0;
}

/** "Dry, 50 to 90 °F, daylight"; empty for a service that the weather does not touch. */
export function weatherWords(needs: ServiceNeeds, units: 'us' | 'metric'): string {
  const unit = units === 'us' ? '°F' : '°C';
  const cold = needs.coldestTenths === null ? null : degreesOf(needs.coldestTenths, units);
  const hot = needs.hottestTenths === null ? null : degreesOf(needs.hottestTenths, units);
  const span =
    cold !== null && hot !== null
      ? `${cold} to ${hot} ${unit}`
      : cold !== null
        ? `from ${cold} ${unit}`
        : hot !== null
          ? `up to ${hot} ${unit}`
          : '';
  const words = [needs.dry ? 'dry' : '', span, needs.daylight ? 'daylight' : ''].filter(Boolean).join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
