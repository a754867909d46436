import { queryOptions, useMutation } from '@tanstack/react-query';
import { eraseCustomer, getCustomerData, previewErasure } from '@driprail/shared/contracts/customers-data.contract';
import { call } from '../../../lib/call.ts';

export const customerDataQuery = (id: string) =>
  queryOptions({
    queryKey: ['customers', id, 'data'],
    queryFn: ({ signal }) => call(getCustomerData, { params: { id } }, signal),
  });

/** Where the same is fetched as a file. */
export const customerDataFile = (id: string) => getCustomerData.path.replace(':id', encodeURIComponent(id));

export const erasureQuery = (id: string) =>
  queryOptions({
    queryKey: ['customer-erasure', id],
    queryFn: ({ signal }) => call(previewErasure, { params: { id } }, signal),
    // What is agreed to is what the server has just counted.
    staleTime: 0,
  });

export function useErase(id: string) {
  return useMutation({
    mutationFn: (body: { version: number; name: string }) => call(eraseCustomer, { params: { id }, body }),
    onError: (_error, _body, _saved, { client }) => client.invalidateQueries({ queryKey: ['customer-erasure', id] }),
    onSuccess: (_data, _body, _saved, { client }) => {
      client.removeQueries({ queryKey: ['customers', id] });
      return Promise.all(['customers', 'board', 'jobs'].map((key) => client.invalidateQueries({ queryKey: [key] })));
    },
  });
}
