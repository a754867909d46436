import { queryOptions, useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import {
  addTimeOff,
  createPerson,
  createVan,
  listPeople,
  listVans,
  removeTimeOff,
  updatePerson,
  updateVan,
} from '@driprail/shared/contracts/people.contract';
import { call } from '../../../lib/call.ts';

export const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => call(listPeople, {}, signal),
});
export const vansQuery = queryOptions({ queryKey: ['vans'], queryFn: ({ signal }) => call(listVans, {}, signal) });

type PersonBody = NonNullable<RequestOf<typeof createPerson>['body']>;
type VanBody = NonNullable<RequestOf<typeof createVan>['body']>;
type TimeOffBody = NonNullable<RequestOf<typeof addTimeOff>['body']>;
const refresh = (client: QueryClient, key: string) =>
  Promise.all([key, 'board'].map((k) => client.invalidateQueries({ queryKey: [k] })));

export function useSavePerson() {
  return useMutation({
    mutationFn: ({ id, version, body }: { id: string | null; version: number; body: PersonBody }) =>
      id === null ? call(createPerson, { body }) : call(updatePerson, { params: { id }, body: { ...body, version } }),
    onSuccess: (_d, _v, _s, { client }) => refresh(client, 'people'),
  });
}

export function useSaveVan() {
  return useMutation({
    mutationFn: ({ id, version, body }: { id: string | null; version: number; body: VanBody }) =>
      id === null ? call(createVan, { body }) : call(updateVan, { params: { id }, body: { ...body, version } }),
    onSuccess: (_d, _v, _s, { client }) => refresh(client, 'vans'),
  });
}

export function useTimeOff(personId: string) {
  const add = useMutation({
    mutationFn: (body: TimeOffBody) => call(addTimeOff, { params: { id: personId }, body }),
    onSuccess: (_d, _v, _s, { client }) => refresh(client, 'people'),
  });
  const remove = useMutation({
    mutationFn: (id: string) => call(removeTimeOff, { params: { id } }),
    onSuccess: (_d, _v, _s, { client }) => refresh(client, 'people'),
  });
  return { add, remove };
}
