import { queryOptions, useMutation } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import { answerJobChangeAt, getOpenWorkAt, getVisitWorkAt } from '@driprail/shared/contracts/open-work-addresses';
import { postWorkActionAt } from '@driprail/shared/contracts/phone-addresses';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';

/** What waits for the desk: keys that are out, changes that crews ask for. */
export const openWorkQuery = queryOptions({
  queryKey: ['work', 'open'],
  queryFn: ({ signal }) => call(getOpenWorkAt, {}, signal),
});

export const visitWorkQuery = (visitId: string) =>
  queryOptions({
    queryKey: ['work', 'visit', visitId],
    queryFn: ({ signal }) => call(getVisitWorkAt, { params: { id: visitId } }, signal),
  });

const touched = ['work', 'board', 'jobs'];

export function useAnswerChange() {
  return useMutation({
    mutationFn: ({ id, isAccepted, note }: { id: string; isAccepted: boolean; note: string }) =>
      call(answerJobChangeAt, { params: { id }, body: { isAccepted, note } }),
    onSettled: (_d, _e, _v, _s, { client }) =>
      Promise.all(touched.map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}

/** The desk was told that the key is back. */
export function useKeyBack() {
  return useMutation({
    mutationFn: (visitId: string) => {
      const body = { key: uuid(), kind: 'key_back' as const, deviceAt: new Date().toISOString() };
      return call(postWorkActionAt, { params: { id: visitId }, body: { ...body, offsetMs: deviceOffsetMs() } });
    },
    onSettled: (_d, _e, _v, _s, { client }) => client.invalidateQueries({ queryKey: ['work'] }),
  });
}
