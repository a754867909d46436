import { describe, expect, it } from 'vitest';
import { folded, phoneDigits, tight } from './fold.ts';

describe('words as they are compared', () => {
  it.each([
    ["Máire O'Dell", 'maire odell'],
    ['O’Dell', 'odell'],
    ['ZIELIŃSKA', 'zielinska'],
    ['نُورا', 'نورا'],
    ['שָׁרָה', 'שרה'],
  ])('%s', (name, words) => {
    expect(folded(name)).toBe(words);
  });

  it('a plate without its spaces', () => {
    expect(tight('tt-014 a')).toBe('tt014a');
  });

  it.each([
    ['555-0142', '5550142'],
    ['+1 (555) 555-0142', '5555550142'],
    ['1-555-555-0142', '5555550142'],
    ['555.0142 x12', '5550142'],
    ['', ''],
  ])('the phone %s', (phone, digits) => {
    expect(phoneDigits(phone)).toBe(digits);
  });
});
