import type { Book, OrderedJob } from './job-rows.ts';
import type { DemoPerson } from './people.ts';
import type { Random } from './random.ts';

/** About one customer in five leaves a tip with the crew. */
export function writeTip(
  { rows, ids, calendar }: Book,
  { job }: OrderedJob,
  receivedAt: Date,
  taker: DemoPerson,
  random: Random,
): void {
  if (!random.chance(0.2) || receivedAt > calendar.asOf) return;
  const method = random.pick(['card', 'card', 'card', 'cash', 'cash', 'invoice'] as const);
  rows.tips.push({
    id: ids(),
    jobId: job.id,
    amountCents: random.pick([500, 800, 1000, 1000, 1500, 2000, 2500]),
    method,
    alreadyReceived: method === 'cash' && random.chance(0.6),
    receivedAt,
    userId: taker.userId,
  });
}
