import { queryOptions, useMutation } from '@tanstack/react-query';
import {
  bookHeld,
  findWindows,
  getOnlineMenu,
  holdWindow,
  proveEmail,
} from '@driprail/shared/contracts/online-booking.contract';
import type { OnlineAsk } from '@driprail/shared/contracts/online-booking.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { call } from '../../../lib/call.ts';

export const onlineMenuQuery = queryOptions({
  queryKey: ['online-menu'],
  queryFn: ({ signal }) => call(getOnlineMenu, {}, signal),
  staleTime: 300_000,
});

/** Others book too: what is free is asked again whenever it is looked at. */
export const windowsQuery = (ask: OnlineAsk) =>
  queryOptions({
    queryKey: ['online-windows', ask],
    queryFn: ({ signal }) => call(findWindows, { body: ask }, signal),
    retry: false,
  });

export function useHold() {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof holdWindow>['body']>) => call(holdWindow, { body }),
    // Taken by somebody else: the list shows it.
    onError: (_e, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['online-windows'] }),
  });
}

export function useSendCode() {
  return useMutation({
    mutationFn: ({ id, body }: { id: string; body: NonNullable<RequestOf<typeof proveEmail>['body']> }) =>
      call(proveEmail, { params: { id }, body }),
    onError: (_e, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['online-menu'] }),
  });
}

export function useBook() {
  return useMutation({
    mutationFn: ({ id, code }: { id: string; code: string }) => call(bookHeld, { params: { id }, body: { code } }),
  });
}
