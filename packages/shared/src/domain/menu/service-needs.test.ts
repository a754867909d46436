import { describe, expect, it } from 'vitest';
import { degreesOf, tenthsOf, weatherWords } from './service-needs.ts';

const none = { water: false, power: false, dry: false, daylight: false, coldestTenths: null, hottestTenths: null };

describe('temperatures', () => {
  it('come back as they were typed, in either unit', () => {
    for (let degrees = -40; degrees <= 130; degrees += 1)
      expect(degreesOf(tenthsOf(degrees, 'us'), 'us')).toBe(degrees);
    for (let degrees = -40; degrees <= 55; degrees += 1)
      expect(degreesOf(tenthsOf(degrees, 'metric'), 'metric')).toBe(degrees);
    // The fixed points of the scale.
    expect([tenthsOf(32, 'us'), tenthsOf(212, 'us'), tenthsOf(-40, 'us')]).toEqual([0, 1000, -400]);
  });
});

describe('the words for the weather', () => {
  it('name only what is asked for', () => {
    expect(weatherWords(none, 'us')).toBe('');
    expect(weatherWords({ ...none, dry: true, coldestTenths: 100, hottestTenths: 322, daylight: true }, 'us')).toBe(
      'Dry, 50 to 90 °F, daylight',
    );
    expect(weatherWords({ ...none, coldestTenths: 50 }, 'metric')).toBe('From 5 °C');
    expect(weatherWords({ ...none, hottestTenths: 300 }, 'metric')).toBe('Up to 30 °C');
  });
});
