import type { Coordinates } from '../../board/travel.ts';
import { exact } from '../../money/exact.ts';
import { centralAngle, CIRCUITY, IUGG_KM, meanRadius, roadTrip } from '../../geo/great-circle.ts';
import { convertLength } from '../units/units.ts';
import { isRecord, plainNumber, ScenarioInputs, type CheckResult } from './scenario-inputs.ts';

const KM_PER_MILE = plainNumber(convertLength(exact(1), 'mi', 'km'));
const MINUTES_PER_RADIAN = (180 * 60) / Math.PI;

/**
 * Great-circle distance, the mean radius of two axes, a drive from a straight line; the road factors where nothing is asked.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkGeo(inputs: ScenarioInputs): CheckResult {
  if (inputs.isEmpty) return { ...CIRCUITY };
  if (inputs.has('a_m', 'b_m')) {
    const radius = meanRadius(positive(inputs, 'a_m'), positive(inputs, 'b_m'));
    return { r1_m: radius, rounded_km: Math.round(radius * 10) / 10_000 };
  }
  if (inputs.has('straightMi')) return trip(inputs, 'straightMi', 'mph', 'roadMi');
  if (inputs.has('straightKm'))
    return trip(inputs, 'straightKm', inputs.firstOf('kmh', 'kmPerHour') ?? 'kmh', 'roadKm');
  const angle = centralAngle(place(inputs, 'from'), place(inputs, 'to'));
  const km = angle * (inputs.has('radiusKm') ? positive(inputs, 'radiusKm') : IUGG_KM);
  return {
    km,
    mi: km / KM_PER_MILE,
    radians: angle,
    nauticalMiles1minPerMile: angle * MINUTES_PER_RADIAN,
    kmIugg: angle * IUGG_KM,
  };
}

function trip(inputs: ScenarioInputs, distance: string, speed: string, roadName: string): CheckResult {
  const circuity = inputs.has('circuity') ? plainNumber(inputs.number('circuity')) : CIRCUITY.default;
  const { road, minutes } = roadTrip(plainNumber(inputs.number(distance)), circuity, plainNumber(inputs.number(speed)));
  return { [roadName]: road, minutes };
}

/** [latitude, longitude], or an object with lat and lng (or lon), in degrees. */
function place(inputs: ScenarioInputs, name: string): Coordinates {
  const given = inputs.raw(name);
  if (isRecord(given)) {
    const fields = new ScenarioInputs(given, `${name}.`);
    return within(
      inputs,
      name,
      plainNumber(fields.number('lat')),
      plainNumber(fields.number(fields.firstOf('lng', 'lon') ?? 'lng')),
    );
  }
  const [lat, lng, ...more] = inputs.numbers(name);
  if (lat === undefined || lng === undefined || more.length > 0)
    throw inputs.problem(name, 'needs a latitude and a longitude');
  return within(inputs, name, plainNumber(lat), plainNumber(lng));
}

function within(inputs: ScenarioInputs, name: string, lat: number, lng: number): Coordinates {
  if (Math.abs(lat) > 90) throw inputs.problem(name, 'has a latitude outside -90 to 90 degrees');
  if (Math.abs(lng) > 180) throw inputs.problem(name, 'has a longitude outside -180 to 180 degrees');
  return { lat, lng };
}

function positive(inputs: ScenarioInputs, name: string): number {
  const value = plainNumber(inputs.number(name));
  if (!(value > 0)) throw inputs.problem(name, 'must be more than 0');
  return value;
}
