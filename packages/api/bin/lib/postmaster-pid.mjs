import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';

import { startTime } from './process-identity.mjs';

/**
 * Reads PostgreSQL's postmaster.pid: pid, data folder, start time, port, socket folder, address,
 * shared memory key and status, one a line. The last lines appear while the server starts.
 * @param {string} text
 * @returns {{ pid: number, port: number, ready: boolean } | undefined} undefined when it names no process
 */
export function parsePostmasterPid(text) {
  const lines = text.split('\n').map((line) => line.trim());
  const pid = Number(lines[0]);
  if (!Number.isInteger(pid) || pid <= 1) return undefined;
  return { pid, port: Number(lines[3] || 0), ready: lines[7] === 'ready' };
}

/**
 * The server that runs on a data folder. A pid file alone is no proof: after a crash it stays behind
 * and its pid may by now be another program's, so the process has to be a postgres on this folder.
 * @param {string} data
 */
export function runningServer(data) {
  const entry = read(data);
  return entry && isPostgresOn(entry.pid, data) ? entry : undefined;
}

/**
 * Removes a pid file nobody stands behind; call only while holding the cluster's lock.
 * @param {string} data
 */
export function dropStalePidFile(data) {
  if (!runningServer(data)) rmSync(join(data, 'postmaster.pid'), { force: true });
}

function read(data) {
  try {
    return parsePostmasterPid(readFileSync(join(data, 'postmaster.pid'), 'utf8'));
  } catch (error) {
    if (error.code === 'ENOENT') return undefined;
    throw error;
  }
}

function isPostgresOn(pid, data) {
  if (startTime(pid) === undefined) return false;
  try {
    const words = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return /postgres/.test(words[0]) && words.includes(data);
  } catch {
    return false;
  }
}
