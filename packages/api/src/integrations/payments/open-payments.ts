import type { Clock } from '../../clock.ts';
import type { Config } from '../../config.ts';
import { startFakePayments } from './fake/fake-payments.ts';
import { paymentsFor } from './index.ts';
import type { Payments } from './payments.ts';

/** The company's payments with, when nothing else is set and only this machine is served, the stand-in behind them. */
export async function openPayments(
  { payments: place, hasLocalPayments }: Pick<Config, 'payments' | 'hasLocalPayments'>,
  { webhookUrl, now }: { webhookUrl: () => string; now: Clock },
): Promise<{ payments: Payments; stop: () => Promise<void> }> {
  if (!hasLocalPayments) return { payments: paymentsFor(place), stop: () => Promise.resolve() };
  const fake = await startFakePayments({ webhookUrl, now });
  return { payments: paymentsFor(fake.place), stop: fake.stop };
}
