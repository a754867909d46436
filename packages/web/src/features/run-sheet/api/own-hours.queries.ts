import { queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type { askClockChange } from '@driprail/shared/contracts/hours.contract';
import {
  askClockChangeAt,
  decideClockChangeAt,
  listClockRequestsAt,
  listHoursWordsAt,
  sayHoursAt,
} from '@driprail/shared/contracts/phone-addresses';
import { call } from '../../../lib/call.ts';

export const ownRequestsQuery = queryOptions({
  queryKey: ['clock', 'requests'],
  queryFn: ({ signal }) => call(listClockRequestsAt, {}, signal),
});
export const ownWeekQuery = (day: string) =>
  queryOptions({
    queryKey: ['clock', 'week', day],
    queryFn: ({ signal }) => call(listHoursWordsAt, { params: { startsOn: day } }, signal),
  });

export function useAskChange() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof askClockChange>['body']>) => call(askClockChangeAt, { body }),
    onSettled: (_d, _e, _v, _s, { client }) => client.invalidateQueries({ queryKey: ['clock'] }),
  });
}

export function useDecideChange() {
  return useMutation({
    mutationFn: ({ id, isAgreed, answer = '' }: { id: string; isAgreed: boolean; answer?: string }) =>
      call(decideClockChangeAt, { params: { id }, body: { isAgreed, answer } }),
    onSettled: (_d, _e, _v, _s, { client }) =>
      Promise.all(['clock', 'run-sheet', 'pay'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}

export function useSayHours(day: string) {
  return useMutation({
    mutationFn: (body: { isRight: boolean; note?: string }) => call(sayHoursAt, { params: { startsOn: day }, body }),
    onSettled: (_d, _e, _v, _s, { client }) => client.invalidateQueries({ queryKey: ['clock'] }),
  });
}
