import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

import { installPackages, isRoot, onPath } from './debian.mjs';
import { PlainError } from './words.mjs';

/** The oldest release Driprail is run on; Debian 12 brings this one. */
const oldestMajor = 15;

/**
 * Finds PostgreSQL's server programs, installing Debian's package when there are none.
 * @param {string} instead what a person can do who may not install, for the sentence
 * @param {number} [major] only this release will do (a data folder belongs to one)
 * @returns {Promise<{ bin: string, major: number }>} the folder that holds initdb and postgres
 * @throws {PlainError}
 */
export async function postgresPrograms(instead, major) {
  const found = find(major);
  if (found) return found;
  if (major) {
    throw new PlainError(
      `The data folder was made by PostgreSQL ${major}, which is not installed any more: install postgresql-${major} again.`,
    );
  }
  await installPackages({
    packages: ['postgresql'],
    what: `PostgreSQL ${oldestMajor} or newer`,
    instead,
    // Or Debian would make and start a cluster of its own, on the usual port.
    before: `mkdir -p ${dirname(noMainCluster)} && echo 'create_main_cluster = false' > ${noMainCluster}`,
    after: `rm -f ${noMainCluster}`,
  });
  const installed = find();
  if (!installed)
    throw new PlainError(`The distribution brings no PostgreSQL ${oldestMajor} or newer: install one, or ${instead}.`);
  return installed;
}

/** Read by Debian's pg_createcluster; ours only while the package is being installed. */
const noMainCluster = '/etc/postgresql-common/createcluster.d/driprail.conf';

function find(major) {
  const candidates = [...debianFolders(), pgConfigFolder(), onPath('postgres') && dirname(onPath('postgres'))]
    // pg_config alone proves nothing: client libraries bring it without a server.
    .filter((bin) => bin && existsSync(join(bin, 'initdb')) && existsSync(join(bin, 'postgres')))
    .map((bin) => ({ bin, major: majorOf(bin) }))
    .filter((candidate) => (major ? candidate.major === major : candidate.major >= oldestMajor));
  return candidates[0];
}

function debianFolders() {
  const base = '/usr/lib/postgresql';
  if (!existsSync(base)) return [];
  const majors = readdirSync(base).map(Number).filter(Number.isInteger);
  return majors.sort((a, b) => b - a).map((name) => join(base, String(name), 'bin'));
}

function pgConfigFolder() {
  const program = onPath('pg_config');
  return program && spawnSync(program, ['--bindir'], { encoding: 'utf8' }).stdout?.trim();
}

function majorOf(bin) {
  const { stdout } = spawnSync(join(bin, 'postgres'), ['--version'], { encoding: 'utf8' });
  return Number(/\(PostgreSQL\) (\d+)/.exec(stdout ?? '')?.[1] ?? 0);
}

/**
 * Who runs the server: this user, or the package's user `postgres` when this one is root. The
 * working folder is `/`, because the server complains about one it may not read.
 * @returns {{ uid?: number, gid?: number, cwd: string }} options for spawn
 */
export function serverUser() {
  if (!isRoot()) return { cwd: '/' };
  const entry = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
    .find(([name]) => name === 'postgres');
  if (!entry)
    throw new PlainError(
      'PostgreSQL does not run as root, and there is no user “postgres”: start Driprail as an ordinary user.',
    );
  return { uid: Number(entry[2]), gid: Number(entry[3]), cwd: '/' };
}
