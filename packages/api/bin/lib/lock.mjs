import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

import { isRunning, ownIdentity } from './process-identity.mjs';

/**
 * Runs `body` while no other command holds the same lock file; waits for its turn. A lock whose
 * holder was killed is taken over.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} body
 * @param {() => void} [onWait] called once when another command is at it
 * @returns {Promise<T>}
 */
export async function withLock(file, body, onWait) {
  mkdirSync(dirname(file), { recursive: true });
  let told = false;
  while (!take(file)) {
    if (!told) onWait?.();
    told = true;
    await wait(100);
  }
  try {
    return await body();
  } finally {
    rmSync(file, { force: true });
  }
}

/** The file appears whole or not at all (a link to a finished one), so nobody reads half a name. */
function take(file) {
  const mine = `${file}.${process.pid}`;
  try {
    writeFileSync(mine, ownIdentity());
    linkSync(mine, file);
    return true;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
    dropIfAbandoned(file);
    return false;
  } finally {
    rmSync(mine, { force: true });
  }
}

function dropIfAbandoned(file) {
  const holder = read(file);
  if (holder === undefined || isRunning(holder)) return;
  // Moved aside before it is judged for good: of two commands that find it, one moves it, and
  // neither deletes the lock a third has just taken.
  const aside = `${file}.old-${process.pid}`;
  try {
    renameSync(file, aside);
  } catch {
    return;
  }
  const moved = read(aside);
  if (moved !== undefined && isRunning(moved)) {
    try {
      linkSync(aside, file);
    } catch {
      // Somebody else holds the lock by now and the one moved aside waits behind it.
    }
  }
  rmSync(aside, { force: true });
}

function read(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}
