// npm run backup -- FILE: writes the whole company into one file, readable by its owner alone.
import { closeSync, existsSync, openSync, rmSync, statSync } from 'node:fs';
import { resolve } from 'node:path';

import { openDatabase } from './lib/database.mjs';
import { dumpProgram, hiddenPassword } from './lib/dump-programs.mjs';
import { copyPhotos, photosBeside, photosFolder } from './lib/photos.mjs';
import { run, stopOnSignals } from './lib/run.mjs';
import { PlainError, command, say } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  const file = process.argv[2];
  if (!file) throw new PlainError('Name the file to write: npm run backup -- driprail.backup');
  const target = resolve(process.env.INIT_CWD ?? '.', file);
  const photos = photosFolder();
  if (existsSync(photosBeside(target)))
    throw new PlainError(`${photosBeside(target)} is there already. Choose another name.`);
  const { urls, close } = await openDatabase();
  try {
    // Made first, so that nobody else can read it while it fills; an older backup is never overwritten.
    closeSync(openSync(target, 'wx', 0o600));
    const { url, env } = hiddenPassword(urls.owner);
    const words = ['--format=custom', '--no-owner', `--file=${target}`, url];
    const { code } = await run(await dumpProgram('pg_dump'), words, { env });
    if (code !== 0) {
      rmSync(target, { force: true });
      throw new PlainError('The backup was not written; what pg_dump said stands above.');
    }
    // After the rows: each photo they name has its file by then.
    const hasPhotos = photos !== null && copyPhotos(photos, photosBeside(target));
    say(
      `Wrote ${target}, ${Math.ceil(statSync(target).size / 1024)} kB. It holds everything but the session secret${photos ? '' : ' and the photos, which are in the bucket'}: keep it safe.`,
    );
    if (hasPhotos) say(`Its photos lie beside it in ${photosBeside(target)}: keep both together.`);
    return 0;
  } catch (error) {
    if (error?.code === 'EEXIST') throw new PlainError(`${target} is there already. Choose another name.`);
    if (error?.code === 'ENOENT') throw new PlainError(`The folder of ${target} does not exist.`);
    throw error;
  } finally {
    await close();
  }
});
