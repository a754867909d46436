import { useEffect, useSyncExternalStore } from 'react';
import type { QueryClient } from '@tanstack/react-query';
import type { postClockAction } from '@driprail/shared/contracts/clock.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type { recordTip } from '@driprail/shared/contracts/jobs.contract';
import type { postJobChange, postWorkAction } from '@driprail/shared/contracts/job-work.contract';
import {
  postClockActionAt,
  postJobChangeAt,
  postVisitActionAt,
  postWorkActionAt,
  recordTipAt,
} from '@driprail/shared/contracts/phone-addresses';
import type { postVisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import { ApiError, call } from '../call.ts';
import type { KeptPress } from './store.ts';
import { dropPress, keepPress, keptPresses } from './store.ts';

/** What the screen shows of the outbox. */
export interface OutboxState {
  waiting: KeptPress[];
  refused: KeptPress[];
  isSending: boolean;
}

let state: OutboxState = { waiting: [], refused: [], isSending: false };
let user: string | null = null;
let running: Promise<void> | null = null;
const watchers = new Set<() => void>();
/** What a sent press changes on this phone, by the first part of the query's key. */
const touched: Record<KeptPress['path'], string[]> = {
  visit: ['run-sheet', 'clock', 'work'],
  clock: ['run-sheet', 'clock'],
  tip: ['run-sheet'],
  work: ['work'],
  change: ['work', 'run-sheet'],
};

function show(next: Partial<OutboxState>): void {
  state = { ...state, ...next };
  watchers.forEach((watch) => watch());
}

async function reload(): Promise<void> {
  const presses = user === null ? [] : await keptPresses(user);
  show({ waiting: presses.filter((p) => p.refused === null), refused: presses.filter((p) => p.refused !== null) });
}

/** Keeps a press on the phone first, then sends what waits, in order. It is never lost: the phone forgets it when the server has it. */
export async function press(client: QueryClient, made: Omit<KeptPress, 'userId' | 'at' | 'refused'>): Promise<void> {
  if (user === null) throw new Error('sign in first');
  await keepPress({ ...made, userId: user, at: Date.now(), refused: null });
  await reload();
  void flush(client);
}

/** Sends what waits, one after another; stops at the first that does not arrive. */
export function flush(client: QueryClient): Promise<void> {
  running ??= sendAll(client).finally(() => {
    running = null;
  });
  return running;
}

async function sendAll(client: QueryClient): Promise<void> {
  await reload();
  show({ isSending: true });
  try {
    for (let next = state.waiting[0]; next; next = state.waiting[0]) {
      if (!(await sendOne(next))) break;
      // The newer state first: what waited is still shown as done while it comes.
      await Promise.all(touched[next.path].map((key) => client.invalidateQueries({ queryKey: [key] })));
      await reload();
    }
  } finally {
    show({ isSending: false });
  }
}

/** @returns whether the server has answered, be it with a refusal */
async function sendOne(kept: KeptPress): Promise<boolean> {
  try {
    await send(kept);
    await dropPress(kept.key);
    return true;
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    // No signal, a server that restarts, or a session that ended: it waits.
    if (error.status === 0 || error.status >= 500 || error.status === 401 || error.status === 429) return false;
    await keepPress({ ...kept, refused: error.message });
    return true;
  }
}

function send({ path, targetId, body }: KeptPress): Promise<unknown> {
  if (path === 'visit') {
    return call(postVisitActionAt, {
      params: { id: targetId },
      body: body as RequestOf<typeof postVisitAction>['body'],
    });
  }
  if (path === 'work') {
    return call(postWorkActionAt, {
      params: { id: targetId },
      body: body as RequestOf<typeof postWorkAction>['body'],
    });
  }
  if (path === 'change') {
    return call(postJobChangeAt, { params: { id: targetId }, body: body as RequestOf<typeof postJobChange>['body'] });
  }
  if (path === 'clock') return call(postClockActionAt, { body: body as RequestOf<typeof postClockAction>['body'] });
  return call(recordTipAt, { params: { id: targetId }, body: body as RequestOf<typeof recordTip>['body'] });
}

/** The person has seen a refused press and settles it another way. */
export async function dismiss(key: string): Promise<void> {
  await dropPress(key);
  await reload();
}

export function useOutbox(): OutboxState {
  return useSyncExternalStore(
    (watch) => {
      watchers.add(watch);
      return () => watchers.delete(watch);
    },
    () => state,
  );
}

/** Keeps the outbox going while somebody is signed in: at once, when signal returns, when the app comes to the front. */
export function useOutboxOf(client: QueryClient, userId: string | undefined): void {
  useEffect(() => {
    user = userId ?? null;
    void reload();
    if (!userId) return undefined;
    const go = () => void flush(client);
    const onShow = () => {
      if (document.visibilityState === 'visible') go();
    };
    go();
    const timer = setInterval(go, 20_000);
    window.addEventListener('online', go);
    document.addEventListener('visibilitychange', onShow);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', go);
      document.removeEventListener('visibilitychange', onShow);
    };
  }, [client, userId]);
}
