// npm start: everything from a bare checkout to a running Driprail.
import { switches } from './lib/arguments.mjs';
import { apiBundle, buildApi, buildWeb, webDist } from './lib/build.mjs';
import { openDatabase } from './lib/database.mjs';
import { wantsDemo } from './lib/demo.mjs';
import { dataFolder } from './lib/paths.mjs';
import { portFrom, requirePort } from './lib/ports.mjs';
import { continueUnlessStopped, stopOnSignals } from './lib/run.mjs';
import { serve } from './lib/serve.mjs';
import { command, PlainError, say } from './lib/words.mjs';

let server;
let stopping = false;

await command(async () => {
  stopOnSignals(() => {
    stopping = true;
    server?.stop();
  });
  const { empty, demo } = switches(process.argv.slice(2), ['empty', 'demo']);
  if (empty && demo) throw new PlainError('Choose --empty or --demo, not both.');
  const host = process.env.HOST || '127.0.0.1';
  const port = portFrom(process.env.PORT, 4600);
  await requirePort(port, host);

  const database = await openDatabase();
  try {
    await buildWeb();
    await buildApi();
    continueUnlessStopped();
    server = serve({
      entry: apiBundle,
      env: {
        DATABASE_URL: database.urls.app,
        DATABASE_MIGRATION_URL: database.urls.owner,
        PORT: String(port),
        HOST: host,
        DRIPRAIL_DATA: dataFolder(),
        DRIPRAIL_DEMO: wantsDemo({ demo, empty, host, isPrivate: database.isPrivate }) ? '1' : '0',
        DRIPRAIL_WEB_DIST: webDist,
        NODE_ENV: process.env.NODE_ENV || 'production',
      },
    });
    const code = await server.exit;
    if (stopping) say('Driprail has stopped.');
    return stopping ? 0 : code;
  } finally {
    await database.close();
  }
});
