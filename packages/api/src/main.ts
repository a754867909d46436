import type { Server } from 'node:http';
import { createApp } from './app.ts';
import { createClock } from './clock.ts';
import { readConfig } from './config.ts';
import { deliveryParts } from './deliveries.ts';
import { analyze, migrate } from './db/migrate.ts';
import { connect, disconnect } from './db/sequelize.ts';
import { printLinks, useCheapHashes } from './features/access/index.ts';
import { issueDueInvoices, lookUpOpenPages, settleAskedRefunds } from './features/billing/index.ts';
import { queueTimely, sendDueMessages, takeUpLeft } from './features/messages/index.ts';
import { removeOverHolds } from './features/online-booking/index.ts';
import { SetUpCode, hasDemoLogins, isSetUpNeeded } from './features/settings/index.ts';
import { removeErasedFiles } from './features/walk-round/index.ts';
import { startFakePayments } from './integrations/payments/fake/fake-payments.ts';
import { paymentsFor } from './integrations/payments/index.ts';
import { pushKeys } from './integrations/push/index.ts';
import { storeFor } from './integrations/storage/index.ts';
import { localTexts } from './integrations/texts/index.ts';
import { listenHost, originOf } from './http/listen-host.ts';
import { every } from './jobs/every.ts';
import { createLogger } from './log.ts';
import { localMail, smtpMail } from './mail/transport.ts';
import { sendWaitingMails } from './outbox/send-mails.ts';
import { sessionSecret } from './secret.ts';

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = createLogger(config.isTest ? 'error' : 'warn');
  const now = createClock(config.startAt);
  if (config.isTest) useCheapHashes();

  await migrate(config.migrationUrl, decodeURIComponent(new URL(config.databaseUrl).username));
  connect(config.databaseUrl);
  const isNew = await isSetUpNeeded();
  const seedsDemo = config.seedsDemo && isNew;
  if (seedsDemo) {
    process.stderr.write('Making the demo company …\n');
    const { seedDemo } = await import('../../../seed/src/seed-demo.ts');
    await seedDemo({ now: now() });
    await analyze(config.migrationUrl);
  }

  const setUpCode = new SetUpCode();
  const mail = config.smtpUrl ? null : localMail(config.mailFrom, now);
  const send = mail?.send ?? smtpMail(config.smtpUrl ?? '', config.mailFrom);
  if (mail && config.isLoopback) printLinks((line) => process.stderr.write(`${line}\n`));
  const secret = await sessionSecret(config.sessionSecret, config.dataDir);
  let port = config.port;
  const webhookUrl = () => `${originOf(config.host, port)}/api/webhooks/payments`;
  const localPayments = config.hasLocalPayments ? await startFakePayments({ webhookUrl, now }) : null;
  const payments = paymentsFor(localPayments?.place ?? config.payments);
  // Beyond this machine nobody can be shown the fake, or think that it sent something.
  const texts = config.hasLocalMail ? localTexts(now) : null;
  const deliveries = deliveryParts({
    ...{ secret, sendMail: send, texts, mailKnowsRepeats: mail !== null },
    baseUrl: () => config.publicUrl?.replace(/\/$/, '') ?? originOf(config.host, port),
  });
  const app = createApp({
    config,
    now,
    log,
    secret,
    setUpCode,
    localMail: config.hasLocalMail && mail ? mail.taken : null,
    payments,
    deliveries,
    localTexts: texts?.taken ?? null,
    pushKeys: await pushKeys(config.push, config.dataDir, config.publicUrl ?? 'mailto:no-reply@driprail.example'),
  });
  const outbox = every(
    5,
    () => sendWaitingMails(send, now),
    (error) => log.warn({ err: error }, 'mail outbox'),
  );

  const messages = every(
    5,
    async () => {
      await takeUpLeft(deliveries, now());
      await queueTimely(now());
      await sendDueMessages(deliveries, now);
    },
    (error) => log.warn({ err: error }, 'messages'),
  );

  const billing = every(
    30,
    async () => {
      await issueDueInvoices(now());
      await settleAskedRefunds(payments);
      await lookUpOpenPages(payments, now());
    },
    (error) => log.warn({ err: error }, 'billing'),
  );

  const files = every(
    3600,
    () => removeErasedFiles(storeFor(config)),
    (error) => log.warn({ err: error }, 'files of erased customers'),
  );

  const holds = every(
    60,
    () => removeOverHolds(now()),
    (error) => log.warn({ err: error }, 'holds of online booking'),
  );

  await listen(app.server, config.port, listenHost(config.host));
  const address = app.server.address();
  port = typeof address === 'object' && address ? address.port : config.port;
  const code = (await isSetUpNeeded()) ? `Set up the company with this one-time code: ${setUpCode.make()}\n` : '';
  const signIns = (await hasDemoLogins()) ? demoSignIns : '';
  // In one piece: whoever waits for the ready line has the rest with it.
  process.stdout.write(`Driprail is ready at ${originOf(config.host, port)}\n${signIns}${code}`);

  let isStopping = false;
  const stop = (): void => {
    if (isStopping) return;
    isStopping = true;
    void Promise.all([outbox.stop(), messages.stop(), billing.stop(), files.stop(), holds.stop()])
      .then(() => app.close())
      .then(() => localPayments?.stop())
      .then(() => disconnect())
      .then(() => process.exit(0));
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
  process.once('disconnect', stop);
}

const demoSignIns = `Sign in with the password driprail-demo as
  owner@ternandtide.example        owner
  dispatch@ternandtide.example     dispatcher
  tech1@ternandtide.example        technician (tech1 to tech12)
`;

function listen(server: Server, port: number, host: string): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => resolve());
  });
}

/** What a person can mend is said in one sentence; the rest is a fault and keeps its trace. */
function sentenceFor(error: unknown): string {
  const { code, name, message } = error as { code?: string; name?: string; message?: string };
  if (code === 'EADDRINUSE')
    return `Port ${process.env['PORT'] ?? '4600'} is in use. Stop what uses it, or choose another with PORT=4700 npm start.`;
  if (code === 'EACCES')
    return `Port ${process.env['PORT'] ?? ''} may not be used by this account. Choose one above 1023 with PORT.`;
  if (code === 'ENOSPC') return 'The disk is full. Make room and start again.';
  if (name?.startsWith('SequelizeConnection') || name === 'SequelizeHostNotFoundError') {
    return `The database can’t be reached: ${message ?? ''}. Check DATABASE_URL.`;
  }
  return `Driprail could not start: ${message ?? String(error)}`;
}

main().catch((error: unknown) => {
  process.stderr.write(`${sentenceFor(error)}\n`);
  process.exit(1);
});
