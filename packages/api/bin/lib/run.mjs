import { spawn } from 'node:child_process';

import { Stopped } from './words.mjs';

/** @typedef {{ code: number, output: string }} Ended exit code (128 when a signal ended it) and what was printed */

/** Groups of programs started here and not yet ended, by pid. */
const running = new Map();
let stoppedBy;

/**
 * Runs a program to its end. What it prints goes to stderr (unless `quiet`) and is kept as well, so
 * that a failure can be turned into a sentence. Each program has a process group of its own: Ctrl-C
 * in the terminal reaches only this process, which passes it on - but not to a program run with
 * `finish`, such as a package installation that must not stop half-way.
 * @param {string} program
 * @param {string[]} args
 * @param {{ quiet?: boolean, finish?: boolean, input?: string, cwd?: string, env?: NodeJS.ProcessEnv, uid?: number, gid?: number }} [options]
 * @returns {Promise<Ended>}
 */
export async function run(program, args, options = {}) {
  const { quiet = false, finish = false, input, ...spawnOptions } = options;
  if (stoppedBy) throw new Stopped(stoppedBy);
  const child = spawn(program, args, { ...spawnOptions, detached: true, stdio: ['pipe', 'pipe', 'pipe'] });
  running.set(child, finish);
  child.stdin.on('error', () => {}); // The program may end before it has read everything.
  child.stdin.end(input ?? '');
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (text) => {
      output = (output + text).slice(-100_000);
      if (!quiet) process.stderr.write(text);
    });
  }
  const code = await ended(child).finally(() => running.delete(child));
  if (stoppedBy) throw new Stopped(stoppedBy);
  return { code, output };
}

/**
 * @param {import('node:child_process').ChildProcess} child
 * @returns {Promise<number>} the exit code; rejects when the program could not be started
 */
export function ended(child) {
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code) => resolve(code ?? 128));
  });
}

/** Sends a signal to a program and everything it started; silent when it is gone already. */
export function signalGroup(child, signal) {
  try {
    process.kill(-child.pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

/**
 * From now on SIGINT, SIGTERM and SIGHUP stop the step at work and make `run` throw `Stopped`.
 * @param {(signal: NodeJS.Signals) => void} [onStop] called at each such signal
 */
export function stopOnSignals(onStop) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      stoppedBy ??= signal;
      for (const [child, finish] of running) if (!finish) signalGroup(child, 'SIGTERM');
      onStop?.(signal);
    });
  }
}

/** Throws `Stopped` when the end was asked for. */
export function continueUnlessStopped() {
  if (stoppedBy) throw new Stopped(stoppedBy);
}
