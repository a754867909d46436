import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { expect, test } from 'vitest';
import { paymentsFor } from '../index.ts';

test('the stand-in runs as a process of its own and ends when asked', async () => {
  const program = ['--import', 'tsx', 'packages/api/src/integrations/payments/fake/main.ts'];
  const env = { ...process.env, PORT: '0', WEBHOOK_URL: 'http://127.0.0.1:9/', STRIPE_WEBHOOK_SECRET: 'whsec_own' };
  const child = spawn(process.execPath, program, { env, stdio: ['ignore', 'pipe', 'inherit'] });
  try {
    const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
    const host = /^Local payments are ready at (http:\S+)$/.exec(line)?.[1] ?? '';
    const payments = paymentsFor({ secretKey: 'sk_test_1', webhookSecret: 'whsec_own', host });
    const ask = { attemptId: 'a1', amountCents: 500, currency: 'usd' as const, label: 'Invoice 1', returnUrl: host };
    expect((await payments.createLink(ask)).url).toContain(host);
  } finally {
    child.kill('SIGTERM');
  }
  expect(await once(child, 'exit')).toEqual([0, null]);
});
