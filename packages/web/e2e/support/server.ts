import { spawn, type ChildProcess } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

import { freePort } from '../../../api/bin/lib/ports.mjs';
import {
  cloneDatabase,
  ensureMigratedTemplate,
  ensureTemplate,
  type TestDatabase,
  type TestPostgres,
} from '../../../api/src/testing/database.ts';

const root = fileURLToPath(new URL('../../../../', import.meta.url));
/** DRIPRAIL_WEB_DIST names another build than the usual one. */
const webDist = process.env.DRIPRAIL_WEB_DIST ?? join(root, 'packages/web/dist');
const patience = 120_000; // ms until the server must be ready; seeding on a busy machine is slow

export interface RunningServer {
  /** Without a slash at the end. */
  url: string;
  database: TestDatabase;
  /** What it has printed so far, for codes and links that are told in the terminal. */
  output: () => string;
  stop: () => Promise<void>;
  /** Ends it at once, without a chance to finish anything. */
  kill: () => Promise<void>;
  /** Starts it again after `kill`, at the same address, with the same database and folder, its clock gone on. */
  again: () => Promise<void>;
}

export interface ServerOptions {
  /** With the demo company (made once per test run and copied), else an empty company. */
  demo: boolean;
  /** Where the server's clock starts, an ISO instant; by default now. */
  now?: string;
}

/** Starts the real server, with a database to itself, on a free port of 127.0.0.1. */
export async function startServer(postgres: TestPostgres, { demo, now }: ServerOptions): Promise<RunningServer> {
  if (!existsSync(join(webDist, 'index.html')))
    throw new Error('The web app is not built: npm test -- browser builds it.');
  const database = await cloneDatabase(postgres, await templateFor(postgres, demo, now));
  return launch(database, { demo: false, now });
}

async function templateFor(postgres: TestPostgres, demo: boolean, now?: string): Promise<string | undefined> {
  if (!demo) {
    await ensureMigratedTemplate(postgres.port);
    return undefined;
  }
  const name = `demo_${postgres.run}${now ? `_${Date.parse(now)}` : ''}`;
  await ensureTemplate(postgres.port, name, async (database) => {
    const server = await launch(database, { demo, now });
    await server.stop();
  });
  return name;
}

async function launch(database: TestDatabase, { demo, now }: ServerOptions): Promise<RunningServer> {
  const port = await freePort();
  const data = await mkdtemp(join(tmpdir(), 'driprail-e2e-'));
  const began = Date.now();
  let printed = '';
  let child: ChildProcess;
  let exited: Promise<void>;

  const start = async () => {
    const at = now && new Date(Date.parse(now) + Date.now() - began).toISOString();
    child = spawn(process.execPath, programArguments(), {
      cwd: root,
      stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
      env: {
        ...process.env,
        DATABASE_URL: database.appUrl,
        DATABASE_MIGRATION_URL: database.ownerUrl,
        PORT: String(port),
        HOST: '127.0.0.1',
        DRIPRAIL_DATA: data,
        DRIPRAIL_DEMO: demo ? '1' : '0',
        DRIPRAIL_WEB_DIST: webDist,
        DRIPRAIL_TEST: '1',
        ...(at && { DRIPRAIL_NOW: at }),
      },
    });
    const before = printed.length;
    for (const stream of [child.stdout, child.stderr]) {
      stream?.setEncoding('utf8').on('data', (text: string) => (printed += text));
    }
    child.on('message', (message) => (printed += JSON.stringify(message)));
    const running = child;
    exited = new Promise<void>((resolve) => running.once('close', () => resolve()));
    await untilReady(child, () => printed.slice(before));
  };
  const stop = async () => {
    child.kill('SIGTERM');
    const insist = setTimeout(() => child.kill('SIGKILL'), 15_000);
    await exited;
    clearTimeout(insist);
    await rm(data, { recursive: true, force: true });
  };
  const kill = async () => {
    child.kill('SIGKILL');
    await exited;
  };
  try {
    await start();
  } catch (error) {
    await stop();
    throw error;
  }
  return { url: `http://127.0.0.1:${port}`, database, output: () => printed, stop, kill, again: start };
}

/** `npm test` names the bundle people run; otherwise the sources are run as they are. */
function programArguments(): string[] {
  const bundle = process.env.DRIPRAIL_API_ENTRY;
  const program = bundle ? ['--enable-source-maps', bundle] : ['--import', 'tsx', 'packages/api/src/main.ts'];
  return ['--import', './packages/api/bin/lib/with-parent.mjs', ...program];
}

function untilReady(child: ChildProcess, printed: () => string): Promise<void> {
  return new Promise((resolve, reject) => {
    const fail = (why: string) => {
      clearTimeout(deadline);
      reject(new Error(`The server ${why}. It printed:\n${printed()}`));
    };
    const deadline = setTimeout(() => fail('was not ready in time'), patience);
    child.once('close', () => fail('ended while starting'));
    child.once('error', (error) => fail(`did not start (${error.message})`));
    child.stdout?.on('data', () => {
      if (!printed().includes('Driprail is ready at')) return;
      clearTimeout(deadline);
      resolve();
    });
  });
}
