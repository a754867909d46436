import { queryOptions, useMutation } from '@tanstack/react-query';
import { getBoard } from '@driprail/shared/contracts/board.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { addClockEntry, correctClockEntry, listClock } from '@driprail/shared/contracts/clock.contract';
import { askClockChange } from '@driprail/shared/contracts/hours.contract';
import { call } from '../../../lib/call.ts';

export const hoursQuery = (from: string, to: string) =>
  queryOptions({
    queryKey: ['clock', 'entries', from, to],
    queryFn: ({ signal }) => call(listClock, { query: { from, to } }, signal),
  });

/** The visits of a day: time at a car belongs to one of them. */
export const dayVisitsQuery = (day: string) =>
  queryOptions({
    queryKey: ['board', day, 'visits'],
    queryFn: async ({ signal }) => (await call(getBoard, { params: { day } }, signal)).visits,
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

/** Proposes a change to the person it is about; nothing changes before that person agrees. */
export function useProposeChange() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof askClockChange>['body']>) => call(askClockChange, { body }),
    onSettled: (_d, _e, _v, _s, { client }) => client.invalidateQueries({ queryKey: ['clock'] }),
  });
}
