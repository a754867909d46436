import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { qrModules, qrPath } from './qr-modules.ts';
import { QrPicture } from './qr.tsx';

/** Bytes that a code holds at level M, by version: ISO/IEC 18004, table 7 (from memory: 14, 26, 42, 62). */
const HOLDS = [
  { version: 1, bytes: 14 },
  { version: 2, bytes: 26 },
  { version: 3, bytes: 42 },
  { version: 4, bytes: 62 },
];

/** Corner squares: seven modules, a light ring and a dark heart of three (ISO/IEC 18004, finder pattern). */
const FINDER = ['#######', '#.....#', '#.###.#', '#.###.#', '#.###.#', '#.....#', '#######'];

describe('a code', () => {
  test.each(HOLDS)('of $bytes bytes is version $version, one more byte takes the next', async ({ version, bytes }) => {
    expect((await qrModules('a'.repeat(bytes))).size).toBe(17 + 4 * version);
    expect((await qrModules('a'.repeat(bytes + 1))).size).toBe(17 + 4 * (version + 1));
  });

  test('has its three corners, the right way round', async () => {
    const { size, isDark } = await qrModules('https://tern-and-tide.example/bill/1042');
    const corner = (left: number, top: number) =>
      FINDER.map((row, y) => [...row].map((_, x) => (isDark(left + x, top + y) ? '#' : '.')).join(''));
    expect(corner(0, 0)).toEqual(FINDER);
    expect(corner(size - 7, 0)).toEqual(FINDER);
    expect(corner(0, size - 7)).toEqual(FINDER);
    expect(corner(size - 7, size - 7)).not.toEqual(FINDER);
  });

  test('is not made of more than a code holds', async () => {
    await expect(qrModules('a'.repeat(3000))).rejects.toThrow();
  });
});

test('the path covers the dark modules and no other', async () => {
  const modules = await qrModules('Tern & Tide');
  const covered = [...qrPath(modules).matchAll(/M(\d+) (\d+)h(\d+)v1h-(\d+)z/g)].flatMap(([, x, y, length]) =>
    Array.from({ length: Number(length) }, (_, nth) => `${Number(x) + nth},${y}`),
  );
  const all = Array.from({ length: modules.size ** 2 }, (_, nth) => [
    nth % modules.size,
    Math.floor(nth / modules.size),
  ]);
  const dark = all.filter(([x = 0, y = 0]) => modules.isDark(x, y)).map(([x, y]) => `${x},${y}`);
  expect(covered).toEqual(dark);
});

test('the picture keeps four light modules around the code and says what it is for', async () => {
  const modules = await qrModules('https://tern-and-tide.example/bill/1042');
  const html = renderToStaticMarkup(<QrPicture modules={modules} label="Pay invoice 1042 by card" />);
  expect(html).toContain(`viewBox="-4 -4 ${modules.size + 8} ${modules.size + 8}"`);
  expect(html).toContain('fill="#fff"');
  expect(html).toContain('Pay invoice 1042 by card');
});
