import type { CheckStep, TowelUse } from './step.ts';
import { towelUseNames } from './step.ts';

type Toweled = Pick<CheckStep, 'towel'>;

/**
 * Towels for wheels, paint, glass and interior never mix, so that one color means one use in the whole house.
 * @param others steps of the other services
 * @returns by index of the step, a sentence that says which use has the color already
 */
export function towelClashes(steps: readonly Toweled[], others: readonly Toweled[]): Map<number, string> {
  const useOf = new Map<string, TowelUse>();
  for (const { towel } of others) if (towel) useOf.set(colorKey(towel.color), towel.use);
  const clashes = new Map<number, string>();
  for (const [index, { towel }] of steps.entries()) {
    if (!towel) continue;
    const key = colorKey(towel.color);
    const use = useOf.get(key) ?? towel.use;
    useOf.set(key, use);
    if (use !== towel.use)
      clashes.set(index, `${towel.color} is the ${towelUseNames[use].toLowerCase()}. Choose another color here.`);
  }
  return clashes;
}

function colorKey(color: string): string {
  return color.trim().toLowerCase();
}
