import { queryOptions, useMutation } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { addTaxRate, listTaxRates } from '@driprail/shared/contracts/taxes.contract';
import { call } from '../../../lib/call.ts';

export const taxRatesQuery = queryOptions({
  queryKey: ['money', 'taxes'],
  queryFn: ({ signal }) => call(listTaxRates, {}, signal),
});

export function useAddTaxRate() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof addTaxRate>['body']>) => call(addTaxRate, { body }),
    onSuccess: (_d, _v, _h, { client }) =>
      Promise.all(['money', 'bills'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}
