import { queryOptions, useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { getCustomer, listCustomers } from '@driprail/shared/contracts/customers.contract';
import {
  addVisit,
  callBackJob,
  callOffJob,
  copyJob,
  createJob,
  getJob,
  listDue,
  updateJob,
} from '@driprail/shared/contracts/jobs.contract';
import type { JobBody } from '@driprail/shared/contracts/jobs.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { listServices } from '@driprail/shared/contracts/services.contract';
import { call } from '../../../lib/call.ts';

export const jobQuery = (id: string) =>
  queryOptions({ queryKey: ['jobs', id], queryFn: ({ signal }) => call(getJob, { params: { id } }, signal) });
export const customerQuery = (id: string) =>
  queryOptions({ queryKey: ['customers', id], queryFn: ({ signal }) => call(getCustomer, { params: { id } }, signal) });
export const customerSearch = (find: string) =>
  queryOptions({
    queryKey: ['customers', 'find', find],
    queryFn: ({ signal }) => call(listCustomers, { query: { find, limit: 8 } }, signal),
  });
export const menuQuery = queryOptions({
  queryKey: ['services', 'today'],
  queryFn: ({ signal }) => call(listServices, {}, signal),
});

export const dueQuery = queryOptions({
  queryKey: ['jobs', 'due'],
  queryFn: ({ signal }) => call(listDue, {}, signal),
});

const refresh = (client: QueryClient) =>
  Promise.all(['board', 'jobs', 'run-sheet', 'customers'].map((key) => client.invalidateQueries({ queryKey: [key] })));

/** Saves a new job, or the changes to one whose version was seen. */
export function useSaveJob() {
  return useMutation({
    mutationFn: ({ id, version, body }: { id: string | null; version: number; body: JobBody }) =>
      id === null ? call(createJob, { body }) : call(updateJob, { params: { id }, body: { ...body, version } }),
    onSuccess: (_data, _vars, _saved, { client }) => refresh(client),
  });
}

export function useCallOff(id: string) {
  return useMutation({
    mutationFn: (body: { version: number; reason: string }) => call(callOffJob, { params: { id }, body }),
    onSuccess: (_data, _vars, _saved, { client }) => refresh(client),
  });
}

/** The same again at today's prices. */
export function useBookAgain() {
  return useMutation({
    mutationFn: (jobId: string) => call(copyJob, { params: { id: jobId } }),
    onSuccess: (_data, _vars, _saved, { client }) => refresh(client),
  });
}

export function useCallBack(id: string) {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof callBackJob>['body']>) =>
      call(callBackJob, { params: { id }, body }),
    onSuccess: (_data, _vars, _saved, { client }) => refresh(client),
  });
}

export function useAddVisit(id: string) {
  return useMutation({
    mutationFn: (body: { minutes: number; lineIds: string[]; besideVisitId: string | null }) =>
      call(addVisit, { params: { id }, body }),
    onSuccess: (_data, _vars, _saved, { client }) => refresh(client),
  });
}
