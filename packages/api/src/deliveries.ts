import { CustomerLinks, readBill } from './features/billing/index.ts';
import { StopTokens } from './features/messages/index.ts';
import type { DeliveryParts } from './features/messages/index.ts';

/** What messages to customers are made of and sent by. Bills and pages are handed in: billing queues messages itself. */
export function deliveryParts({
  secret,
  ...parts
}: Omit<DeliveryParts, 'pages' | 'stops'> & { secret: string }): DeliveryParts {
  const links = new CustomerLinks(secret);
  return {
    ...parts,
    stops: new StopTokens(secret),
    pages: {
      tokenFor: (tx, jobId, now) => links.tokenFor(tx, jobId, now),
      owedCents: async (jobId, now, tx) => (await readBill(jobId, now, tx)).owedCents,
    },
  };
}
