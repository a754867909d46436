/** Accents, points of Hebrew and Arabic, and apostrophes in every shape: nobody types them into a search. */
const UNHEARD = /[\u0300-\u036f\u0591-\u05c7\u064b-\u065f'’ʼ‘`]/g;

/** Words as they are compared: small letters without accents and apostrophes. The same as `folded` in the database. */
export function folded(words: string): string {
  return words.normalize('NFKD').replace(UNHEARD, '').toLowerCase();
}

/** Plates and VINs as they are compared: without spaces, hyphens and points. */
export function tight(text: string): string {
  return folded(text).replace(/[\s.\-()+]/g, '');
}

/** The digits of a phone number without an extension and, where it is written with one, without the North American 1. */
export function phoneDigits(phone: string): string {
  const digits = (phone.split(/x/i)[0] ?? '').replace(/\D/g, '');
  const hasOne = digits.startsWith('1') && (digits.length === 11 || /^\s*\+1/.test(phone));
  return hasOne ? digits.slice(1) : digits;
}
