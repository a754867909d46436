// npm run bench: compares pairs of ways in one run, on a throw-away database.
import { ensureInstalled } from './lib/install.mjs';
import { openTestCluster } from './lib/postgres.mjs';
import { runProgram, stopOnSignals } from './lib/run.mjs';
import { command } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  await ensureInstalled();
  const { port, close } = await openTestCluster();
  const env = { DRIPRAIL_TEST_PG_PORT: String(port), NODE_ENV: 'production' };
  return runProgram('packages/api/bench/main.ts', process.argv.slice(2), env).finally(close);
});
