import { spawnSync } from 'node:child_process';

import { describe, expect, it } from 'vitest';

import { isRunning, ownIdentity, parseStat } from './process-identity.mjs';

describe('process identity', () => {
  it('finds the start time behind a program name with spaces and brackets', () => {
    const stat = `812 (a (b) c) S ${Array.from({ length: 18 }, (_, i) => i + 4).join(' ')} 4711 0 0`;
    expect(parseStat(stat)).toBe('4711');
  });

  it('does not count a zombie as running', () => {
    expect(parseStat('812 (node) Z 1 812 812 0 -1 4 0 0 0 0 0 0 0 0 20 0 1 0 4711 0')).toBeUndefined();
  });

  it('tells this process from one that had its pid before', () => {
    expect(isRunning(ownIdentity())).toBe(true);
    expect(isRunning(`${process.pid}-1`)).toBe(false);
    expect(isRunning('nonsense')).toBe(false);
    expect(isRunning('')).toBe(false);
  });

  it('sees that an ended process is gone', () => {
    const { pid } = spawnSync(process.execPath, ['-e', '']);
    expect(isRunning(`${pid}-4711`)).toBe(false);
  });
});
