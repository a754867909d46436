import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { getCustomerPage, giveFeedback, payByCard } from '@driprail/shared/contracts/customer-page.contract';
import { call } from '../../../lib/call.ts';

/** @param returned just back from the payments page: its money may be known only when asked after */
export const customerPageQuery = (token: string, returned: boolean) =>
  queryOptions({
    queryKey: ['customer-page', token],
    queryFn: ({ signal }) =>
      call(getCustomerPage, { params: { token }, query: { returned: returned ? 'true' : 'false' } }, signal),
    retry: 1,
    // The line tells of changes at once; this finds what it lost.
    refetchInterval: 60_000,
  });

/** Goes to the payments service's own page. */
export function usePayByCard(token: string) {
  return useMutation({
    mutationFn: (ask: { part: 'deposit' | 'all'; tipCents: number }) =>
      call(payByCard, { params: { token }, body: ask }),
    onSuccess: ({ url }) => window.location.assign(url),
    // What is owed may have changed on another tab.
    onError: (_e, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['customer-page', token] }),
  });
}

export function useGiveFeedback(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (said: { stars: number; words: string }) => call(giveFeedback, { params: { token }, body: said }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['customer-page', token] }),
  });
}
