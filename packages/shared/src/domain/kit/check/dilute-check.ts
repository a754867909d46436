import { checkDilution } from './dilution.check.ts';
import { checkGeo } from './geo.check.ts';
import { checkHeat } from './heat.check.ts';
import { checkMixture } from './mixture.check.ts';
import { isRecord, ScenarioInputs, type CheckResult } from './scenario-inputs.ts';
import { checkTrade } from './trade.check.ts';
import { checkVin } from './vin.check.ts';

const SECTIONS: Record<string, (inputs: ScenarioInputs) => CheckResult> = {
  dilution: checkDilution,
  mixtureExamples: checkMixture,
  materialsOfTrade: checkTrade,
  heatIndex: checkHeat,
  vin: checkVin,
  geo: checkGeo,
};

export type DiluteAnswer = { id: string; result: CheckResult } | { id: string; error: string };

/**
 * Works out scenarios with the kit's own rules, one answer for each in the same order; numbers are unrounded.
 * @returns an error instead of a result for inputs that make no sense
 */
export function checkKit(scenarios: readonly unknown[]): DiluteAnswer[] {
  return scenarios.map((scenario, index) => {
    const id = idOf(scenario) ?? `#${index + 1}`;
    if (!isRecord(scenario)) return { id, error: 'The scenario is no object of id, section and inputs.' };
    if (idOf(scenario) === null) return { id, error: 'The scenario needs an id.' };
    const { section, inputs } = scenario;
    if (typeof section !== 'string' || !Object.hasOwn(SECTIONS, section)) {
      const known = Object.keys(SECTIONS).join(', ');
      const what =
        typeof section === 'string' ? `The section "${section}" is not known` : 'The scenario needs a section';
      return { id, error: `${what}; known are ${known}.` };
    }
    if (!isRecord(inputs)) return { id, error: 'The scenario needs inputs, an object.' };
    return answer(id, section, inputs);
  });
}

function answer(id: string, section: string, inputs: Record<string, unknown>): DiluteAnswer {
  try {
    return { id, result: SECTIONS[section]?.(new ScenarioInputs(inputs)) ?? {} };
  } catch (error) {
    if (error instanceof RangeError) return { id, error: error.message };
    // One scenario never stops the others; what was not foreseen is said as it is.
    return {
      id,
      error: `The inputs could not be worked out (${error instanceof Error ? error.message : 'unknown reason'}).`,
    };
  }
}

function idOf(scenario: unknown): string | null {
  const id = isRecord(scenario) ? scenario.id : undefined;
  return typeof id === 'string' || typeof id === 'number' ? String(id) : null;
}
