import { infiniteQueryOptions, keepPreviousData, queryOptions, useMutation } from '@tanstack/react-query';
import {
  createCustomer,
  findPlace,
  getCustomer,
  getVehicleWords,
  listCustomers,
  updateCustomer,
} from '@driprail/shared/contracts/customers.contract';
import type { customerOrders } from '@driprail/shared/contracts/customers.contract';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { listPeople } from '@driprail/shared/contracts/people.contract';
import { call } from '../../../lib/call.ts';

const PAGE = 60;
export type CustomerOrder = (typeof customerOrders)[number];

export const customersQuery = (find: string, by: CustomerOrder) =>
  infiniteQueryOptions({
    queryKey: ['customers', 'list', find, by],
    queryFn: ({ pageParam, signal }) =>
      call(listCustomers, { query: { find, by, limit: PAGE, offset: pageParam } }, signal),
    initialPageParam: 0,
    getNextPageParam: (last, pages) => {
      const shown = pages.reduce((count, { customers }) => count + customers.length, 0);
      return shown < last.total ? shown : null;
    },
    placeholderData: keepPreviousData,
  });

export const customerQuery = (id: string) =>
  queryOptions({ queryKey: ['customers', id], queryFn: ({ signal }) => call(getCustomer, { params: { id } }, signal) });

/** Under the same key as elsewhere, so that it is fetched once. */
export const crewQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => call(listPeople, {}, signal),
});

export const vehicleWordsQuery = queryOptions({
  queryKey: ['customers', 'vehicle-words'],
  queryFn: ({ signal }) => call(getVehicleWords, {}, signal),
});

export function useFindPlace() {
  return useMutation({
    mutationFn: (body: { line: string; city: string; postcode: string }) => call(findPlace, { body }),
  });
}

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
