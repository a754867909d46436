import { queryOptions, useMutation } from '@tanstack/react-query';
import { countCash, getCash } from '@driprail/shared/contracts/cash.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { getMoneyDay } from '@driprail/shared/contracts/money-day.contract';
import { call } from '../../../lib/call.ts';

export const cashQuery = queryOptions({
  queryKey: ['money', 'cash'],
  queryFn: ({ signal }) => call(getCash, {}, signal),
});

export const moneyDayQuery = (day: string) =>
  queryOptions({
    queryKey: ['money', 'day', day],
    queryFn: ({ signal }) => call(getMoneyDay, { params: { day } }, signal),
  });

export function useCountCash() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof countCash>['body']>) => call(countCash, { body }),
    // A refusal says that the cash has changed: the newer sum is fetched, what was typed stays.
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['money'] }),
  });
}
