import { existsSync } from 'node:fs';
import { resolve } from 'node:path';

import { ensureInstalled } from './install.mjs';
import { runProgram, stopOnSignals } from './run.mjs';
import { command } from './words.mjs';

/** Runs a program that reads a file of scenarios; only its results go to standard output. */
export function checkCommand(program) {
  return command(async () => {
    stopOnSignals();
    await ensureInstalled({ quiet: true });
    return runProgram(program, process.argv.slice(2).map(located));
  });
}

/** npm runs commands in the checkout; a file may be named from the folder the person stands in. */
function located(file) {
  const fromHere = resolve(file);
  return existsSync(fromHere) ? fromHere : resolve(process.env.INIT_CWD ?? '.', file);
}
