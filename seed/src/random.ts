/** Repeatable chance: the same name gives the same draws on every machine. */
export interface Random {
  /** From 0 up to, not including, 1. */
  next(): number;
  /** A whole number, both ends included. */
  int(min: number, max: number): number;
  chance(probability: number): boolean;
  pick<T>(list: readonly T[]): T;
}

/** One stream of draws per subject or day, so that a change to one leaves the others as they were. */
export function randomFor(name: string): Random {
  const next = mulberry32(hashOf(name));
  const int = (min: number, max: number) => min + Math.floor(next() * (max - min + 1));
  return {
    next,
    int,
    chance: (probability) => next() < probability,
    pick: (list) => at(list, int(0, list.length - 1)),
  };
}

/** @throws when the list has no such place */
export function at<T>(list: readonly T[], index: number): T {
  const item = list[index];
  if (item === undefined) throw new RangeError(`no item ${index} in a list of ${list.length}`);
  return item;
}

/** Mulberry32, Tommy Ettinger's public-domain generator (from memory). */
function mulberry32(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** FNV-1a, 32 bits (from memory). */
function hashOf(text: string): number {
  let hash = 0x811c9dc5;
  for (let index = 0; index < text.length; index += 1) {
    hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193);
  }
  return hash >>> 0;
}
