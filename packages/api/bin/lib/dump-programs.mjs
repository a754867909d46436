import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

import { onPath } from './debian.mjs';
import { postgresPrograms } from './postgres-programs.mjs';
import { PlainError } from './words.mjs';

/**
 * A database's address without its password, which other users could read in the list of processes,
 * and the environment that carries it instead.
 * @param {string} url
 */
export function hiddenPassword(url) {
  const open = new URL(url);
  const password = decodeURIComponent(open.password);
  open.password = '';
  return { url: open.href, env: { ...process.env, ...(password && { PGPASSWORD: password }) } };
}

/**
 * Finds pg_dump and pg_restore beside the server's programs, or on the path.
 * @param {'pg_dump' | 'pg_restore'} name
 * @returns {Promise<string>} the program's path
 * @throws {PlainError}
 */
export async function dumpProgram(name) {
  const { bin } = await postgresPrograms('install postgresql-client');
  for (const folder of [bin, onPath(name) && dirname(onPath(name))]) {
    if (folder && existsSync(join(folder, name))) return join(folder, name);
  }
  throw new PlainError(`${name} is missing: install PostgreSQL’s client programs.`);
}
