import { expect, it } from 'vitest';
import { erasedName, withoutWords } from './erasure.ts';

it('says on which day a customer was erased', () => {
  expect(erasedName('2026-12-03')).toBe('Customer erased Dec 3, 2026');
});

it('empties what says a word, wherever it stands, and leaves ids and times', () => {
  const id = '01a232c5-fe26-7091-82ea-7df9d6df56ef';
  const answer = { visits: [{ id, customerName: 'Ada Finch', at: '2026-05-14T15:00:00Z', note: 'fine', minutes: 90 }] };
  expect(withoutWords(answer, ['Ada Finch', '2026', '01a2', '', 'fi'])).toEqual({
    visits: [{ id, customerName: '', at: '2026-05-14T15:00:00Z', note: 'fine', minutes: 90 }],
  });
});
