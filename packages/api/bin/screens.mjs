// npm run screens: a picture of every screen, per role, desktop and phone, from a demo company made for it.
import { apiBundle, buildApi, buildWeb } from './lib/build.mjs';
import { ensureChromium } from './lib/chromium.mjs';
import { ensureInstalled } from './lib/install.mjs';
import { openTestCluster } from './lib/postgres.mjs';
import { runProgram, stopOnSignals } from './lib/run.mjs';
import { command } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  const chromium = await ensureChromium();
  await ensureInstalled();
  await buildWeb();
  await buildApi();
  const { port, close } = await openTestCluster();
  const env = { DRIPRAIL_TEST_PG_PORT: String(port), CHROMIUM: chromium, DRIPRAIL_API_ENTRY: apiBundle };
  return runProgram('packages/web/e2e/screens.ts', process.argv.slice(2), env).finally(close);
});
