import { spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

import { freePort, isFree } from './ports.mjs';
import { dropStalePidFile, runningServer } from './postmaster-pid.mjs';
import { continueUnlessStopped } from './run.mjs';
import { meansFullDisk, PlainError, say } from './words.mjs';

/** @typedef {{ bin: string, data: string, user: object, durable: boolean, log: string }} Server */

const tick = 50; // ms between looks at postmaster.pid
const patience = 10 * 60_000; // ms; recovery after a crash may replay a lot of journal

/**
 * Starts the server on its data folder and waits until it takes connections.
 * @param {Server} server
 * @param {number} [lastPort] kept when it is free
 * @returns {Promise<{ port: number, child: import('node:child_process').ChildProcess }>}
 * @throws {PlainError}
 */
export async function startServer(server, lastPort) {
  for (let tries = 1; ; tries += 1) {
    const port = lastPort && tries < 3 && (await isFree(lastPort)) ? lastPort : await freePort();
    dropStalePidFile(server.data);
    const from = logSize(server.log);
    const child = launch(server, port);
    const ready = await becomesReady(server.data, child).catch((error) => {
      child.kill('SIGINT'); // Nobody would end it later.
      throw error;
    });
    if (ready) return { port, child };
    const words = readFileSync(server.log, 'utf8').slice(from);
    // A killed server's workers take a moment to notice; a port may have been taken meanwhile.
    const passing = /shared memory block|still in use|already in use|could not bind/i.test(words);
    if (!passing || tries === 20) throw notStarted(words, server.log);
    await wait(500);
  }
}

function launch({ bin, data, user, durable, log }, port) {
  const careless = ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off', 'max_connections=200'];
  const settings = [
    'listen_addresses=127.0.0.1',
    'unix_socket_directories=',
    'timezone=UTC',
    'max_parallel_workers_per_gather=0', // Containers often have too little /dev/shm for parallel queries.
    ...(durable ? [] : careless),
  ];
  const output = openSync(log, logSize(log) > 10_000_000 ? 'w' : 'a', 0o600);
  // A session of its own keeps Ctrl-C away from it until the app has closed its connections.
  const child = spawn(join(bin, 'postgres'), ['-D', data, '-p', String(port), ...settings.flatMap((s) => ['-c', s])], {
    ...user,
    detached: true,
    stdio: ['ignore', output, output],
  });
  closeSync(output);
  child.unref();
  return child;
}

async function becomesReady(data, child) {
  let over = false;
  child.once('error', () => (over = true));
  child.once('exit', () => (over = true));
  for (let waited = 0; !over && waited < patience; waited += tick) {
    const seen = runningServer(data);
    if (seen?.pid === child.pid && seen.ready) return true;
    if (waited === 10_000) say('PostgreSQL is recovering after an abrupt end; this can take a while.');
    await wait(tick);
    continueUnlessStopped();
  }
  return false;
}

/**
 * Waits for a server somebody else is starting.
 * @returns {Promise<number | undefined>} its port; undefined when it went away
 */
export async function waitForRunning(data) {
  for (let waited = 0; waited < patience; waited += tick) {
    const seen = runningServer(data);
    if (!seen) return undefined;
    if (seen.ready) return seen.port;
    await wait(tick);
    continueUnlessStopped();
  }
  return undefined;
}

/** Ends the server: open sessions are closed and everything is on disk when this returns. */
export async function stopServer(data) {
  const seen = runningServer(data);
  if (!seen) return;
  process.kill(seen.pid, 'SIGINT'); // The "fast" shutdown; SIGTERM would wait for open sessions.
  while (runningServer(data)?.pid === seen.pid) await wait(tick);
}

function logSize(log) {
  return statSync(log, { throwIfNoEntry: false })?.size ?? 0;
}

function notStarted(words, log) {
  if (meansFullDisk(words))
    return new PlainError(
      'The disk is full: PostgreSQL could not start. Free some space and start again; nothing that was saved is lost.',
    );
  const reason = words.split('\n').findLast((line) => /FATAL|PANIC|ERROR/.test(line));
  const short = reason?.replace(/^.*?(FATAL|PANIC|ERROR):\s*/, '') ?? 'no reason given';
  return new PlainError(`PostgreSQL did not start (${short}); its log is ${log}.`);
}
