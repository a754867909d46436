// npm test: the checks, then unit, API and browser tests. `npm test -- api pay` runs one part, or some files of it.
import { apiBundle, buildApi, buildWeb } from './lib/build.mjs';
import { runChecks } from './lib/checks.mjs';
import { ensureChromium } from './lib/chromium.mjs';
import { ensureInstalled } from './lib/install.mjs';
import { openTestCluster } from './lib/postgres.mjs';
import { stopOnSignals } from './lib/run.mjs';
import { sum } from './lib/tally.mjs';
import { runVitest } from './lib/vitest-run.mjs';
import { command, PlainError, say } from './lib/words.mjs';

const parts = ['checks', 'unit', 'api', 'browser'];

await command(async () => {
  stopOnSignals();
  const [only, ...filters] = process.argv.slice(2);
  if (only && !parts.includes(only))
    throw new PlainError(`There is no part “${only}”; the parts are ${parts.join(', ')}.`);
  const wanted = only ? [only] : parts;

  // What may be missing on this machine is fetched before anything long begins.
  const chromium = wanted.includes('browser') ? await ensureChromium() : undefined;
  const needsDatabase = wanted.includes('api') || wanted.includes('browser');
  const cluster = needsDatabase ? await openTestCluster() : undefined;
  try {
    await ensureInstalled();
    const env = {
      ...(cluster && { DRIPRAIL_TEST_PG_PORT: String(cluster.port) }),
      ...(chromium && { CHROMIUM: chromium, DRIPRAIL_API_ENTRY: apiBundle }),
    };
    const run = {
      checks: runChecks,
      unit: () => runVitest('unit', filters, env),
      api: () => runVitest('api', filters, env),
      browser: async () => {
        await buildWeb();
        await buildApi();
        return runVitest('browser', filters, env);
      },
    };
    const tallies = [];
    for (const part of wanted) {
      say(`\nRunning: ${part}`);
      tallies.push(await run[part]().catch(asFailure));
    }
    const { passed, failed } = sum(tallies);
    await cluster?.close();
    process.stdout.write(`${passed} passed, ${failed} failed\n`);
    return failed === 0 ? 0 : 1;
  } catch (error) {
    await cluster?.close();
    throw error;
  }
});

/** A part that cannot run is one failure; the others still get their turn. */
function asFailure(error) {
  if (!(error instanceof PlainError)) throw error;
  say(error.message);
  return { passed: 0, failed: 1 };
}
