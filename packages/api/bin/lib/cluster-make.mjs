import { randomBytes } from 'node:crypto';
import { chownSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

import { run } from './run.mjs';
import { meansFullDisk, PlainError } from './words.mjs';

/** @typedef {{ superuser: string, owner: string, app: string }} Passwords */

/**
 * Makes a cluster with Driprail's two roles and its database. It is made beside its place and moved
 * there when complete, so that a killed start leaves nothing half made.
 * @param {{ bin: string, data: string, user: object, durable: boolean, passwords?: Passwords }} wanted
 *   without passwords every local user is let in (throw-away clusters for tests)
 */
export async function makeCluster({ bin, data, user, durable, passwords }) {
  const fresh = `${data}.new`;
  const passwordFile = `${data}.password`;
  rmSync(fresh, { recursive: true, force: true });
  mkdirSync(dirname(data), { recursive: true });
  mkdirSync(fresh, { mode: 0o700 });
  own(fresh, user);
  const access = ['--auth=trust'];
  if (passwords) {
    rmSync(passwordFile, { force: true });
    writeFileSync(passwordFile, passwords.superuser, { mode: 0o600 });
    own(passwordFile, user);
    access.splice(0, 1, '--auth=scram-sha-256', `--pwfile=${passwordFile}`);
  }
  try {
    const common = ['-D', fresh, '-U', 'postgres', '--encoding=UTF8', '--locale=C.UTF-8', '--no-instructions'];
    await need(
      run(join(bin, 'initdb'), [...common, ...access, ...(durable ? [] : ['--no-sync'])], { ...user, show: 'nothing' }),
    );
    // Single-user mode speaks to the files themselves: no port, no password, no client program.
    const single = ['--single', '-D', fresh, '-c', 'exit_on_error=on', ...(durable ? [] : ['-F']), 'postgres'];
    await need(run(join(bin, 'postgres'), single, { ...user, show: 'nothing', input: rolesAndDatabase(passwords) }));
    renameSync(fresh, data);
  } finally {
    for (const path of [fresh, passwordFile]) rmSync(path, { recursive: true, force: true });
  }
}

function own(path, { uid, gid }) {
  if (uid !== undefined) chownSync(path, uid, gid);
}

async function need(running) {
  const { code, output } = await running;
  if (code === 0) return;
  if (meansFullDisk(output))
    throw new PlainError('The disk is full: the database could not be made. Free some space and start again.');
  const reason =
    output
      .split('\n')
      .findLast((line) => /error|fatal/i.test(line))
      ?.trim() ?? `exit code ${code}`;
  throw new PlainError(`The database could not be made (${reason}).`);
}

/** One statement a line, as single-user mode reads them. */
function rolesAndDatabase(passwords) {
  const secret = (role) => (passwords ? ` PASSWORD '${passwords[role]}'` : '');
  return [
    `CREATE ROLE driprail_owner LOGIN${secret('owner')};`,
    `CREATE ROLE driprail_app LOGIN${secret('app')};`,
    'CREATE DATABASE driprail OWNER driprail_owner;',
    'REVOKE ALL ON DATABASE driprail FROM PUBLIC;',
    'GRANT CONNECT ON DATABASE driprail TO driprail_app;',
    '',
  ].join('\n');
}

/**
 * The passwords of a kept cluster, made once and readable by this user alone.
 * @param {string} file
 * @param {boolean} clusterExists then they must be there already
 * @returns {Passwords}
 */
export function clusterPasswords(file, clusterExists) {
  if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8'));
  if (clusterExists)
    throw new PlainError(
      `The database’s passwords (${file}) are missing: put that file back, or restore a backup into an empty data folder.`,
    );
  const word = () => randomBytes(24).toString('hex');
  const passwords = { superuser: word(), owner: word(), app: word() };
  writeFileSync(`${file}.new`, `${JSON.stringify(passwords, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return passwords;
}
