import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import express from 'express';
import pg from 'pg';
import { Server } from 'socket.io';
import { io } from 'socket.io-client';
import type { Socket } from 'socket.io-client';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { seedDemo } from '../../../seed/src/seed-demo.ts';
import { createApp } from '../src/app.ts';
import { deliveryParts } from '../src/deliveries.ts';
import { readConfig } from '../src/config.ts';
import { analyze, migrate } from '../src/db/migrate.ts';
import { connect, disconnect } from '../src/db/sequelize.ts';
import { SetUpCode } from '../src/features/settings/index.ts';
import { sessionChain } from '../src/http/session.ts';
import { paymentsFor } from '../src/integrations/payments/index.ts';
import { createLogger } from '../src/log.ts';
import { localMail } from '../src/mail/transport.ts';
import { cloneDatabase, ensureMigratedTemplate, testPostgresFromEnvironment } from '../src/testing/database.ts';
import { mountBare } from './bare-board.ts';

export interface BenchStage {
  url: string;
  cookie: string;
  day: string;
  now: string;
  /** Where the bare route answers. */
  bare: string;
  pool: pg.Pool;
  /** Another dispatcher's open board. */
  socket: Socket;
  bareServer: Server;
  bareSocket: Socket;
  close: () => Promise<void>;
}

const NOW = '2026-05-14T15:00:00.000Z';
const SECRET = 'only for benches';

export interface OpenApp {
  url: string;
  appUrl: string;
  close: () => Promise<void>;
}

/** The product on a fresh database that `fill` has put something into. */
export async function openApp(fill: (now: Date) => Promise<unknown>): Promise<OpenApp> {
  const postgres = testPostgresFromEnvironment();
  await ensureMigratedTemplate(postgres.port);
  const { appUrl, ownerUrl } = await cloneDatabase(postgres);
  await migrate(ownerUrl, 'driprail_app');
  const config = { ...readConfig({ DATABASE_URL: appUrl, DATABASE_MIGRATION_URL: ownerUrl }), isTest: true };
  connect(appUrl);
  const now = () => new Date(NOW);
  await fill(now());
  await analyze(ownerUrl);

  const mail = localMail(config.mailFrom, now);
  const app = createApp({
    config,
    now,
    log: createLogger('error'),
    secret: SECRET,
    setUpCode: new SetUpCode(),
    localMail: mail.taken,
    deliveries: deliveryParts({
      ...{ secret: SECRET, sendMail: mail.send, texts: null, mailKnowsRepeats: true },
      baseUrl: () => 'http://127.0.0.1',
    }),
    localTexts: null,
    payments: paymentsFor(null),
    pushKeys: null,
  });
  const url = await listen(app.server);
  const close = async () => {
    await app.close();
    await disconnect();
  };
  return { url, appUrl, close };
}

/** @returns the cookie of the session */
export async function signIn(url: string, login: string): Promise<string> {
  const answer = await fetch(`${url}/api/session`, {
    method: 'POST',
    body: JSON.stringify({ email: `${login}@ternandtide.example`, password: 'driprail-demo' }),
    headers: { 'content-type': 'application/json' },
  });
  return answer.headers
    .getSetCookie()
    .map((value) => value.split(';')[0])
    .join('; ');
}

/** The product on a demo day, and beside it the bare ways of doing the same. */
export async function openStage(): Promise<BenchStage> {
  const { url, appUrl, close } = await openApp((now) => seedDemo({ now }));
  const cookie = await signIn(url, 'dispatch');

  const pool = new pg.Pool({ connectionString: appUrl, max: 4, options: '-c jit=off' });
  const bareApp = express();
  const sessions = sessionChain(pool, SECRET, { isSecure: false });
  bareApp.use(...sessions.chain);
  const day = dayOf(NOW, 'America/New_York');
  mountBare(bareApp, pool, '/bare', day, NOW);
  const bareHttp = createServer(bareApp);
  const bareServer = new Server(bareHttp);
  const bareUrl = await listen(bareHttp);
  const socket = await opened(io(url, { transports: ['websocket'], extraHeaders: { cookie } }));
  const bareSocket = await opened(io(bareUrl, { transports: ['websocket'] }));
  return {
    url,
    cookie,
    day,
    now: NOW,
    bare: `${bareUrl}/bare`,
    pool,
    socket,
    bareServer,
    bareSocket,
    async close() {
      socket.disconnect();
      bareSocket.disconnect();
      await bareServer.close();
      sessions.close();
      await pool.end();
      await close();
    },
  };
}

function listen(server: ReturnType<typeof createServer>): Promise<string> {
  return new Promise((resolve) => {
    server.listen(0, '127.0.0.1', () => resolve(`http://127.0.0.1:${(server.address() as AddressInfo).port}`));
  });
}

function opened(socket: Socket): Promise<Socket> {
  return new Promise((resolve, reject) => {
    socket.once('connect', () => resolve(socket));
    socket.once('connect_error', reject);
  });
}
