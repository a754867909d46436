import { queryOptions, useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { getPayDifference, listLateWeeks } from '@driprail/shared/contracts/pay-difference.contract';
import {
  addAdjustment,
  getPayWeek,
  getStatement,
  getWeekSoFar,
  listPayWeeks,
  listStatements,
  removeAdjustment,
  setPayWeekState,
} from '@driprail/shared/contracts/pay.contract';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { ApiError, call } from '../../../lib/call.ts';

export const weeksQuery = queryOptions({
  queryKey: ['pay', 'weeks'],
  queryFn: ({ signal }) => call(listPayWeeks, {}, signal),
});
export const weekQuery = (startsOn: string) =>
  queryOptions({
    queryKey: ['pay', 'week', startsOn],
    queryFn: ({ signal }) => call(getPayWeek, { params: { startsOn } }, signal),
    enabled: startsOn !== '',
  });
/** With everybody's balances, for all statements of a week at once. */
export const wholeWeekQuery = (startsOn: string) =>
  queryOptions({
    queryKey: ['pay', 'week', startsOn, 'with time off'],
    queryFn: ({ signal }) => call(getPayWeek, { params: { startsOn }, query: { timeOff: 'all' } }, signal),
  });
export const differenceQuery = (startsOn: string, against: 'week_before' | 'last_checked') =>
  queryOptions({
    queryKey: ['pay', 'difference', startsOn, against],
    queryFn: ({ signal }) => call(getPayDifference, { params: { startsOn }, query: { against } }, signal),
  });
export const lateWeeksQuery = queryOptions({
  queryKey: ['pay', 'late-weeks'],
  queryFn: ({ signal }) => call(listLateWeeks, {}, signal),
});
export const statementsQuery = queryOptions({
  queryKey: ['pay', 'statements'],
  queryFn: ({ signal }) => call(listStatements, {}, signal),
});
export const statementQuery = (startsOn: string, personId: string) =>
  queryOptions({
    queryKey: ['pay', 'statement', startsOn, personId],
    queryFn: ({ signal }) => call(getStatement, { params: { startsOn, personId } }, signal),
  });

export const weekSoFarQuery = queryOptions({
  queryKey: ['pay', 'week-so-far'],
  queryFn: ({ signal }) => call(getWeekSoFar, {}, signal),
});

/** The answer is the newest state of its week; the other weeks' figures are fetched again. */
function keep(client: QueryClient, week: PayWeekDto) {
  client.setQueryData(weekQuery(week.week.startsOn).queryKey, week);
  return client.invalidateQueries({ queryKey: ['pay'] });
}

type StateBody = NonNullable<RequestOf<typeof setPayWeekState>['body']>;

/** Moves a week along. When somebody else was first, the newer state takes the place of the old on the screen. */
export function useSetWeekState(startsOn: string) {
  return useMutation({
    mutationFn: (body: StateBody) => call(setPayWeekState, { params: { startsOn }, body }),
    onSuccess: (week, _vars, _held, { client }) => keep(client, week),
    onError: (error, _vars, _held, { client }) => {
      const current = error instanceof ApiError ? getPayWeek.response.safeParse(error.hint.current) : null;
      return current?.success
        ? keep(client, current.data)
        : client.invalidateQueries({ queryKey: ['pay', 'week', startsOn] });
    },
  });
}

type AdjustmentBody = NonNullable<RequestOf<typeof addAdjustment>['body']>;

export function useAddAdjustment() {
  return useMutation({
    mutationFn: ({ startsOn, body }: { startsOn: string; body: AdjustmentBody }) =>
      call(addAdjustment, { params: { startsOn }, body }),
    onSuccess: (week, _vars, _held, { client }) => keep(client, week),
  });
}

export function useRemoveAdjustment() {
  return useMutation({
    mutationFn: (id: string) => call(removeAdjustment, { params: { id } }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
