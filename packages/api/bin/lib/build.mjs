import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

import { withLock } from './lock.mjs';
import { root } from './paths.mjs';
import { run } from './run.mjs';
import { filesBelow, hashFiles } from './source-hash.mjs';
import { meansFullDisk, PlainError, say } from './words.mjs';

const api = join(root, 'packages/api');
const web = join(root, 'packages/web');

/** The built web app's folder. */
export const webDist = join(web, 'dist');
/** The api in one file for plain Node, which cannot load the TypeScript of the packages it shares. */
export const apiBundle = join(api, 'dist/main.mjs');

/** Builds the web app when its sources have changed since the last time. */
export function buildWeb() {
  const sources = [...filesBelow(web), ...filesBelow(join(root, 'packages/shared/src')), join(root, 'pnpm-lock.yaml')];
  return unlessBuilt({ folder: web, result: join(webDist, 'index.html'), sources, what: 'the web app' }, async () => {
    const vite = join(web, 'node_modules/vite/bin/vite.js');
    const env = { ...process.env, NODE_ENV: 'production' };
    const { code, output } = await run(process.execPath, [vite, 'build', '--logLevel', 'warn'], {
      cwd: web,
      env,
      show: 'beat',
    });
    if (code === 0) return;
    if (meansFullDisk(output)) throw new PlainError('The disk is full: the web app could not be built.');
    process.stderr.write(output.replace(/^\s+at .*\n/gm, '')); // Where in the tool it happened helps nobody.
    throw new PlainError('The web app could not be built; the reason stands above.');
  });
}

/** Bundles the api when its sources have changed since the last time. */
export function buildApi() {
  const folders = [join(api, 'src'), join(root, 'packages/shared/src'), join(root, 'seed')];
  const sources = [...folders.flatMap(filesBelow), join(api, 'package.json'), join(root, 'pnpm-lock.yaml')];
  return unlessBuilt({ folder: api, result: apiBundle, sources, what: 'the server' }, async () => {
    const { build } = await import(pathToFileURL(createRequire(join(api, 'package.json')).resolve('esbuild')).href);
    const { dependencies } = JSON.parse(readFileSync(join(api, 'package.json'), 'utf8'));
    await build({
      entryPoints: [join(api, 'src/main.ts')],
      outfile: apiBundle,
      bundle: true,
      platform: 'node',
      format: 'esm',
      target: 'node20',
      sourcemap: true,
      logLevel: 'warning',
      // What Node finds from here stays outside; the workspace's own packages and theirs go in.
      external: Object.keys(dependencies).filter((name) => !name.startsWith('@driprail/')),
      banner: { js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);" },
    }).catch(() => {
      throw new PlainError('The server could not be built; the reason stands above.');
    });
  });
}

/** Skips the work when the result is there and was made from these very sources. */
async function unlessBuilt({ folder, result, sources, what }, work) {
  const stamp = join(folder, 'node_modules', '.driprail-built');
  const wanted = hashFiles(root, sources);
  const isCurrent = () => existsSync(result) && existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted;
  if (isCurrent()) return;
  await withLock(`${stamp}.lock`, async () => {
    if (isCurrent()) return;
    say(`Building ${what}.`);
    rmSync(stamp, { force: true });
    await work();
    writeFileSync(stamp, wanted);
  });
}
