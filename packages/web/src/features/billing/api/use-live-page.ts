import { useEffect } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import type { Socket } from 'socket.io-client';
import { changedEvent, customerNamespace } from '@driprail/shared/realtime/hints';

/** Fetches a customer's page again when its job changes. The line is opened by the link's token and carries nothing else. */
export function useLivePage(token: string): void {
  const client = useQueryClient();
  useEffect(() => {
    let socket: Socket | null = null;
    let isEnded = false;
    const refetch = () => void client.invalidateQueries({ queryKey: ['customer-page', token] });
    void import('socket.io-client').then(({ io }) => {
      if (isEnded) return;
      socket = io(customerNamespace, { auth: { token }, transports: ['websocket'], reconnectionDelayMax: 10_000 });
      // Changes may have been missed while the line was down.
      socket.on('connect', refetch);
      socket.on(changedEvent, refetch);
    });
    return () => {
      isEnded = true;
      socket?.disconnect();
    };
  }, [client, token]);
}
