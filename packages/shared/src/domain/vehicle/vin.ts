/** 49 CFR 565.15, Tables III to V. */
export const VIN_LETTERS: Readonly<Record<string, number>> = {
  ...numbered('ABCDEFGH', 1),
  ...numbered('JKLMN', 1),
  P: 7,
  R: 9,
  ...numbered('STUVWXYZ', 2),
};
export const VIN_FORBIDDEN = ['I', 'O', 'Q'] as const;
/** Positions 1 to 17; position 9 is the check digit itself. */
export const VIN_WEIGHTS = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2] as const;
export const VIN_MODULUS = 11;
const CHECK_POSITION = 8;

export type VinReading =
  | { kind: 'empty' }
  | { kind: 'malformed'; normalised: string; reason: string }
  | { kind: 'checked'; normalised: string; sum: number; remainder: number; shouldBe: string; isValid: boolean };

/**
 * Reads a VIN and works out its check digit. A warning for the person who types it, never a refusal: old, imported and
 * off-road vehicles have other numbers, and a wrong letter can still pass (A and J count alike).
 * @param text spaces, hyphens and small letters are put right; an empty VIN is no mistake
 */
export function readVin(text: string): VinReading {
  const normalised = text.toUpperCase().replaceAll(/[\s-]/g, '');
  if (normalised === '') return { kind: 'empty' };
  const letter = VIN_FORBIDDEN.find((forbidden) => normalised.includes(forbidden));
  if (letter !== undefined) return { kind: 'malformed', normalised, reason: `letter ${letter}` };
  const odd = [...normalised].find((character) => valueOf(character) === null);
  if (odd !== undefined) return { kind: 'malformed', normalised, reason: `character ${odd}` };
  if (normalised.length !== VIN_WEIGHTS.length) {
    const count = normalised.length;
    return { kind: 'malformed', normalised, reason: `${count} character${count === 1 ? '' : 's'}` };
  }
  const sum = VIN_WEIGHTS.reduce<number>(
    (total, weight, index) => total + weight * (valueOf(normalised[index] ?? '') ?? 0),
    0,
  );
  const remainder = sum % VIN_MODULUS;
  const shouldBe = remainder === 10 ? 'X' : String(remainder);
  return { kind: 'checked', normalised, sum, remainder, shouldBe, isValid: normalised[CHECK_POSITION] === shouldBe };
}

function valueOf(character: string): number | null {
  if (/^[0-9]$/.test(character)) return Number(character);
  return Object.hasOwn(VIN_LETTERS, character) ? (VIN_LETTERS[character] ?? null) : null;
}

function numbered(letters: string, first: number): Record<string, number> {
  return Object.fromEntries([...letters].map((letter, index) => [letter, first + index]));
}
