import fc from 'fast-check';
import { expect, it } from 'vitest';
import { centralAngle, IUGG_KM, roadTrip } from './great-circle.ts';

/* The published rows are run beside the kit's in ../kit/check. */

const places = fc.record({ lat: fc.integer({ min: -90, max: 90 }), lng: fc.integer({ min: -180, max: 180 }) });

it('is the same both ways and never more than half around', () => {
  fc.assert(
    fc.property(places, places, (from, to) => {
      const angle = centralAngle(from, to);
      expect(angle).toBeCloseTo(centralAngle(to, from), 12);
      expect(angle).toBeLessThanOrEqual(Math.PI + 1e-12);
    }),
  );
});

it('goes by the IUGG mean radius', () => {
  expect(IUGG_KM).toBe(6371.0088);
});

it.each([
  [-1, 1.3, 25, /negative/],
  [1, 0.9, 25, /straight line/],
  [1, 1.3, 0, /more than 0/],
])('refuses a trip of %s at %s and %s', (straight, circuity, speed, message) => {
  expect(() => roadTrip(straight, circuity, speed)).toThrow(message);
});
