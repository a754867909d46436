import { keepPreviousData, queryOptions, useMutation } from '@tanstack/react-query';
import {
  createCustomer,
  getCustomer,
  listCustomers,
  updateCustomer,
} from '@driprail/shared/contracts/customers.contract';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { call } from '../../../lib/call.ts';

export const customersQuery = (find: string) =>
  queryOptions({
    queryKey: ['customers', 'list', find],
    queryFn: ({ signal }) => call(listCustomers, { query: { find, limit: 200 } }, signal),
    placeholderData: keepPreviousData,
  });

export const customerQuery = (id: string) =>
  queryOptions({ queryKey: ['customers', id], queryFn: ({ signal }) => call(getCustomer, { params: { id } }, signal) });

export function useSaveCustomer() {
  return useMutation({
    mutationFn: ({ id, version, body }: { id: string | null; version: number; body: CustomerBody }) =>
      id === null
        ? call(createCustomer, { body })
        : call(updateCustomer, { params: { id }, body: { ...body, version } }),
    onSuccess: (_data, _vars, _saved, { client }) =>
      Promise.all(['customers', 'board'].map((key) => client.invalidateQueries({ queryKey: [key] }))),
  });
}
