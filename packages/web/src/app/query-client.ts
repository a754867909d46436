import { QueryClient } from '@tanstack/react-query';
import { ApiError } from '../lib/call.ts';

/** Refusals are answers, not faults: only what did not arrive is asked for again. */
export function createQueryClient(onSignedOut: () => void): QueryClient {
  const client: QueryClient = new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        retry: (count, error) =>
          error instanceof ApiError && error.status >= 400 && error.status < 500 ? false : count < 2,
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
  client.getQueryCache().subscribe(({ type, query }) => {
    if (type !== 'updated') return;
    const error: unknown = query.state.error;
    const key = query.queryKey as readonly unknown[];
    if (error instanceof ApiError && error.status === 401 && key[0] !== 'session') onSignedOut();
  });
  return client;
}
