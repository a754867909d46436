import { keepPreviousData, queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import {
  addPayPlace,
  addPayPlan,
  addPlaceWage,
  getCommissionTest,
  listPayPlaces,
  listPayPlans,
  listRuleSets,
  setPersonPlace,
  whatIf,
} from '@driprail/shared/contracts/pay-plans.contract';
import { call } from '../../../lib/call.ts';

export const plansQuery = queryOptions({
  queryKey: ['pay', 'plans'],
  queryFn: ({ signal }) => call(listPayPlans, {}, signal),
});
export const ruleSetsQuery = queryOptions({
  queryKey: ['pay', 'rule-sets'],
  queryFn: ({ signal }) => call(listRuleSets, {}, signal),
});
export const placesQuery = queryOptions({
  queryKey: ['pay', 'places'],
  queryFn: ({ signal }) => call(listPayPlaces, {}, signal),
});

export const commissionTestQuery = (personId: string) =>
  queryOptions({
    queryKey: ['pay', 'commission-test', personId],
    queryFn: ({ signal }) => call(getCommissionTest, { params: { personId } }, signal),
  });

export type TrialBody = NonNullable<RequestOf<typeof whatIf>['body']>;
/** Asks without saving; the last answer stays on the screen while the next one is worked out. */
export const whatIfQuery = (body: TrialBody) =>
  queryOptions({
    queryKey: ['pay', 'what-if', body],
    queryFn: ({ signal }) => call(whatIf, { body }, signal),
    placeholderData: keepPreviousData,
    retry: false,
  });

type PlanBody = NonNullable<RequestOf<typeof addPayPlan>['body']>;
export function useAddPlan() {
  return useMutation({
    mutationFn: (body: PlanBody) => call(addPayPlan, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

type PlaceBody = NonNullable<RequestOf<typeof addPayPlace>['body']>;
export function useAddPlace() {
  return useMutation({
    mutationFn: (body: PlaceBody) => call(addPayPlace, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

type WageBody = NonNullable<RequestOf<typeof addPlaceWage>['body']>;
export function useAddWage() {
  return useMutation({
    mutationFn: ({ placeId, body }: { placeId: string; body: WageBody }) =>
      call(addPlaceWage, { params: { id: placeId }, body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

type PersonPlaceBody = NonNullable<RequestOf<typeof setPersonPlace>['body']>;
export function useSetPersonPlace() {
  return useMutation({
    mutationFn: (body: PersonPlaceBody) => call(setPersonPlace, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
