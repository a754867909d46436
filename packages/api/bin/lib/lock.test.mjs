import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterEach, beforeEach, expect, it } from 'vitest';

import { withLock } from './lock.mjs';

let folder;
let file;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'driprail-lock-'));
  file = join(folder, 'lock');
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

it('is given back, also after a failure', async () => {
  await expect(withLock(file, () => Promise.resolve(existsSync(file)))).resolves.toBe(true);
  await expect(withLock(file, () => Promise.reject(new Error('no')))).rejects.toThrow('no');
  expect(existsSync(file)).toBe(false);
});

it('lets one in at a time', async () => {
  const order = [];
  let release;
  const first = withLock(file, () => new Promise((resolve) => (release = resolve)).then(() => order.push('first')));
  const second = withLock(
    file,
    async () => order.push('second'),
    () => release(),
  );
  await Promise.all([first, second]);
  expect(order).toEqual(['first', 'second']);
});

it('is taken over from a holder that was killed', async () => {
  writeFileSync(file, `${process.pid}-1`);
  await expect(withLock(file, () => Promise.resolve('in'))).resolves.toBe('in');
});
