import { queryOptions, useMutation } from '@tanstack/react-query';
import { getChecklist, putChecklist } from '@driprail/shared/contracts/checklist.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { call } from '../../../lib/call.ts';

export const checklistQuery = (serviceId: string) =>
  queryOptions({
    queryKey: ['services', 'checklist', serviceId],
    queryFn: ({ signal }) => call(getChecklist, { params: { id: serviceId } }, signal),
  });

export function useSaveChecklist(serviceId: string) {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof putChecklist>['body']>) =>
      call(putChecklist, { params: { id: serviceId }, body }),
    onSuccess: (_data, _vars, _saved, { client }) => client.invalidateQueries({ queryKey: ['services'] }),
  });
}
