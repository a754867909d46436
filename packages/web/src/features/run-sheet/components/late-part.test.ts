import { expect, test } from 'vitest';
import { lateMinutes, troublePicks } from './trouble-picks.ts';

test('every pick of running late is a number of minutes; the most counts', () => {
  expect(troublePicks.running_late.map((word) => lateMinutes([word]))).toEqual([15, 30, 45, 60]);
  expect(lateMinutes(['15 min', '1 h'])).toBe(60);
  expect(lateMinutes([])).toBeNull();
  expect(lateMinutes(['Pet hair'])).toBeNull();
});
