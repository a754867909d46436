import { keepPreviousData, queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import {
  addShowUpRule,
  addTimeOffRule,
  adjustTimeOff,
  getTimeOffBalances,
  getWeekTimeOff,
  listTimeOffRules,
  quoteTimeOff,
  takeTimeOff,
} from '@driprail/shared/contracts/time-off.contract';
import { call } from '../../../lib/call.ts';
import { weekQuery } from './pay.queries.ts';

export const timeOffRulesQuery = queryOptions({
  queryKey: ['pay', 'time-off', 'rules'],
  queryFn: ({ signal }) => call(listTimeOffRules, {}, signal),
});
export const balancesQuery = (personId: string) =>
  queryOptions({
    queryKey: ['pay', 'time-off', 'balances', personId],
    queryFn: ({ signal }) => call(getTimeOffBalances, { params: { personId } }, signal),
    enabled: personId !== '',
  });

export const weekTimeOffQuery = (startsOn: string, personId: string) =>
  queryOptions({
    queryKey: ['pay', 'time-off', 'week', startsOn, personId],
    queryFn: ({ signal }) => call(getWeekTimeOff, { params: { startsOn, personId } }, signal),
  });

type Taking = NonNullable<RequestOf<typeof quoteTimeOff>['query']>;
/** Asks without saving; the last answer stays on the screen while the next one is worked out. */
export const quoteQuery = (startsOn: string, taking: Taking) =>
  queryOptions({
    queryKey: ['pay', 'time-off', 'quote', startsOn, taking],
    queryFn: ({ signal }) => call(quoteTimeOff, { params: { startsOn }, query: taking }, signal),
    placeholderData: keepPreviousData,
    retry: false,
  });

type TakeBody = NonNullable<RequestOf<typeof takeTimeOff>['body']>;
export function useTakeTimeOff() {
  return useMutation({
    mutationFn: ({ startsOn, body }: { startsOn: string; body: TakeBody }) =>
      call(takeTimeOff, { params: { startsOn }, body }),
    onSuccess: (week, _vars, _held, { client }) => {
      client.setQueryData(weekQuery(week.week.startsOn).queryKey, week);
      return client.invalidateQueries({ queryKey: ['pay'] });
    },
  });
}

type RuleBody = NonNullable<RequestOf<typeof addTimeOffRule>['body']>;
export function useAddTimeOffRule() {
  return useMutation({
    mutationFn: (body: RuleBody) => call(addTimeOffRule, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

type ShowUpBody = NonNullable<RequestOf<typeof addShowUpRule>['body']>;
export function useAddShowUpRule() {
  return useMutation({
    mutationFn: (body: ShowUpBody) => call(addShowUpRule, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

type AdjustBody = NonNullable<RequestOf<typeof adjustTimeOff>['body']>;
export function useAdjustTimeOff() {
  return useMutation({
    mutationFn: (body: AdjustBody) => call(adjustTimeOff, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
