import type { QueryClient } from '@tanstack/react-query';
import { waitingPresses } from '../../../lib/outbox/outbox.ts';
import { dayWorkQuery } from '../api/work.queries.ts';
import { workView } from './work-view.ts';

export type WorkPart = 'know' | 'steps' | 'change' | 'done';

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
  const data = await client.ensureQueryData(dayWorkQuery(userId, day)).catch(() => null);
  const work = data?.works.find((one) => one.visitId === visitId);
  if (!work) return null;
  const { open, missing } = workView(work, waitingPresses(), '');
  if (kind === 'start_work') return open.length > 0 ? 'know' : null;
  return missing.length > 0 ? 'done' : null;
}
