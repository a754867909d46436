import { queryOptions, useMutation } from '@tanstack/react-query';
import type { MessageHours, MessageKindDto } from '@driprail/shared/contracts/message-settings.contract';
import {
  getMessageSettings,
  previewMessage,
  updateMessageHours,
  updateMessageKind,
} from '@driprail/shared/contracts/message-settings.contract';
import { call } from '../../../lib/call.ts';

export const messageSettingsQuery = queryOptions({
  queryKey: ['messages', 'settings'],
  queryFn: ({ signal }) => call(getMessageSettings, {}, signal),
});

export function useSaveHours() {
  return useMutation({
    mutationFn: (hours: MessageHours) => call(updateMessageHours, { body: hours }),
    onSuccess: (_d, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['messages', 'settings'] }),
  });
}

export function useSaveKind() {
  return useMutation({
    mutationFn: ({ kind, isOn, subject, body, text, version }: MessageKindDto) =>
      call(updateMessageKind, { params: { kind }, body: { isOn, subject, body, text, version } }),
    onSuccess: (_d, _v, _r, { client }) => client.invalidateQueries({ queryKey: ['messages', 'settings'] }),
  });
}

export function usePreview() {
  return useMutation({
    mutationFn: ({ kind, subject, body, text }: Pick<MessageKindDto, 'kind' | 'subject' | 'body' | 'text'>) =>
      call(previewMessage, { params: { kind }, body: { subject, body, text } }),
  });
}
