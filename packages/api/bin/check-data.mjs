// npm run check:data: asks the database whether what must add up does.
import { openDatabase } from './lib/database.mjs';
import { dataFolder } from './lib/paths.mjs';
import { runProgram, stopOnSignals } from './lib/run.mjs';
import { command } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  const { urls, close } = await openDatabase();
  const env = { DATABASE_URL: urls.app, DATABASE_MIGRATION_URL: urls.owner, DRIPRAIL_DATA: dataFolder() };
  return runProgram('packages/api/src/commands/check-data.ts', [], env).finally(close);
});
