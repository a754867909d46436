import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

import { withLock } from './lock.mjs';
import { root } from './paths.mjs';
import { run } from './run.mjs';
import { hashFiles } from './source-hash.mjs';
import { meansFullDisk, PlainError, say } from './words.mjs';

/**
 * Installs the pinned packages exactly as locked, unless that has been done for this very lock.
 * @param {{ quiet?: boolean, root?: string }} [options] `quiet` says nothing unless it fails
 * @throws {PlainError} when the packages cannot be fetched or written
 */
export async function ensureInstalled({ quiet = false, root: base = root } = {}) {
  requireNode(process.versions.node);
  const modules = join(base, 'node_modules');
  if (isCurrent(base)) return;
  mkdirSync(modules, { recursive: true });
  const tell = quiet ? () => {} : say;
  await withLock(
    join(modules, '.driprail-install.lock'),
    async () => {
      if (isCurrent(base)) return;
      tell('Installing the pinned packages (about a minute the first time).');
      rmSync(stampFile(base), { force: true });
      await pnpmInstall(base, quiet);
      markInstalled(base);
    },
    () => tell('Another command is installing the packages; waiting for it.'),
  );
}

/**
 * @param {string} version of Node.js, such as `20.19.0`
 * @throws {PlainError} when it is older than package.json's `engines` asks for
 */
export function requireNode(version) {
  const [major, minor] = version.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  throw new PlainError(`This is Node.js ${version}; Driprail needs 20.19 or newer.`);
}

async function pnpmInstall(base, quiet) {
  const args = [
    '-y',
    pinnedPnpm(base),
    'install',
    '--frozen-lockfile',
    '--prefer-offline',
    '--prod=false',
    '--reporter=append-only',
  ];
  // CI: pnpm asks nothing. NODE_ENV=production would leave out the tools the build needs.
  const env = { ...process.env, CI: 'true', NODE_ENV: 'development' };
  const { code, output } = await run('npx', args, { cwd: base, env, show: quiet ? 'nothing' : 'beat' }).catch(
    (error) => {
      if (error.code !== 'ENOENT') throw error;
      throw new PlainError('The program npx was not found. Install npm 10 or newer, which brings it.');
    },
  );
  if (code === 0) return;
  if (meansFullDisk(output))
    throw new PlainError('The disk is full: the packages could not be installed. Free about 1 GB and try again.');
  const reason =
    output
      .split('\n')
      .findLast((line) => /ERR|error/i.test(line))
      ?.trim() ?? `exit code ${code}`;
  throw new PlainError(`The packages could not be installed; check the network and try again (pnpm: ${reason}).`);
}

/**
 * The package manager's pin, kept in one place: package.json's `packageManager`.
 * @param {string} base
 * @returns {string} such as `pnpm@10.34.9`
 */
export function pinnedPnpm(base = root) {
  const { packageManager } = JSON.parse(readFileSync(join(base, 'package.json'), 'utf8'));
  const pin = /^pnpm@\d+\.\d+\.\d+/.exec(packageManager ?? '')?.[0];
  if (!pin) throw new PlainError('package.json names no pnpm version in "packageManager".');
  return pin;
}

/** True when node_modules holds what the lock and the package files ask for. */
export function isCurrent(base = root) {
  try {
    return readFileSync(stampFile(base), 'utf8') === wantedStamp(base);
  } catch (error) {
    if (error.code === 'ENOENT') return false;
    throw error;
  }
}

/** Notes that node_modules fits the lock and the package files as they are now. */
export function markInstalled(base = root) {
  writeFileSync(stampFile(base), wantedStamp(base));
}

function wantedStamp(base) {
  const packages = join(base, 'packages');
  const folders = [base, join(base, 'seed'), ...readdirSync(packages).map((name) => join(packages, name))];
  const files = [
    ...['pnpm-lock.yaml', 'pnpm-workspace.yaml'].map((name) => join(base, name)),
    ...folders.map((folder) => join(folder, 'package.json')),
  ].filter((file) => existsSync(file));
  return `node ${process.versions.modules} ${process.arch} ${hashFiles(base, files)}`;
}

function stampFile(base) {
  return join(base, 'node_modules', '.driprail-installed');
}
