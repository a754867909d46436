// npm run bench: compares pairs of ways in one run, on a throw-away database.
import { apiBundle, buildApi, buildWeb } from './lib/build.mjs';
import { ensureChromium } from './lib/chromium.mjs';
import { ensureInstalled } from './lib/install.mjs';
import { openTestCluster } from './lib/postgres.mjs';
import { runProgram, stopOnSignals } from './lib/run.mjs';
import { command } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  await ensureInstalled();
  const chromium = await ensureChromium();
  await buildWeb();
  await buildApi();
  const { port, close } = await openTestCluster();
  const env = { DRIPRAIL_TEST_PG_PORT: String(port), NODE_ENV: 'production' };
  const browser = { ...env, CHROMIUM: chromium, DRIPRAIL_API_ENTRY: apiBundle };
  try {
    const code = await runProgram('packages/api/bench/main.ts', process.argv.slice(2), env);
    return code || (await runProgram('packages/web/bench/main.ts', [], browser));
  } finally {
    await close();
  }
});
