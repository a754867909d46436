import { expect, it } from 'vitest';
import { listOf, timesOf } from './lists.ts';

it('reads lists with commas and lines, and times in short', () => {
  expect(listOf(' Ternmouth,, 02000\nOld Slip ')).toEqual(['Ternmouth', '02000', 'Old Slip']);
  expect(timesOf('8, 9:30, 14:00, noon')).toEqual(['08:00', '09:30', '14:00', 'noon']);
});
