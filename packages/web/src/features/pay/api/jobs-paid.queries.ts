import { queryOptions, useMutation } from '@tanstack/react-query';
import { listJobsPaid, markJobPaid, takeBackJobPaid } from '@driprail/shared/contracts/jobs-paid.contract';
import { call } from '../../../lib/call.ts';

export const jobsPaidQuery = queryOptions({
  queryKey: ['pay', 'jobs-paid'],
  queryFn: ({ signal }) => call(listJobsPaid, {}, signal),
});

export function useMarkJobPaid() {
  return useMutation({
    mutationFn: (body: { jobId: string; paidOn: string }) => call(markJobPaid, { body }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

export function useTakeBackJobPaid() {
  return useMutation({
    mutationFn: (jobId: string) => call(takeBackJobPaid, { params: { jobId } }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
