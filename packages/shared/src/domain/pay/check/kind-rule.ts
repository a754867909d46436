import type { z } from 'zod';
import type { Exact } from '../../money/exact.ts';
import { decimalText } from '../../money/rounding.ts';

export type CheckValue = string | boolean | CheckValue[] | { [name: string]: CheckValue };
export type CheckResult = Record<string, CheckValue>;

/** Inputs that make no sense: the message is a sentence for the person who wrote them. */
export class ScenarioError extends Error {}

/** One kind of scenario: reads its inputs and works them out with the engine's rules. */
export type KindRule = (inputs: unknown) => CheckResult;

/**
 * Ties the inputs' shape to the rule.
 * @throws {ScenarioError} naming the field that makes no sense
 */
export function kindRule<T extends z.ZodType>(shape: T, work: (inputs: z.output<T>) => CheckResult): KindRule {
  return (inputs) => {
    const read = shape.safeParse(inputs);
    if (!read.success) throw new ScenarioError(sentence(read.error));
    return work(read.data);
  };
}

function sentence(error: z.ZodError): string {
  const [issue] = error.issues;
  const field = issue?.path.join('.') ?? '';
  const message = issue?.message.replace(/^Invalid .*/, 'is missing or of the wrong kind') ?? 'make no sense';
  return `${field === '' ? 'The inputs' : field} ${message}.`;
}

/** Two places, half up, as money and hours are printed. */
export function money(value: Exact): string {
  return decimalText(value, 2);
}

export const hoursText = money;

/** Four places, half up, as rates are printed. */
export function rate(value: Exact): string {
  return decimalText(value, 4);
}
