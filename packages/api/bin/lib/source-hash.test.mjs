import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterEach, beforeEach, expect, it } from 'vitest';

import { filesBelow, hashFiles } from './source-hash.mjs';

let base;
const hash = () => hashFiles(base, filesBelow(base));

beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), 'driprail-hash-'));
  mkdirSync(join(base, 'deep'));
  writeFileSync(join(base, 'deep/a.ts'), 'one');
  writeFileSync(join(base, 'b.ts'), 'two');
});
afterEach(() => rmSync(base, { recursive: true, force: true }));

it('is the same for the same files, in any order', () => {
  expect(hashFiles(base, filesBelow(base).reverse())).toBe(hash());
});

it('changes with a content, even one of the same length, and with a name', () => {
  const seen = new Set([hash()]);
  writeFileSync(join(base, 'deep/a.ts'), 'eno');
  seen.add(hash());
  writeFileSync(join(base, 'c.ts'), '');
  seen.add(hash());
  expect(seen.size).toBe(3);
});

it('leaves out what is built and installed', () => {
  const before = hash();
  for (const folder of ['dist', 'node_modules']) {
    mkdirSync(join(base, 'deep', folder));
    writeFileSync(join(base, 'deep', folder, 'x.js'), 'x');
  }
  expect(hash()).toBe(before);
});

it('finds nothing in a folder that is not there', () => {
  expect(filesBelow(join(base, 'nowhere'))).toEqual([]);
});
