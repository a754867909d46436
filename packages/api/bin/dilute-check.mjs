// npm run --silent dilute:check -- FILE.json: kit scenarios in, their results on standard output and nothing else.
import { existsSync } from 'node:fs';
import { resolve } from 'node:path';

import { ensureInstalled } from './lib/install.mjs';
import { runProgram, stopOnSignals } from './lib/run.mjs';
import { command } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  await ensureInstalled({ quiet: true });
  return runProgram('packages/api/src/commands/dilute-check.ts', process.argv.slice(2).map(located));
});

/** npm runs commands in the checkout; a file may be named from the folder the person stands in. */
function located(file) {
  const fromHere = resolve(file);
  return existsSync(fromHere) ? fromHere : resolve(process.env.INIT_CWD ?? '.', file);
}
