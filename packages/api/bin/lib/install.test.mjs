import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { isCurrent, markInstalled, pinnedPnpm, requireNode } from './install.mjs';

let base;
const write = (name, text) => writeFileSync(join(base, name), text);

beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), 'driprail-install-'));
  for (const folder of ['packages/api', 'seed', 'node_modules']) mkdirSync(join(base, folder), { recursive: true });
  write('package.json', '{"packageManager":"pnpm@10.34.9"}');
  write('packages/api/package.json', '{"dependencies":{}}');
  write('pnpm-lock.yaml', 'lockfileVersion: 9');
});
afterEach(() => rmSync(base, { recursive: true, force: true }));

describe('the package manager', () => {
  it('is the one package.json pins', () => {
    expect(pinnedPnpm(base)).toBe('pnpm@10.34.9');
  });

  it('has to be pinned', () => {
    write('package.json', '{"packageManager":"pnpm"}');
    expect(() => pinnedPnpm(base)).toThrow('names no pnpm version');
  });
});

describe('the installation', () => {
  it('is not current before it was made, and current after', () => {
    expect(isCurrent(base)).toBe(false);
    markInstalled(base);
    expect(isCurrent(base)).toBe(true);
  });

  it.each(['pnpm-lock.yaml', 'package.json', 'packages/api/package.json'])('is old when %s changes', (name) => {
    markInstalled(base);
    write(name, '{"packageManager":"pnpm@10.34.9","private":true}');
    expect(isCurrent(base)).toBe(false);
  });

  it('is gone with node_modules', () => {
    markInstalled(base);
    rmSync(join(base, 'node_modules'), { recursive: true });
    expect(isCurrent(base)).toBe(false);
  });
});

describe('Node.js', () => {
  it.each(['20.19.0', '20.20.2', '22.1.0'])('may be %s', (version) => {
    expect(() => requireNode(version)).not.toThrow();
  });

  it.each(['20.18.3', '18.20.0'])('may not be %s', (version) => {
    expect(() => requireNode(version)).toThrow('20.19 or newer');
  });
});
