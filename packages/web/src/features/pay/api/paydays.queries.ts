import { queryOptions, useMutation } from '@tanstack/react-query';
import {
  changePayday,
  getPayday,
  handOverPayday,
  listPaydays,
  makePayday,
  removePayday,
} from '@driprail/shared/contracts/handover.contract';
import type { PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { call } from '../../../lib/call.ts';

export const paydaysQuery = queryOptions({
  queryKey: ['pay', 'paydays'],
  queryFn: ({ signal }) => call(listPaydays, {}, signal),
});
export const paydayQuery = (id: string) =>
  queryOptions({
    queryKey: ['pay', 'payday', id],
    queryFn: ({ signal }) => call(getPayday, { params: { id } }, signal),
  });

export interface PaydayFields {
  paysOn: string;
  note: string;
  weeks: string[];
}

/** Makes a payday, or changes the one given by the version that was seen. */
export function useSavePayday(payday: Pick<PaydayDto, 'id' | 'version'> | null) {
  return useMutation({
    mutationFn: (fields: PaydayFields) =>
      payday
        ? call(changePayday, { params: { id: payday.id }, body: { ...fields, version: payday.version } })
        : call(makePayday, { body: fields }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}

export function useRemovePayday({ id, version }: PaydayDto) {
  return useMutation({
    mutationFn: () => call(removePayday, { params: { id }, query: { version } }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay', 'paydays'] }),
  });
}

export function useHandOver({ id, version }: PaydayDto) {
  return useMutation({
    mutationFn: () => call(handOverPayday, { params: { id }, body: { version } }),
    onSettled: (_d, _e, _v, _h, { client }) => client.invalidateQueries({ queryKey: ['pay'] }),
  });
}
