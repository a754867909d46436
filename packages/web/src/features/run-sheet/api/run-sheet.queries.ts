import { queryOptions, useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import { getClock, postClockAction } from '@driprail/shared/contracts/clock.contract';
import type { ClockKindName } from '@driprail/shared/contracts/clock.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { recordTip } from '@driprail/shared/contracts/jobs.contract';
import { getRunSheet, postVisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';

export const runSheetQuery = (day: string) =>
  queryOptions({
    queryKey: ['run-sheet', day],
    queryFn: ({ signal }) => call(getRunSheet, { params: { day } }, signal),
    refetchInterval: 60_000,
  });

export const clockQuery = queryOptions({
  queryKey: ['clock', 'own'],
  queryFn: ({ signal }) => call(getClock, {}, signal),
});

type VisitActionBody = NonNullable<RequestOf<typeof postVisitAction>['body']>;
/** A press as it was made: the key and the time belong to the press, so that sending it twice marks once. */
export type VisitPress = VisitActionBody & { visitId: string };

export function newPress(visitId: string, action: Omit<VisitActionBody, 'key' | 'deviceAt' | 'offsetMs'>): VisitPress {
  return { visitId, key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs(), ...action };
}

const refresh = (client: QueryClient) =>
  Promise.all(['run-sheet', 'clock'].map((key) => client.invalidateQueries({ queryKey: [key] })));

export function usePressVisit(day: string) {
  return useMutation({
    mutationFn: ({ visitId, ...body }: VisitPress) => call(postVisitAction, { params: { id: visitId }, body }),
    // A lost answer is asked for again with the same key.
    retry: (count, error) => count < 3 && 'status' in error && error.status === 0,
    onSuccess: ({ visit }, _press, _saved, { client }) => {
      client.setQueryData(
        runSheetQuery(day).queryKey,
        (sheet): RunSheetDto | undefined =>
          sheet && { ...sheet, visits: sheet.visits.map((v) => (v.id === visit.id ? visit : v)) },
      );
    },
    onSettled: (_d, _e, _v, _s, { client }) => refresh(client),
  });
}

export function usePressClock() {
  return useMutation({
    mutationFn: (press: {
      key: string;
      deviceAt: string;
      offsetMs: number;
      action: 'start' | 'stop';
      kind?: ClockKindName;
    }) => call(postClockAction, { body: press }),
    retry: (count, error) => count < 3 && 'status' in error && error.status === 0,
    onSettled: (_d, _e, _v, _s, { client }) => refresh(client),
  });
}

export function newClockPress(action: 'start' | 'stop', kind?: ClockKindName) {
  return { key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs(), action, ...(kind && { kind }) };
}

export function useRecordTip(jobId: string) {
  return useMutation({
    mutationFn: (tip: NonNullable<RequestOf<typeof recordTip>['body']>) =>
      call(recordTip, { params: { id: jobId }, body: tip }),
    onSettled: (_d, _e, _v, _s, { client }) => refresh(client),
  });
}
