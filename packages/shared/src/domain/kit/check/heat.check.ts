import {
  DRINKING,
  HEAT_BANDS,
  heatRisk,
  MODERATE_WATER,
  PROPOSED_TRIGGERS,
  SUN_ADDS_F,
  WEATHER_SERVICE_BANDS,
} from '../heat/heat-bands.ts';
import { heatIndex } from '../heat/heat-index.ts';
import { fahrenheit } from '../units/units.ts';
import { plainNumber, ScenarioError, type CheckResult, type ScenarioInputs } from './scenario-inputs.ts';

/**
 * Heat index of a temperature and humidity, risk of a heat index, and the published bands where nothing is asked.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkHeat(inputs: ScenarioInputs): CheckResult {
  if (inputs.isEmpty) return reference();
  if (inputs.has('heatIndex')) {
    const index = plainNumber(inputs.number('heatIndex')) + (inputs.flag('directSun') ? SUN_ADDS_F : 0);
    const isHard = inputs.flag('strenuous') || inputs.flag('heavyClothing');
    return { risk: heatRisk(index, { isHard }) };
  }
  if (inputs.raw('risk') === 'Moderate') return { ...MODERATE_WATER };
  const humidity = inputs.firstOf('RH', 'rh', 'humidity');
  if (humidity === undefined) throw new ScenarioError('RH, the relative humidity in percent, is missing.');
  const { value, branch } = heatIndex(temperature(inputs), plainNumber(inputs.number(humidity)));
  return { value, rounded: Math.floor(value + 0.5), branch, risk: heatRisk(value) };
}

function temperature(inputs: ScenarioInputs): number {
  const inCelsius = inputs.firstOf('TC', 'tempC', 'temperatureC');
  if (inCelsius !== undefined) return plainNumber(fahrenheit(inputs.number(inCelsius)));
  return plainNumber(inputs.number(inputs.firstOf('T', 'TF', 'tempF', 'temperatureF') ?? 'T'));
}

function reference(): CheckResult {
  return {
    bands: HEAT_BANDS.map((band) => ({ ...band })),
    directSunAddsUpToF: SUN_ADDS_F,
    ...WEATHER_SERVICE_BANDS,
    ...DRINKING,
    ...PROPOSED_TRIGGERS,
  };
}
