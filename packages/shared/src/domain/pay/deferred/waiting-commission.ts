import { totalCents } from '../pay-line.ts';
import type { DoneLine, PayLine, PersonWeek } from '../pay-week.types.ts';

/**
 * What finished work would pay in commission had its customers paid; null where nothing waits. Shown, never paid.
 * @param lines what the week pays without it
 * @param payOf what finished lines pay
 */
export function waitingCommission(
  doneLines: readonly DoneLine[],
  lines: readonly PayLine[],
  payOf: (doneLines: DoneLine[]) => PayLine[],
): PersonWeek['waiting'] | null {
  const waiting = doneLines.filter((line) => line.commissionWaits);
  if (waiting.length === 0) return null;
  const amountCents = commissionOf(payOf(doneLines.map(paidFor))) - commissionOf(lines);
  if (amountCents <= 0) return null;
  const jobs = new Map(waiting.map(({ jobId, jobNumber }) => [jobId, { jobId, jobNumber }]));
  return { amountCents, jobs: [...jobs.values()] };
}

/** The line once its customer has paid. */
export function paidFor({ commissionWaits: _, ...line }: DoneLine): DoneLine {
  return line;
}

function commissionOf(lines: readonly PayLine[]): number {
  return totalCents(lines.filter((line) => line.kind === 'commission'));
}
