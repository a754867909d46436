import { queryOptions, useMutation } from '@tanstack/react-query';
import { listCustomers } from '@driprail/shared/contracts/customers.contract';
import {
  keepApart,
  listDuplicates,
  mergeCustomers,
  previewMerge,
} from '@driprail/shared/contracts/customers-merge.contract';
import type { MergePreview } from '@driprail/shared/contracts/customers-merge.contract';
import { call } from '../../../lib/call.ts';

export const duplicatesQuery = queryOptions({
  queryKey: ['customers', 'duplicates'],
  queryFn: ({ signal }) => call(listDuplicates, {}, signal),
});

export const mergeQuery = (staysId: string, goesId: string) =>
  queryOptions({
    queryKey: ['customer-merge', staysId, goesId],
    queryFn: ({ signal }) => call(previewMerge, { params: { id: staysId, goesId } }, signal),
    // What is agreed to is what the server has just counted.
    staleTime: 0,
  });

export const othersQuery = (find: string) =>
  queryOptions({
    queryKey: ['customers', 'others', find],
    enabled: find.length >= 2,
    queryFn: ({ signal }) => call(listCustomers, { query: { find, limit: 8 } }, signal),
  });

export function useKeepApart() {
  return useMutation({
    mutationFn: (ids: [string, string]) => call(keepApart, { body: { ids } }),
    onSuccess: (_data, _ids, _saved, { client }) => client.invalidateQueries({ queryKey: duplicatesQuery.queryKey }),
  });
}

export function useMerge() {
  return useMutation({
    mutationFn: ({ stays, goes }: MergePreview) =>
      call(mergeCustomers, {
        params: { id: stays.id },
        body: { goesId: goes.id, version: stays.version, goesVersion: goes.version },
      }),
    onError: (_error, _vars, _saved, { client }) => client.invalidateQueries({ queryKey: ['customer-merge'] }),
    onSuccess: (_data, _vars, _saved, { client }) =>
      Promise.all(['customers', 'board', 'jobs'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}
