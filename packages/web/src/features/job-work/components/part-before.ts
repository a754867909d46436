import type { QueryClient } from '@tanstack/react-query';
import type { DayWorkDto } from '@driprail/shared/contracts/job-work.contract';
import { waitingPresses } from '../../../lib/outbox/outbox.ts';
import { dayWorkQuery } from '../api/work.queries.ts';
import { workView } from './work-view.ts';

export type WorkPart = 'know' | 'steps' | 'change' | 'done';

/** A thumb does not wait longer for an answer. */
const WEAK_LINE_MS = 3000;

interface Marking {
  userId: string;
  day: string;
  visitId: string;
  kind: string;
}

/**
 * The part of the job's page that comes before a mark: must-knows before Start work, what is missing before Done. Null
 * when nothing stands in the way, or nothing is known on this phone; the server judges it again.
 */
export async function partBefore(
  client: QueryClient,
  { userId, day, visitId, kind }: Marking,
): Promise<WorkPart | null> {
  if (kind !== 'start_work' && kind !== 'finish') return null;
  const data = await freshOrKept(client, userId, day);
  const work = data?.works.find((one) => one.visitId === visitId);
  if (!work) return null;
  const { open, missing } = workView(work, waitingPresses(), '');
  if (kind === 'start_work') return open.length > 0 ? 'know' : null;
  return missing.length > 0 ? 'done' : null;
}

/** Fetched when it is old or was changed meanwhile; on a weak line what is known must do. */
async function freshOrKept(client: QueryClient, userId: string, day: string): Promise<DayWorkDto | null> {
  const query = { ...dayWorkQuery(userId, day), staleTime: 60_000 };
  const known = () => client.getQueryData(query.queryKey) ?? null;
  const late = new Promise<DayWorkDto | null>((resolve) => setTimeout(() => resolve(known()), WEAK_LINE_MS));
  return Promise.race([client.fetchQuery(query).catch(known), late]);
}
