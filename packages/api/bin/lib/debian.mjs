import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';

import { withLock } from './lock.mjs';
import { dataFolder } from './paths.mjs';
import { run } from './run.mjs';
import { meansFullDisk, PlainError, say } from './words.mjs';

/**
 * Finds a program on PATH.
 * @param {string} name
 * @returns {string | undefined} its path
 */
export function onPath(name) {
  const folders = (process.env.PATH ?? '').split(delimiter).filter(Boolean);
  return folders.map((folder) => join(folder, name)).find((path) => existsSync(path));
}

/** True when this user is root: PostgreSQL refuses to run so, Chromium needs --no-sandbox. */
export function isRoot() {
  return process.getuid?.() === 0;
}

/**
 * Installs packages of the distribution with apt-get, as root or through a sudo that asks nothing.
 * @param {{ packages: string[], what: string, instead: string, before?: string, after?: string }} wanted
 *   `what` names the thing in sentences, `instead` says what a person can do; `before` and `after` are
 *   shell lines run as root around the installation
 * @throws {PlainError} when this user may not install or the installation fails
 */
export async function installPackages({ packages, what, instead, before = ':', after = ':' }) {
  const asRoot = rightToInstall();
  if (!asRoot) {
    const command = `apt-get install ${packages.join(' ')}`;
    const how = onPath('apt-get') ? `ask for “${command}”` : 'install it';
    throw new PlainError(`${what} is missing and this user may not install it: ${how}, or ${instead}.`);
  }
  say(`Installing ${what} from the distribution (half a minute or more).`);
  await withLock(
    join(dataFolder(), 'apt.lock'),
    async () => {
      // Without "set -e" an old or incomplete package list would stop what the cache could still give.
      const script = `apt-get update -q; ${before} && apt-get install -q -y --no-install-recommends ${packages.join(' ')}; code=$?; ${after}; exit $code`;
      const { code, output } = await run(asRoot[0], [...asRoot.slice(1), 'sh', '-c', script], {
        finish: true,
        show: 'beat',
      });
      if (code === 0) return;
      if (meansFullDisk(output))
        throw new PlainError(`The disk is full: ${what} could not be installed. Free some space and try again.`);
      const reason =
        output
          .split('\n')
          .findLast((line) => /^E:|rror/.test(line))
          ?.trim() ?? `exit code ${code}`;
      throw new PlainError(`${what} could not be installed (${reason}); check the network, or ${instead}.`);
    },
    () => say('Another command is installing packages; waiting for it.'),
  );
}

/** The command that runs apt-get as root and asks no question (sudo drops the environment, so it is set behind it). */
function rightToInstall() {
  if (!onPath('apt-get')) return undefined;
  const quietly = ['env', 'DEBIAN_FRONTEND=noninteractive', 'LC_ALL=C.UTF-8'];
  if (isRoot()) return quietly;
  const sudo = onPath('sudo');
  const allowed = sudo && spawnSync(sudo, ['-n', 'true'], { stdio: 'ignore' }).status === 0;
  return allowed ? [sudo, '-n', ...quietly] : undefined;
}
