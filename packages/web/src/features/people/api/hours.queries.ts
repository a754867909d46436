import { queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { addClockEntry, correctClockEntry, listClock } from '@driprail/shared/contracts/clock.contract';
import { call } from '../../../lib/call.ts';

export const hoursQuery = (from: string, to: string) =>
  queryOptions({
    queryKey: ['clock', 'entries', from, to],
    queryFn: ({ signal }) => call(listClock, { query: { from, to } }, signal),
  });

type Correction = NonNullable<RequestOf<typeof correctClockEntry>['body']>;
type Addition = NonNullable<RequestOf<typeof addClockEntry>['body']>;

/** Corrects an entry, or writes down one that the clock missed; both need a reason. */
export function useSaveEntry() {
  return useMutation({
    mutationFn: (save: { id: string; body: Correction } | { id: null; body: Addition }) =>
      save.id === null
        ? call(addClockEntry, { body: save.body })
        : call(correctClockEntry, { params: { id: save.id }, body: save.body }),
    onSuccess: (_d, _v, _s, { client }) =>
      Promise.all(['clock', 'pay', 'board'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}
