import { folded, phoneDigits, tight } from './fold.ts';

export interface KnownCustomer {
  id: string;
  name: string;
  phone: string;
  email: string;
  /** Street and number with town, one an address. */
  places: readonly string[];
  plates: readonly string[];
  vins: readonly string[];
}

export const likenesses = ['phone', 'email', 'plate', 'vin', 'name'] as const;
export type Likeness = (typeof likenesses)[number];
export const likenessNames: Record<Likeness, string> = {
  phone: 'Same phone',
  email: 'Same e-mail',
  plate: 'Same plate',
  vin: 'Same VIN',
  name: 'Alike name at the same address',
};

export interface LikelyPair {
  /** The smaller id first. */
  ids: [string, string];
  why: Likeness[];
}

/** Shorter is a placeholder, no number or plate. */
const FEWEST_DIGITS = 7;
const FEWEST_LETTERS = 4;
/** What more customers share is a front desk’s number or a parking lot, and tells nothing. */
const MOST_SHARING = 8;
/** So many letters may differ in a name at one address (the house's rule, no source). */
const FEW_LETTERS = 2;

/** Pairs that are likely one customer, with all that speaks for it; those with most first. */
export function likelyDuplicates(customers: readonly KnownCustomer[]): LikelyPair[] {
  const pairs = new Map<string, LikelyPair>();
  const note = (why: Likeness, sharing: Iterable<KnownCustomer[]>, isPair = (_a: string, _b: string) => true) => {
    for (const [a, b] of pairsIn(sharing)) {
      if (!isPair(a.name, b.name)) continue;
      const ids: [string, string] = a.id < b.id ? [a.id, b.id] : [b.id, a.id];
      const pair = pairs.get(ids.join()) ?? { ids, why: [] };
      if (!pair.why.includes(why)) pair.why.push(why);
      pairs.set(ids.join(), pair);
    }
  };
  note(
    'phone',
    sharing(customers, ({ phone }) => [phoneDigits(phone)].filter((digits) => digits.length >= FEWEST_DIGITS)),
  );
  note(
    'email',
    sharing(customers, ({ email }) => [folded(email)].filter(Boolean)),
  );
  const written = (texts: readonly string[]) => texts.map(tight).filter((text) => text.length >= FEWEST_LETTERS);
  note(
    'plate',
    sharing(customers, ({ plates }) => written(plates)),
  );
  note(
    'vin',
    sharing(customers, ({ vins }) => written(vins)),
  );
  note(
    'name',
    sharing(customers, ({ places }) => places.map((place) => tight(place).replace(/,/g, ''))),
    areAlike,
  );
  return [...pairs.values()].sort((a, b) => b.why.length - a.why.length || a.ids.join().localeCompare(b.ids.join()));
}

function sharing(customers: readonly KnownCustomer[], keysOf: (customer: KnownCustomer) => string[]) {
  const groups = new Map<string, KnownCustomer[]>();
  for (const customer of customers)
    for (const key of new Set(keysOf(customer))) groups.set(key, [...(groups.get(key) ?? []), customer]);
  return groups.values();
}

function* pairsIn(groups: Iterable<KnownCustomer[]>): Generator<[KnownCustomer, KnownCustomer]> {
  for (const group of groups) {
    if (group.length > MOST_SHARING) continue;
    for (const [index, a] of group.entries()) for (const b of group.slice(index + 1)) yield [a, b];
  }
}

/** The same words in any order, an initial for a word, or a slip of the pen. */
export function areAlike(one: string, other: string): boolean {
  const [a, b] = [one, other].map((name) =>
    folded(name)
      .split(/[^\p{L}\p{N}]+/u)
      .filter(Boolean)
      .sort(),
  ) as [string[], string[]];
  if (a.length === b.length && matchesByInitial(a, b)) return true;
  const [left, right] = [a.join(' '), b.join(' ')];
  return Math.min(left.length, right.length) > FEW_LETTERS * 2 && lettersApart(left, right) <= FEW_LETTERS;
}

function matchesByInitial(a: readonly string[], b: readonly string[]): boolean {
  const isSame = (x: string, y: string) =>
    x === y || (x.length === 1 && y.startsWith(x)) || (y.length === 1 && x.startsWith(y));
  // One whole word at least must be the same: two initials alone are nobody.
  return (
    a.some((word) => word.length > 1 && b.includes(word)) && a.every((word) => b.some((other) => isSame(word, other)))
  );
}

/** Letters put in, left out or changed between two words (V. I. Levenshtein's distance). */
function lettersApart(a: string, b: string): number {
  let above = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (const [row, letter] of [...a].entries()) {
    const here = [row + 1];
    for (const [column, other] of [...b].entries()) {
      const changed = (above[column] ?? 0) + (letter === other ? 0 : 1);
      here.push(Math.min(changed, (above[column + 1] ?? 0) + 1, (here[column] ?? 0) + 1));
    }
    above = here;
  }
  return above.at(-1) ?? 0;
}
