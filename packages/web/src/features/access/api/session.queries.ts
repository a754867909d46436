import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { createSessionAt, endSessionAt, getSessionAt } from '@driprail/shared/contracts/phone-addresses';
import type { SessionDto } from '@driprail/shared/contracts/session.contract';
import { call } from '../../../lib/call.ts';
import { orKept } from '../../../lib/outbox/or-kept.ts';
import { stopWaking } from '../../../lib/waking.ts';
import { wipeCopies } from '../../../lib/outbox/store.ts';

export const sessionKey = ['session'] as const;

/** Null once signed out. */
export const sessionQuery = queryOptions({
  queryKey: sessionKey,
  networkMode: 'always',
  // In a dead zone the phone still knows who is signed in; the server judges again when it answers.
  queryFn: ({ signal }): Promise<SessionDto | null> => orKept('session', () => call(getSessionAt, {}, signal)),
  staleTime: 5 * 60_000,
  retry: false,
});

/** Somebody else, or nobody: everything that was fetched goes; the session's own query stays, so that its screens hear of it. */
export function changeSession(client: QueryClient, session: SessionDto | null): void {
  client.setQueryData(sessionKey, session);
  client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== sessionKey[0] });
}

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { email: string; password: string }) => call(createSessionAt, { body }),
    onSuccess: (session) => {
      changeSession(client, session);
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async () => {
      // Another person on this phone must not be told of this one's day.
      await stopWaking().catch(() => undefined);
      return call(endSessionAt);
    },
    onSettled: () => {
      changeSession(client, null);
      return wipeCopies();
    },
  });
}
