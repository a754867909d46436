import { queryOptions, useMutation } from '@tanstack/react-query';
import {
  createService,
  listServices,
  setServicePrices,
  setSurcharge,
  updateService,
} from '@driprail/shared/contracts/services.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { call } from '../../../lib/call.ts';

export const servicesQuery = queryOptions({
  queryKey: ['services', 'menu'],
  queryFn: ({ signal }) => call(listServices, {}, signal),
});

type CreateBody = NonNullable<RequestOf<typeof createService>['body']>;
type UpdateBody = NonNullable<RequestOf<typeof updateService>['body']>;
type PriceBody = NonNullable<RequestOf<typeof setServicePrices>['body']>;

/** Saves a service; for one that is known, changed prices become new start-dated ones. */
export function useSaveService() {
  return useMutation({
    mutationFn: async (save: { create: CreateBody } | { id: string; update: UpdateBody; prices: PriceBody | null }) => {
      if ('create' in save) return call(createService, { body: save.create });
      const { service } = await call(updateService, { params: { id: save.id }, body: save.update });
      return save.prices ? call(setServicePrices, { params: { id: save.id }, body: save.prices }) : { service };
    },
    onSuccess: (_data, _vars, _saved, { client }) => client.invalidateQueries({ queryKey: ['services'] }),
  });
}

export function useSetSurcharge() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof setSurcharge>['body']>) => call(setSurcharge, { body }),
    onSuccess: (_data, _vars, _saved, { client }) => client.invalidateQueries({ queryKey: ['services'] }),
  });
}
