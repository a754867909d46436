export const markKinds = [
  'scratch',
  'chip',
  'dent',
  'swirl',
  'stain',
  'tear',
  'etching',
  'curb_rash',
  'cracked_glass',
  'burn',
  'loose_part',
  'warning_lamp',
] as const;
export type MarkKind = (typeof markKinds)[number];
export const markKindNames: Record<MarkKind, string> = {
  scratch: 'Scratch',
  chip: 'Chip',
  dent: 'Dent',
  swirl: 'Swirl',
  stain: 'Stain',
  tear: 'Tear',
  etching: 'Etching',
  curb_rash: 'Curb rash',
  cracked_glass: 'Cracked glass',
  burn: 'Burn',
  loose_part: 'Loose part',
  warning_lamp: 'Warning lamp',
};

export const markSizes = ['small', 'medium', 'large'] as const;
export type MarkSize = (typeof markSizes)[number];
/** Sizes by what is at hand: common practice, no source. */
export const markSizeNames: Record<MarkSize, string> = {
  small: 'Small, a coin',
  medium: 'Medium, a hand',
  large: 'Large, more',
};

/** What became of a mark of the last visit. */
export const markAnswers = ['still_there', 'worse', 'gone'] as const;
export type MarkAnswer = (typeof markAnswers)[number];
export const markAnswerNames: Record<MarkAnswer, string> = {
  still_there: 'Still there',
  worse: 'Worse',
  gone: 'Gone',
};

export interface Mark {
  id: string;
  /** On the outline's sheet, in thousandths of its width and height. */
  x: number;
  y: number;
  /** In words, like "left rear door". */
  place: string;
  kind: MarkKind;
  size: MarkSize;
  note: string;
  /** The mark of an earlier walk-round that this one answers. */
  carriedFrom: string | null;
  /** Null for a new mark, or when nobody was asked. */
  answer: MarkAnswer | null;
}

/** The marks of the last walk-round that must be asked about: all that were not gone then. */
export function marksToAsk<T extends Mark>(last: readonly T[]): T[] {
  return last.filter((mark) => mark.answer !== 'gone');
}

/** A mark of last time as this walk-round's own: the same place and kind, with what became of it. */
export function carry(last: Mark, id: string, answer: MarkAnswer | null): Mark {
  return { ...last, id, carriedFrom: last.id, answer };
}

/** Which marks of last time have no answer yet. */
export function unanswered<T extends Mark>(last: readonly T[], marks: readonly Mark[]): T[] {
  return marksToAsk(last).filter((old) => !marks.some((mark) => mark.carriedFrom === old.id && mark.answer !== null));
}

/**
 * The walk-round's marks with every one of last time among them: what the phone did not know of is kept, unanswered.
 * @param newId makes the id of a mark that is kept this way
 */
export function withCarried(last: readonly Mark[], marks: readonly Mark[], newId: () => string): Mark[] {
  const unknown = marksToAsk(last).filter((old) => !marks.some((mark) => mark.carriedFrom === old.id));
  return [...marks, ...unknown.map((old) => carry(old, newId(), null))];
}
