import { startFakePayments } from './fake-payments.ts';

/**
 * The stand-in as a process of its own, for tests: PORT (0: a free one), WEBHOOK_URL and STRIPE_WEBHOOK_SECRET.
 * Prints where it listens; ends on SIGTERM or with the process that forked it.
 */
async function main(): Promise<void> {
  const { PORT, WEBHOOK_URL: webhookUrl, STRIPE_WEBHOOK_SECRET: secret } = process.env;
  if (!webhookUrl || !secret) throw new Error('WEBHOOK_URL and STRIPE_WEBHOOK_SECRET must be set.');
  const fake = await startFakePayments({ webhookUrl, secret, port: Number(PORT ?? 0), hasTestHooks: true });
  const stop = () => void fake.stop().then(() => process.exit(0));
  for (const event of ['SIGTERM', 'SIGINT', 'disconnect']) process.once(event, stop);
  process.stdout.write(`Local payments are ready at ${fake.url}\n`);
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
