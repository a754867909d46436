// npm run restore -- FILE: brings a backup into an empty database; one that has a company is left alone.
import { existsSync } from 'node:fs';
import { resolve } from 'node:path';

import { openDatabase } from './lib/database.mjs';
import { dumpProgram, hiddenPassword } from './lib/dump-programs.mjs';
import { dataFolder } from './lib/paths.mjs';
import { copyPhotos, photosBeside, photosFolder } from './lib/photos.mjs';
import { run, runProgram, stopOnSignals } from './lib/run.mjs';
import { PlainError, command, say } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  const file = process.argv[2];
  if (!file) throw new PlainError('Name the backup to read: npm run restore -- driprail.backup');
  const source = resolve(process.env.INIT_CWD ?? '.', file);
  if (!existsSync(source)) throw new PlainError(`${source} does not exist.`);
  const { urls, close } = await openDatabase();
  const env = { DATABASE_URL: urls.app, DATABASE_MIGRATION_URL: urls.owner, DRIPRAIL_DATA: dataFolder() };
  try {
    if ((await runProgram('packages/api/src/commands/prepare-restore.ts', [], env)) !== 0) return 1;
    const { url, env: withPassword } = hiddenPassword(urls.owner);
    const words = [
      '--no-owner',
      '--no-privileges',
      '--exit-on-error',
      '--single-transaction',
      `--dbname=${url}`,
      source,
    ];
    const { code } = await run(await dumpProgram('pg_restore'), words, { env: withPassword });
    if (code !== 0) {
      throw new PlainError('The backup was not brought in; the database is as it was before.');
    }
    const photos = photosFolder();
    if (photos) copyPhotos(photosBeside(source), photos);
    if ((await runProgram('packages/api/src/commands/check-data.ts', [], env)) !== 0) return 1;
    say('The backup is in. Start Driprail with npm start.');
    return 0;
  } finally {
    await close();
  }
});
