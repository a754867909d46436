import type { IrritationCategory } from '../hazards/mixture-class.ts';
import { ScenarioError } from './scenario-inputs.ts';

const NONE = /^(|-|none|no data|not classified|not hazardous|unclassified|water)$/;

/**
 * Skin and eye category from a class as sheets write it: "Skin Corr. 1B", "Skin irritation 2; Eye damage 1". Skin
 * Category 3 does not exist under OSHA and counts as none.
 * @throws {ScenarioError} for words that name neither
 */
export function readHazardClass(text: string): { skin: IrritationCategory; eye: IrritationCategory } {
  const found: { skin: IrritationCategory; eye: IrritationCategory } = { skin: null, eye: null };
  for (const part of text.toLowerCase().split(/[;,+&]|\band\b/)) {
    const words = part.trim();
    if (NONE.test(words)) continue;
    const organ = words.includes('skin') ? 'skin' : words.includes('eye') ? 'eye' : null;
    const category = organ && categoryOf(words);
    if (organ === null || category === undefined) {
      throw new ScenarioError(
        `The class "${words}" is not known: write skin or eye with its category, or not classified.`,
      );
    }
    if (category !== null && (found[organ] === null || category < found[organ])) found[organ] = category;
  }
  return found;
}

function categoryOf(words: string): IrritationCategory | undefined {
  if (/sens/.test(words)) return null;
  const digit = /\d/.exec(words)?.[0];
  if (digit === '3') return null;
  if (digit === '1' || (digit === undefined && /corr|dam/.test(words))) return 1;
  return digit === '2' || (digit === undefined && /irrit/.test(words)) ? 2 : undefined;
}
