import { createServer } from 'node:http';
import type { Server } from 'node:http';
import express from 'express';
import helmet from 'helmet';
import pg from 'pg';
import type { Clock } from './clock.ts';
import type { Config } from './config.ts';
import { registerLocalStrategy, wakePhones } from './features/access/index.ts';
import { CustomerLinks } from './features/billing/index.ts';
import type { DeliveryParts } from './features/messages/index.ts';
import type { SetUpCode } from './features/settings/index.ts';
import { errorHandler } from './http/error-handler.ts';
import { forbidden, notFound } from './http/errors.ts';
import { isOwnOrigin } from './http/origin.ts';
import type { RouteTable } from './http/route.ts';
import { registerUsers, sessionChain } from './http/session.ts';
import { serveWeb } from './http/web.ts';
import type { Payments } from './integrations/payments/index.ts';
import type { PushKeys } from './integrations/push/index.ts';
import { geocoderFor } from './integrations/maps/index.ts';
import { storeFor } from './integrations/storage/index.ts';
import type { TakenText } from './integrations/texts/index.ts';
import type { Logger } from './log.ts';
import type { TakenMail } from './mail/transport.ts';
import { hub } from './realtime/hub.ts';
import { wakeWith } from './realtime/wake.ts';
import { mountRoutes } from './routes.ts';

export interface AppParts {
  config: Config;
  now: Clock;
  log: Logger;
  secret: string;
  setUpCode: SetUpCode;
  localMail: (() => TakenMail[]) | null;
  payments: Payments;
  /** What messages to customers are made of; previews and links are made with it. */
  deliveries: DeliveryParts;
  localTexts: (() => TakenText[]) | null;
  /** Null: phones are not woken. */
  pushKeys: PushKeys | null;
}

export interface App {
  server: Server;
  table: RouteTable;
  close: () => Promise<void>;
}

/** Puts the service together without listening. The database must be connected and migrated. */
export function createApp(parts: AppParts): App {
  const { config, now, log, secret, setUpCode, localMail, payments, deliveries, pushKeys } = parts;
  const app = express();
  const server = createServer(app);
  const pool = new pg.Pool({ connectionString: config.databaseUrl, max: 4 });
  pool.on('error', (error) => log.warn({ err: error }, 'session pool'));
  registerUsers();
  registerLocalStrategy();
  const isSecure = config.publicUrl?.startsWith('https:') ?? false;
  const sessions = sessionChain(pool, secret, { isSecure });

  if (config.trustsProxy) app.set('trust proxy', 1);
  app.disable('x-powered-by');
  app.use(
    helmet({ contentSecurityPolicy: { directives: contentPolicy(isSecure) }, strictTransportSecurity: isSecure }),
  );
  app.use('/api', (req, _res, next) => {
    const isWrite = !['GET', 'HEAD', 'OPTIONS'].includes(req.method);
    next(
      isWrite && !isOwnOrigin(req, config.publicUrl) ? forbidden('This request came from another site.') : undefined,
    );
  });
  // Signed over its bytes: read as it came, and by no session.
  app.use('/api/webhooks', express.raw({ type: () => true, limit: '1mb' }));
  app.use('/api', ...sessions.chain, express.json({ limit: '1mb' }));
  app.use('/api', (_req, res, next) => {
    res.setHeader('cache-control', 'no-store');
    // A phone reckons from it how far its own clock is off.
    res.setHeader('x-now', now().toISOString());
    next();
  });

  const push = pushKeys && { keys: pushKeys, mayBeLocal: config.isTest };
  wakeWith(push && ((personIds, times) => wakePhones(personIds, times, push, now())));

  const links = new CustomerLinks(secret);
  const table: RouteTable = { router: express.Router(), endpoints: [], now };
  mountRoutes(table, {
    hasLocalMail: config.hasLocalMail,
    setUpCode,
    localMail,
    localTexts: parts.localTexts,
    deliveries,
    hookSecrets: config.hookSecrets,
    store: storeFor(config),
    geocoder: geocoderFor(config),
    push,
    payments,
    links,
    baseUrlOf: (req) => config.publicUrl ?? `${req.protocol}://${req.get('host') ?? ''}`,
  });
  app.use(table.router);
  app.use('/api', (req, _res, next) => next(notFound(`${req.method} ${req.originalUrl.split('?')[0]}`)));
  if (config.webDist) serveWeb(app, config.webDist);
  app.use(errorHandler(log));
  hub.attach(
    server,
    sessions.chain,
    (req) => isOwnOrigin(req, config.publicUrl),
    (token) => links.jobOf(token, now()),
  );

  return {
    server,
    table,
    async close() {
      wakeWith(null);
      await hub.close();
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      });
      sessions.close();
      await pool.end();
    },
  };
}

/** The calendar writes one style tag by script, so inline styles are allowed; scripts are ours alone. */
function contentPolicy(isSecure: boolean): Record<string, string[] | null> {
  return {
    'default-src': ["'self'"],
    'style-src': ["'self'", "'unsafe-inline'"],
    'img-src': ["'self'", 'data:', 'blob:'],
    'connect-src': ["'self'", 'ws:', 'wss:'],
    'frame-ancestors': ["'none'"],
    'upgrade-insecure-requests': isSecure ? [] : null,
  };
}
