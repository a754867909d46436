import { modelYear, YEAR_CODES_NOT_USED, YEAR_POSITION, yearCodes, yearsOfCode } from '../../vehicle/model-year.ts';
import { readVin, VIN_FORBIDDEN, VIN_LETTERS, VIN_MODULUS, VIN_WEIGHTS } from '../../vehicle/vin.ts';
import type { CheckResult, ScenarioInputs } from './scenario-inputs.ts';

/**
 * Check digit and model year of a VIN; the tables where none is given.
 * @throws {RangeError} a sentence, for inputs that make no sense
 */
export function checkVin(inputs: ScenarioInputs): CheckResult {
  if (inputs.isEmpty) {
    return {
      letters: { ...VIN_LETTERS },
      forbidden: [...VIN_FORBIDDEN],
      positions1to17: [...VIN_WEIGHTS],
      modulus: VIN_MODULUS,
      remainder10: 'X',
    };
  }
  if (!inputs.has('vin') && inputs.raw('position') === YEAR_POSITION)
    return { codes: yearCodes(), notUsed: [...YEAR_CODES_NOT_USED] };
  if (!inputs.has('vin') && inputs.has('code')) {
    const years = yearsOfCode(inputs.text('code'));
    if (years === null) throw inputs.problem('code', 'is no model-year code');
    return { years };
  }
  const read = readVin(inputs.text('vin'));
  if (read.kind === 'empty') return { valid: null, reason: 'empty: the VIN is optional' };
  const { normalised } = read;
  if (read.kind === 'malformed') return { valid: false, normalised, reason: read.reason };
  return {
    valid: read.isValid,
    normalised,
    sum: read.sum,
    remainder: read.remainder,
    ...(read.isValid ? { checkDigit: read.shouldBe } : { shouldBe: read.shouldBe }),
    modelYear: modelYear(normalised),
  };
}
