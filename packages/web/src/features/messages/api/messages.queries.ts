import { queryOptions, useMutation } from '@tanstack/react-query';
import type { MessageView } from '@driprail/shared/contracts/messages.contract';
import {
  dropMessage,
  getUnsubscribe,
  listCustomerMessages,
  listMessages,
  retryMessage,
  settleEnquiry,
  subscribeAgain,
  unsubscribe,
} from '@driprail/shared/contracts/messages.contract';
import { call } from '../../../lib/call.ts';

export const messagesQuery = (show: MessageView) =>
  queryOptions({
    queryKey: ['messages', 'list', show],
    queryFn: ({ signal }) => call(listMessages, { query: { show, limit: 200 } }, signal),
  });

export const customerMessagesQuery = (id: string) =>
  queryOptions({
    queryKey: ['messages', 'customer', id],
    queryFn: ({ signal }) => call(listCustomerMessages, { params: { id } }, signal),
  });

const acts = { retry: retryMessage, drop: dropMessage, settle: settleEnquiry };

/** Tries a message again, drops one, or marks a reply as answered. */
export function useDeskAct(act: keyof typeof acts) {
  return useMutation({
    mutationFn: (id: string) => call(acts[act], { params: { id } }),
    onSettled: (_d, _e, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['messages'] }),
  });
}

export const stopQuery = (token: string) =>
  queryOptions({
    queryKey: ['unsubscribe', token],
    queryFn: ({ signal }) => call(getUnsubscribe, { params: { token } }, signal),
    retry: false,
  });

export function useStop(token: string) {
  return useMutation({
    mutationFn: (stops: boolean) => call(stops ? unsubscribe : subscribeAgain, { params: { token } }),
    onSuccess: (state, _v, _r, { client }) => client.setQueryData(['unsubscribe', token], state),
  });
}
