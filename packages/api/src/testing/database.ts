import { randomBytes } from 'node:crypto';
import { fileURLToPath } from 'node:url';

import pg from 'pg';

import { isRunning, ownIdentity } from '../../bin/lib/process-identity.mjs';
import { filesBelow, hashFiles } from '../../bin/lib/source-hash.mjs';
import { migrate } from '../db/migrate.ts';

const { Client, escapeIdentifier } = pg;
const packages = fileURLToPath(new URL('../../../', import.meta.url));

/** The test cluster as one test run sees it; `run` names the run in the names of its databases. */
export interface TestPostgres {
  port: number;
  run: string;
}

/** The two connection strings of a test database. */
export interface TestDatabase {
  name: string;
  appUrl: string;
  ownerUrl: string;
}

/**
 * The throw-away cluster for programs outside Vitest, such as the one that takes the pictures.
 * @throws Error when it was not started by its npm command
 */
export function testPostgresFromEnvironment(): TestPostgres {
  const port = Number(process.env.DRIPRAIL_TEST_PG_PORT);
  if (!port) throw new Error('DRIPRAIL_TEST_PG_PORT is not set: start this with its npm command.');
  return { port, run: newRun() };
}

/** A name for this test run that tells later runs whether it is still going on. */
export function newRun(): string {
  return ownIdentity().replace('-', '_');
}

/**
 * Makes a database that is a copy of a template.
 * @param template by default the migrated, empty one
 */
export async function cloneDatabase({ port, run }: TestPostgres, template = templateName()): Promise<TestDatabase> {
  const name = `test_${run}_${randomBytes(4).toString('hex')}`;
  await asSuperuser(port, async (client) => {
    const [copy, from] = [escapeIdentifier(name), escapeIdentifier(template)];
    // Copying files takes a tenth of the time of the default way, which writes all through the journal.
    await client.query(`CREATE DATABASE ${copy} TEMPLATE ${from} OWNER driprail_owner STRATEGY file_copy`);
  });
  return databaseNamed(port, name);
}

/**
 * Makes a template once: the first caller fills it, others wait for it and find it.
 * @param fill gets the new database; every connection to it must be closed afterwards
 */
export async function ensureTemplate(
  port: number,
  name: string,
  fill: (database: TestDatabase) => Promise<void>,
): Promise<void> {
  await asSuperuser(port, async (client) => {
    await client.query('SELECT pg_advisory_lock(hashtext($1))', [name]);
    const found = await client.query('SELECT 1 FROM pg_database WHERE datname = $1 AND datistemplate', [name]);
    if (found.rowCount) return;
    const quoted = escapeIdentifier(name);
    await client.query(`DROP DATABASE IF EXISTS ${quoted} WITH (FORCE)`);
    await client.query(`CREATE DATABASE ${quoted} OWNER driprail_owner`);
    await fill(databaseNamed(port, name));
    await client.query(`ALTER DATABASE ${quoted} IS_TEMPLATE true ALLOW_CONNECTIONS false`);
    // Whoever still hangs on it would make every copy fail.
    await client.query('SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = $1', [name]);
  });
}

/** Makes the migrated, empty template unless it is there. */
export function ensureMigratedTemplate(port: number): Promise<void> {
  return ensureTemplate(port, templateName(), ({ ownerUrl }) =>
    migrate(ownerUrl, 'driprail_app').catch((error: unknown) => {
      // The original carries the whole schema's text three times over, and a reporter prints all of it.
      throw new Error(error instanceof Error ? error.message : String(error));
    }),
  );
}

/** The migrated, empty template's name: another schema is another template. */
export function templateName(): string {
  const files = ['api/src/db', 'shared/src'].flatMap((folder) => filesBelow(`${packages}${folder}`));
  return `driprail_template_${hashFiles(packages, files).slice(0, 12)}`;
}

/** Drops what ended test runs left behind, and all but the newest templates. */
export async function dropLeftovers(port: number): Promise<void> {
  await asSuperuser(port, async (client) => {
    const { rows } = await client.query<{ datname: string }>(
      `SELECT datname FROM pg_database WHERE datname ~ '^(test|demo)_' ORDER BY oid`,
    );
    const old = await client.query<{ datname: string }>(
      `SELECT datname FROM pg_database WHERE datname ~ '^driprail_template_' ORDER BY oid DESC OFFSET 4`,
    );
    const abandoned = rows.filter(({ datname }) => !isRunning(datname.split('_').slice(1, 3).join('-')));
    for (const { datname } of [...abandoned, ...old.rows]) await drop(client, datname);
  });
}

async function drop(client: pg.Client, name: string): Promise<void> {
  const quoted = escapeIdentifier(name);
  try {
    await client.query(`ALTER DATABASE ${quoted} IS_TEMPLATE false`);
    await client.query(`DROP DATABASE IF EXISTS ${quoted} WITH (FORCE)`);
  } catch (error) {
    // Two runs that start together clear away the same things: gone (3D000) or just being dropped is as good.
    const code = error instanceof pg.DatabaseError ? error.code : undefined;
    if (code !== '3D000' && code !== '55006' && code !== 'XX000') throw error;
  }
}

function databaseNamed(port: number, name: string): TestDatabase {
  const url = (role: string) => `postgres://driprail_${role}@127.0.0.1:${port}/${name}`;
  return { name, appUrl: url('app'), ownerUrl: url('owner') };
}

async function asSuperuser<T>(port: number, body: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new Client({ host: '127.0.0.1', port, user: 'postgres', database: 'postgres' });
  await client.connect();
  try {
    return await body(client);
  } finally {
    await client.end();
  }
}
