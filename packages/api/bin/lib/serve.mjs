import { spawn } from 'node:child_process';
import { appendFileSync, mkdirSync } from 'node:fs';
import { join } from 'node:path';

import { dataFolder, root } from './paths.mjs';
import { ended, signalGroup } from './run.mjs';
import { sentenceFor, say } from './words.mjs';

const preload = new URL('with-parent.mjs', import.meta.url).href;
const grace = 15_000; // ms the server gets to finish what it is doing

/**
 * Runs the server until it ends by itself or is asked to.
 * @param {{ entry: string, env: NodeJS.ProcessEnv }} what
 * @returns {{ exit: Promise<number>, stop: () => void }} `stop` asks it; asking again later ends it at once
 */
export function serve({ entry, env }) {
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', preload, entry], {
    cwd: root,
    env: { ...process.env, ...env },
    detached: true, // Ctrl-C reaches the start script alone, which then asks the server once.
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  child.on('message', ({ crashed }) => crashed && tellCrash(crashed));
  let askedAt;
  return {
    exit: ended(child),
    stop: () => {
      // npm passes on the Ctrl-C that the terminal has sent already: the same wish twice is no impatience.
      if (askedAt && Date.now() - askedAt < 2000) return;
      signalGroup(child, askedAt ? 'SIGKILL' : 'SIGTERM');
      askedAt ??= Date.now();
      setTimeout(() => signalGroup(child, 'SIGKILL'), grace).unref();
    },
  };
}

function tellCrash({ code, message, stack }) {
  const log = join(dataFolder(), 'crash.log');
  try {
    mkdirSync(dataFolder(), { recursive: true });
    appendFileSync(log, `${new Date().toISOString()}\n${stack ?? message}\n\n`, { mode: 0o600 });
  } catch {
    // A full disk is what the sentence below may be about.
  }
  if (process.env.DRIPRAIL_DEBUG) process.stderr.write(`${stack}\n`);
  say(sentenceFor({ code, message, log }));
}
