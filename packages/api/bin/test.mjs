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
  const needsDatabase = wanted.includes('api') || wanted.includes('browser');
  const [chromium, cluster] = await Promise.all([
    wanted.includes('browser') ? outcome(ensureChromium()) : undefined,
    needsDatabase ? outcome(openTestCluster()) : undefined,
    ensureInstalled(),
  ]);
  try {
    const database = () => ({ DRIPRAIL_TEST_PG_PORT: String(cluster.value().port) });
    const run = {
      checks: runChecks,
      unit: () => runVitest('unit', filters, {}),
      api: async () => runVitest('api', filters, database()),
      browser: async () => {
        const env = { ...database(), CHROMIUM: chromium.value(), DRIPRAIL_API_ENTRY: apiBundle };
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

/** Keeps a sentence about something missing for the parts that need it; the others can do without. */
async function outcome(promise) {
  try {
    const got = await promise;
    return { value: () => got, close: () => got.close() };
  } catch (error) {
    if (!(error instanceof PlainError)) throw error;
    const value = () => {
      throw error;
    };
    return { value, close: () => Promise.resolve() };
  }
}

/** A part that cannot run is one failure; the others still get their turn. */
function asFailure(error) {
  if (!(error instanceof PlainError)) throw error;
  say(error.message);
  return { passed: 0, failed: 1 };
}
