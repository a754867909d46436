// npm run dev: api and web with hot reload, on a demo company of their own (.data/dev).
import { join } from 'node:path';

import { openDatabase } from './lib/database.mjs';
import { dataFolder, root } from './lib/paths.mjs';
import { portFrom, requirePort } from './lib/ports.mjs';
import { endRunning, run, stopOnSignals } from './lib/run.mjs';
import { command, say } from './lib/words.mjs';

await command(async () => {
  stopOnSignals();
  process.env.DRIPRAIL_DATA ||= '.data/dev';
  const webPort = portFrom(process.env.PORT, 4600);
  const apiPort = webPort + 1;
  await requirePort(webPort, '127.0.0.1');
  await requirePort(apiPort, '127.0.0.1');
  const { urls, isPrivate, close } = await openDatabase();
  const env = {
    ...process.env,
    DATABASE_URL: urls.app,
    DATABASE_MIGRATION_URL: urls.owner,
    DRIPRAIL_DATA: dataFolder(),
    DRIPRAIL_DEMO: isPrivate ? '1' : '0',
    DRIPRAIL_API_URL: `http://127.0.0.1:${apiPort}`, // Where the web's development server passes /api on to.
    HOST: '127.0.0.1',
  };
  const tsx = ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'packages/api/src/main.ts'];
  const vite = ['node_modules/vite/bin/vite.js', '--host', '127.0.0.1', '--port', String(webPort), '--strictPort'];
  say(`Open http://127.0.0.1:${webPort}; changes show at once. Ctrl-C ends it.`);
  const both = [
    run(process.execPath, tsx, { cwd: root, env: { ...env, PORT: String(apiPort) } }),
    run(process.execPath, vite, { cwd: join(root, 'packages/web'), env }),
  ];
  try {
    await Promise.race(both);
    return 1; // Neither ends by itself unless something is wrong; it has said what.
  } finally {
    endRunning();
    await Promise.allSettled(both);
    await close();
  }
});
