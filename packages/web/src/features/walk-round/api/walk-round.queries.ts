import type { QueryClient } from '@tanstack/react-query';
import { queryOptions } from '@tanstack/react-query';
import type { WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { getWalkSheetAt } from '@driprail/shared/contracts/walk-round-addresses';
import { call } from '../../../lib/call.ts';
import { orKept } from '../../../lib/outbox/or-kept.ts';

/** A visit's walk-round, or in a dead zone the copy that this phone kept of it. */
export const walkSheetQuery = (userId: string, visitId: string) =>
  queryOptions({
    queryKey: ['walk-round', visitId],
    networkMode: 'always',
    retry: 0,
    queryFn: ({ signal }): Promise<WalkSheetDto> =>
      orKept(
        `${userId}:walk-round:${visitId}`,
        async () => (await call(getWalkSheetAt, { params: { id: visitId } }, signal)).sheet,
      ),
  });

/** Keeps the walk-rounds of a day's visits on the phone, one after another, once the run sheet is shown. */
export async function keepWalkSheets(client: QueryClient, userId: string, visitIds: string[]): Promise<void> {
  for (const id of visitIds) await client.prefetchQuery({ ...walkSheetQuery(userId, id), staleTime: 60_000 });
}
