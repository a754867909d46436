import { formatDate } from '../time/format.ts';

/** What is read where a name stood. @param day the company's day of the erasure */
export function erasedName(day: string): string {
  return `Customer erased ${formatDate(day)}`;
}

/** Shorter words, like a gate code of two digits, stand in too much that is none. */
const FEWEST_LETTERS = 3;
const isIdOrTime = (text: string) => /^[0-9a-f]{8}-[0-9a-f-]{27}$|^\d{4}-\d\d-\d\d(T|$)/.test(text);

/** A JSON value with every string emptied that says any of the words; ids and times stay. */
export function withoutWords<T>(value: T, words: readonly string[]): T {
  const secrets = words.filter((word) => word.trim().length >= FEWEST_LETTERS);
  const blank = (part: unknown): unknown => {
    if (typeof part === 'string')
      return !isIdOrTime(part) && secrets.some((secret) => part.includes(secret)) ? '' : part;
    if (Array.isArray(part)) return part.map(blank);
    if (typeof part !== 'object' || part === null) return part;
    return Object.fromEntries(Object.entries(part).map(([key, inner]) => [key, blank(inner)]));
  };
  return blank(value) as T;
}
