import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { dropStalePidFile, parsePostmasterPid, runningServer } from './postmaster-pid.mjs';

// Lines as PostgreSQL writes them: src/include/utils/pidfile.h. The status is padded with spaces.
const ready = '4242\n/data\n1764586201\n5433\n\n127.0.0.1\n  123456         7\nready   \n';

describe('postmaster.pid', () => {
  it('gives pid, port and status', () => {
    expect(parsePostmasterPid(ready)).toEqual({ pid: 4242, port: 5433, ready: true });
  });

  it('is not ready while the server starts', () => {
    expect(parsePostmasterPid(ready.replace('ready   ', 'starting'))?.ready).toBe(false);
    expect(parsePostmasterPid('4242\n/data\n1764586201\n')).toEqual({ pid: 4242, port: 0, ready: false });
  });

  it('names nobody when it is empty or broken', () => {
    expect(parsePostmasterPid('')).toBeUndefined();
    expect(parsePostmasterPid('-1\n/data')).toBeUndefined();
    expect(parsePostmasterPid('x\n')).toBeUndefined();
  });
});

describe('a pid file left behind', () => {
  let data;
  beforeEach(() => {
    data = mkdtempSync(join(tmpdir(), 'driprail-pid-'));
    // The pid is alive, but it is this test, no PostgreSQL.
    writeFileSync(join(data, 'postmaster.pid'), ready.replace('4242', String(process.pid)));
  });
  afterEach(() => rmSync(data, { recursive: true, force: true }));

  it('is no running server although its pid lives', () => {
    expect(runningServer(data)).toBeUndefined();
  });

  it('is removed', () => {
    dropStalePidFile(data);
    expect(existsSync(join(data, 'postmaster.pid'))).toBe(false);
  });
});
