import { chmodSync, existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

import { clusterPasswords, makeCluster } from './cluster-make.mjs';
import { dataPlace } from './cluster-place.mjs';
import { withLock } from './lock.mjs';
import { dataFolder } from './paths.mjs';
import { postgresPrograms, serverUser } from './postgres-programs.mjs';
import { startServer, stopServer, waitForRunning } from './postgres-server.mjs';
import { isRunning, ownIdentity } from './process-identity.mjs';
import { say } from './words.mjs';

/**
 * @typedef {object} Cluster
 * @property {number} port on 127.0.0.1
 * @property {{ app: string, owner: string }} urls connection strings of the two roles to the database `driprail`
 * @property {() => Promise<void>} close the last command that uses the server stops it
 */

/** The kept cluster in the data folder: durable, passwords asked. */
export function openPrivateCluster() {
  return open({ folder: join(dataFolder(), 'postgres'), durable: true });
}

/** The throw-away cluster for tests: fast, lets every local user in, superuser `postgres`. Never holds the company's data. */
export function openTestCluster() {
  return open({ folder: join(dataFolder(), 'test-postgres'), durable: false });
}

/** @returns {Promise<Cluster>} */
async function open({ folder, durable }) {
  const place = await prepare(folder, durable);
  const lock = join(folder, 'lock');
  const portFile = join(folder, 'port');
  const me = join(folder, 'users', ownIdentity());
  let closing = false;

  const starting = (lastPort) =>
    startServer(place, lastPort).then(({ port, child }) => {
      writeFileSync(portFile, String(port));
      child.once('exit', () => {
        if (!closing && process.exitCode === undefined) restart(port).catch((error) => say(error.message));
      });
      return port;
    });
  const restart = (port) =>
    withLock(lock, async () => {
      if (closing || (await waitForRunning(place.data))) return;
      say('PostgreSQL ended unexpectedly; starting it again.');
      await starting(port);
    });

  const close = () => {
    closing = true;
    return withLock(lock, async () => {
      rmSync(me, { force: true });
      if (!others(join(folder, 'users'))) await stopServer(place.data);
    });
  };
  const opening = withLock(lock, async () => {
    mkdirSync(join(folder, 'users'), { recursive: true });
    if (!existsSync(join(place.data, 'PG_VERSION'))) {
      say('Making the database (some seconds, once).');
      await makeCluster(place);
    }
    writeFileSync(me, '');
    return (await waitForRunning(place.data)) ?? starting(readPort(portFile));
  });
  const port = await opening.catch(async (error) => {
    await close().catch(() => {}); // The first failure is the one to tell.
    throw error;
  });
  return {
    port,
    urls: { app: url('app', place.passwords, port), owner: url('owner', place.passwords, port) },
    close,
  };
}

async function prepare(folder, durable) {
  mkdirSync(folder, { recursive: true });
  const instead = durable ? 'set DATABASE_URL to a server that runs already' : 'run the tests where it is installed';
  const newest = await postgresPrograms(instead);
  const user = serverUser(); // Looked for only now: the package makes the user `postgres`.
  if (user.uid !== undefined) chmodSync(folder, 0o711); // That user walks through, and reads nothing here.
  const data = dataPlace(folder, user);
  const versionFile = join(data, 'PG_VERSION');
  const made = existsSync(versionFile);
  const { bin } = made ? await postgresPrograms(instead, Number(readFileSync(versionFile, 'utf8'))) : newest;
  const passwords = durable ? clusterPasswords(join(folder, 'passwords.json'), made) : undefined;
  return { bin, data, user, durable, passwords, log: join(folder, 'server.log') };
}

/** Whether another command still uses the server; names of killed ones are cleared away. */
function others(folder) {
  const alive = readdirSync(folder).filter((identity) => {
    if (isRunning(identity)) return true;
    rmSync(join(folder, identity), { force: true });
    return false;
  });
  return alive.length > 0;
}

function readPort(file) {
  return existsSync(file) ? Number(readFileSync(file, 'utf8')) || undefined : undefined;
}

function url(role, passwords, port) {
  const secret = passwords ? `:${passwords[role]}` : '';
  return `postgres://driprail_${role}${secret}@127.0.0.1:${port}/driprail`;
}
