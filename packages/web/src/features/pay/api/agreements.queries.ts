import { queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { addAgreement, addRefundReason, listAgreements } from '@driprail/shared/contracts/pay-agreements.contract';
import { call } from '../../../lib/call.ts';

export const agreementsQuery = queryOptions({
  queryKey: ['pay', 'agreements'],
  queryFn: ({ signal }) => call(listAgreements, {}, signal),
});

type AgreementBody = NonNullable<RequestOf<typeof addAgreement>['body']>;
type ReasonBody = NonNullable<RequestOf<typeof addRefundReason>['body']>;

export function useAddAgreement() {
  return useMutation({
    mutationFn: (body: AgreementBody) => call(addAgreement, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

export function useAddRefundReason() {
  return useMutation({
    mutationFn: (body: ReasonBody) => call(addRefundReason, { body }),
    onSuccess: (_d, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
