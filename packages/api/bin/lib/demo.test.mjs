import { expect, it } from 'vitest';

import { wantsDemo } from './demo.mjs';

const here = { isPrivate: true, host: '127.0.0.1' };

it.each(['127.0.0.1', 'localhost', '::1', '127.0.1.1'])('fills the private database on %s', (host) => {
  expect(wantsDemo({ isPrivate: true, host })).toBe(true);
});

it.each(['0.0.0.0', '::', '192.168.1.20', 'shop.example', '127.0.0.1.example'])('fills nothing on %s', (host) => {
  expect(wantsDemo({ isPrivate: true, host })).toBe(false);
});

it('never fills another server by itself', () => {
  expect(wantsDemo({ ...here, isPrivate: false })).toBe(false);
});

it('does what the switches say', () => {
  expect(wantsDemo({ ...here, empty: true })).toBe(false);
  expect(wantsDemo({ isPrivate: false, host: '0.0.0.0', demo: true })).toBe(true);
});
