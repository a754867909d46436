import { useEffect, useSyncExternalStore } from 'react';
import type { QueryClient } from '@tanstack/react-query';
import type { Socket } from 'socket.io-client';
import { hintEvent, signedOutEvent } from '@driprail/shared/realtime/hints';
import type { Hint, HintEntity } from '@driprail/shared/realtime/hints';

/** Which cached queries a changed thing touches, by the first part of their key. */
const touched: Record<HintEntity, string[]> = {
  visit: ['board', 'run-sheet', 'jobs', 'work', 'walk-round', 'bills'],
  work: ['work'],
  job: ['board', 'run-sheet', 'jobs', 'customers', 'work', 'bills'],
  crew: ['board', 'run-sheet'],
  customer: ['customers', 'board', 'run-sheet', 'work'],
  person: ['people', 'board'],
  van: ['vans', 'board'],
  service: ['services', 'work'],
  clock: ['clock', 'run-sheet', 'board', 'pay'],
  settings: ['settings', 'session', 'board'],
  pay: ['pay'],
  bill: ['bills', 'money', 'customers'],
  login: ['logins'],
  message: ['messages', 'customers'],
};

let isLive = false;
const watchers = new Set<() => void>();
function setLive(next: boolean): void {
  isLive = next;
  watchers.forEach((watch) => watch());
}

/** Whether changes reach this screen by themselves. */
export function useIsLive(): boolean {
  return useSyncExternalStore(
    (watch) => {
      watchers.add(watch);
      return () => watchers.delete(watch);
    },
    () => isLive,
  );
}

/** Keeps the cache in step while somebody is signed in. After a lost connection everything on screen is fetched again. */
export function useLiveCache(client: QueryClient, userId: string | undefined, onSignedOut: () => void): void {
  useEffect(() => {
    if (!userId) return undefined;
    let socket: Socket | null = null;
    let isEnded = false;
    void import('socket.io-client').then(({ io }) => {
      if (isEnded) return;
      // A try that hangs in a dead spot is given up early, so that the next one comes soon.
      socket = io({ transports: ['websocket'], reconnectionDelayMax: 3000, timeout: 6000 });
      socket.on('connect', () => {
        setLive(true);
        // Hints may have been missed while the line was down.
        void client.invalidateQueries();
      });
      socket.on('disconnect', () => setLive(false));
      socket.on(hintEvent, (hint: Hint) => {
        for (const key of touched[hint.entity]) void client.invalidateQueries({ queryKey: [key] });
      });
      socket.on(signedOutEvent, onSignedOut);
    });
    return () => {
      isEnded = true;
      socket?.disconnect();
      setLive(false);
    };
  }, [client, userId, onSignedOut]);
}
