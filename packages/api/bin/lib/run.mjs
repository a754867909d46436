import { spawn } from 'node:child_process';

import { root } from './paths.mjs';
import { Stopped } from './words.mjs';

/** @typedef {{ code: number, output: string }} Ended exit code (128 when a signal ended it) and what was printed */

/** Groups of programs started here and not yet ended, by pid. */
const running = new Map();
let stoppedBy;

/**
 * Runs a program to its end. What it prints is passed on and kept as well, so that a failure can be
 * turned into a sentence. Each program has a process group of its own: Ctrl-C in the terminal reaches
 * only this process, which passes it on - but not to a program run with `finish`, such as a package
 * installation that must not stop half-way.
 * @param {string} program
 * @param {string[]} args
 * @param {{ show?: 'all' | 'beat' | 'nothing', finish?: boolean, input?: string, to?: NodeJS.WriteStream, cwd?: string, env?: NodeJS.ProcessEnv, uid?: number, gid?: number }} [options]
 *   `show: 'beat'` tells its last line every five seconds; `to` gets what is shown, by default stderr
 * @returns {Promise<Ended>}
 */
export async function run(program, args, options = {}) {
  const { show = 'all', finish = false, input = '', to = process.stderr, ...spawnOptions } = options;
  const child = start(program, args, { ...spawnOptions, stdio: 'pipe' }, finish);
  child.stdin.on('error', () => {}); // The program may end before it has read everything.
  child.stdin.end(input);
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (text) => {
      output = (output + text).slice(-100_000);
      if (show === 'all') to.write(text);
    });
  }
  const beat = show === 'beat' ? tellNowAndThen(() => output, to) : undefined;
  const code = await ended(child).finally(() => clearInterval(beat));
  if (stoppedBy) throw new Stopped(stoppedBy);
  return { code, output };
}

function tellNowAndThen(output, to) {
  const started = Date.now();
  return setInterval(() => {
    const last = output()
      .trimEnd()
      .split(/[\r\n]+/)
      .at(-1)
      .trim()
      .slice(0, 100);
    to.write(`  ${Math.round((Date.now() - started) / 1000)} s  ${last}\n`);
  }, 5000);
}

/**
 * Runs one of the project's TypeScript programs as if it were this command: its output is this one's.
 * @param {string} file path from the checkout's top
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} [env] added to this process's
 * @returns {Promise<number>} its exit code
 */
export async function runProgram(file, args, env = {}) {
  const all = ['--import', 'tsx', file, ...args];
  const child = start(process.execPath, all, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const code = await ended(child);
  if (stoppedBy) throw new Stopped(stoppedBy);
  return code;
}

function start(program, args, options, finish = false) {
  if (stoppedBy) throw new Stopped(stoppedBy);
  const child = spawn(program, args, { ...options, detached: true });
  running.set(child, finish);
  for (const event of ['error', 'close']) child.once(event, () => running.delete(child));
  return child;
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

/** Asks every program started here to end, except those that must finish; insists after ten seconds. */
export function endRunning() {
  const endable = [...running].filter(([, finish]) => !finish).map(([child]) => child);
  for (const child of endable) signalGroup(child, 'SIGTERM');
  setTimeout(() => {
    for (const child of endable) if (running.has(child)) signalGroup(child, 'SIGKILL');
  }, 10_000).unref();
}

/**
 * From now on SIGINT, SIGTERM and SIGHUP stop the step at work and make `run` throw `Stopped`.
 * @param {(signal: NodeJS.Signals) => void} [onStop] called at each such signal
 */
export function stopOnSignals(onStop) {
  const stop = (signal) => {
    stoppedBy ??= signal;
    endRunning();
    onStop?.(signal);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, stop);
  if (process.env.npm_lifecycle_event) whenOrphaned(() => stop('SIGTERM'));
}

/**
 * npm passes SIGTERM on to the shell it started, not to what runs in the shell: the shell's end is all
 * that is seen of it here.
 */
function whenOrphaned(tell) {
  const parent = process.ppid;
  const watch = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(watch);
    tell();
  }, 200).unref();
}

/** Throws `Stopped` when the end was asked for. */
export function continueUnlessStopped() {
  if (stoppedBy) throw new Stopped(stoppedBy);
}
