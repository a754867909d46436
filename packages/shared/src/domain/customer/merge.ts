import { folded, phoneDigits } from './fold.ts';

export interface MergedFields {
  name: string;
  isCompany: boolean;
  phone: string;
  email: string;
  notes: string;
  isScentFree: boolean;
  ringsFirst: boolean;
  mustKnow: string;
  tags: string[];
}

export interface MergePlan {
  fields: MergedFields;
  /** What happens to the words of the record that goes, for the person who decides. */
  words: string[];
  /** What must be put right first; with any, nothing is merged. */
  problems: string[];
}

const MOST_NOTES = 10_000;
const MOST_MUST_KNOW = 300;
const MOST_TAGS = 20;

/** Puts one record's words into another's. Nothing is thrown away: what has no field of its own any more goes into the notes. */
export function planMerge(stays: MergedFields, goes: MergedFields): MergePlan {
  const words: string[] = [];
  const also: string[] = [];
  const oneOf = (what: 'phone' | 'email', isSame: boolean): string => {
    if (goes[what] === '' || isSame) return stays[what];
    const name = what === 'phone' ? 'phone' : 'e-mail';
    if (stays[what] === '') {
      words.push(`The ${name} ${goes[what]} is taken over.`);
      return goes[what];
    }
    words.push(`The ${name} ${goes[what]} goes into the notes; ${stays[what]} stays.`);
    also.push(goes[what]);
    return stays[what];
  };
  const phone = oneOf('phone', phoneDigits(stays.phone) === phoneDigits(goes.phone));
  const email = oneOf('email', folded(stays.email) === folded(goes.email));
  if (folded(goes.name) !== folded(stays.name)) also.unshift(goes.name);
  const notes = joined([stays.notes, goes.notes, also.length > 0 ? `Also known: ${also.join(', ')}.` : ''], '\n');
  const mustKnow = joined([stays.mustKnow, goes.mustKnow], ' ');
  const tags = [...stays.tags, ...goes.tags.filter((tag) => !stays.tags.some((own) => folded(own) === folded(tag)))];
  if (goes.notes && goes.notes !== stays.notes) words.push('Both notes stay, one below the other.');
  if (goes.mustKnow && goes.mustKnow !== stays.mustKnow) words.push('What every crew must know is joined.');
  if (tags.length > stays.tags.length) words.push(`Tags taken over: ${tags.slice(stays.tags.length).join(', ')}.`);
  const problems = [
    notes.length > MOST_NOTES ? 'Together the notes are over 10,000 letters. Shorten one of them first.' : '',
    mustKnow.length > MOST_MUST_KNOW
      ? 'Together what every crew must know is over 300 letters. Shorten one of them first.'
      : '',
    tags.length > MOST_TAGS ? 'Together there are more than 20 tags. Take some off first.' : '',
  ].filter(Boolean);
  return {
    fields: {
      ...{ name: stays.name, phone, email, notes, mustKnow, tags },
      isCompany: stays.isCompany || goes.isCompany,
      isScentFree: stays.isScentFree || goes.isScentFree,
      ringsFirst: stays.ringsFirst || goes.ringsFirst,
    },
    words,
    problems,
  };
}

function joined(texts: string[], between: string): string {
  return [...new Set(texts.map((text) => text.trim()).filter(Boolean))].join(between);
}
