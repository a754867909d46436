import { queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { addPayRules, addRate, listPayRules, listRates } from '@driprail/shared/contracts/pay-rates.contract';
import { listPeople } from '@driprail/shared/contracts/people.contract';
import { listServices } from '@driprail/shared/contracts/services.contract';
import { call } from '../../../lib/call.ts';

export const ratesQuery = queryOptions({
  queryKey: ['pay', 'rates'],
  queryFn: ({ signal }) => call(listRates, {}, signal),
});
export const rulesQuery = queryOptions({
  queryKey: ['pay', 'rules'],
  queryFn: ({ signal }) => call(listPayRules, {}, signal),
});
/** Who and what a rate can be for. */
export const payPeopleQuery = queryOptions({
  queryKey: ['people', 'for-pay'],
  queryFn: ({ signal }) => call(listPeople, {}, signal),
});
export const payServicesQuery = queryOptions({
  queryKey: ['services', 'for-pay'],
  queryFn: ({ signal }) => call(listServices, {}, signal),
});

type RateBody = NonNullable<RequestOf<typeof addRate>['body']>;
type RulesBody = NonNullable<RequestOf<typeof addPayRules>['body']>;

export function useAddRate() {
  return useMutation({
    mutationFn: (body: RateBody) => call(addRate, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

export function useAddRules() {
  return useMutation({
    mutationFn: (body: RulesBody) => call(addPayRules, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
