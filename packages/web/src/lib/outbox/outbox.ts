import { useEffect, useSyncExternalStore } from 'react';
import type { QueryClient } from '@tanstack/react-query';
import type { recordPayment } from '@driprail/shared/contracts/billing.contract';
import type { postClockAction } from '@driprail/shared/contracts/clock.contract';
import type { Endpoint, RequestOf } from '@driprail/shared/contracts/endpoint';
import type { recordTip } from '@driprail/shared/contracts/jobs.contract';
import type { postJobChange, postWorkAction } from '@driprail/shared/contracts/job-work.contract';
import {
  postClockActionAt,
  postJobChangeAt,
  postVisitActionAt,
  postWorkActionAt,
  recordPaymentAt,
  recordTipAt,
} from '@driprail/shared/contracts/phone-addresses';
import type { postVisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import { ApiError, call } from '../call.ts';
import { changeCopies, inList } from './keep-answer.ts';
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
  payment: ['bills'],
  work: ['work'],
  change: ['work', 'run-sheet'],
  walk: ['walk-round', 'run-sheet'],
  walk_addition: ['walk-round', 'run-sheet'],
  photo: ['walk-round'],
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
export async function press(
  client: QueryClient,
  made: Omit<KeptPress, 'userId' | 'at' | 'refused'>,
  file?: Blob,
): Promise<void> {
  if (user === null) throw new Error('sign in first');
  await keepPress({ ...made, userId: user, at: Date.now(), refused: null }, file);
  await reload();
  void flush(client);
}

/** Sends what waits, one after another, marks before photos; stops at the first that does not arrive. */
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
    for (let next = nextToSend(); next; next = nextToSend()) {
      const outcome = await sendOne(next);
      if (outcome === 'waits') break;
      if (outcome === 'more') continue;
      // The newer state first: what waited is still shown as done while it comes.
      await Promise.all(touched[next.path].map((key) => client.invalidateQueries({ queryKey: [key] })));
      await reload();
    }
  } finally {
    show({ isSending: false });
  }
}

/** In order, but a photo never holds up a mark: it carries the time it was taken, and goes on piece by piece between them. */
function nextToSend(): KeptPress | undefined {
  return state.waiting.find(({ path }) => path !== 'photo') ?? state.waiting[0];
}

/** Whether the server has it, be it with a refusal; has a piece of it; or was not reached. */
type Sent = 'done' | 'more' | 'waits';

async function sendOne(kept: KeptPress): Promise<Sent> {
  try {
    if (await send(kept)) {
      await reload();
      return 'more';
    }
    await dropPress(kept.key);
    return 'done';
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    // No signal, a server that restarts, or a session that ended: it waits.
    if (error.status === 0 || error.status >= 500 || error.status === 401 || error.status === 429) return 'waits';
    await keepPress({ ...kept, refused: error.message });
    return 'done';
  }
}

/** @returns whether there is more of it to send */
async function send(kept: KeptPress): Promise<boolean> {
  const { path, targetId, body, userId } = kept;
  const params = { id: targetId };
  switch (path) {
    case 'visit': {
      const { visit } = await call(postVisitActionAt, { params, body: body as Body<typeof postVisitAction> });
      await changeCopies(`${userId}:run-sheet:`, inList('visits', 'id', visit));
      return false;
    }
    case 'work': {
      const { work } = await call(postWorkActionAt, { params, body: body as Body<typeof postWorkAction> });
      await changeCopies(`${userId}:work:`, inList('works', 'visitId', work));
      return false;
    }
    case 'change': {
      const { work } = await call(postJobChangeAt, { params, body: body as Body<typeof postJobChange> });
      await changeCopies(`${userId}:work:`, inList('works', 'visitId', work));
      return false;
    }
    case 'clock': {
      const { clock } = await call(postClockActionAt, { body: body as Body<typeof postClockAction> });
      // Somebody else's clock is not in the copies.
      if ('forPersonId' in body) return false;
      await changeCopies(`${userId}:clock`, (value) => ({ ...value, clock }));
      await changeCopies(`${userId}:run-sheet:`, (value) => (value['clock'] ? { ...value, clock } : null));
      return false;
    }
    case 'tip':
      await call(recordTipAt, { params, body: body as Body<typeof recordTip> });
      return false;
    case 'payment': {
      const { bill } = await call(recordPaymentAt, { params, body: body as Body<typeof recordPayment> });
      await changeCopies(`${userId}:bills:`, inList('bills', 'jobId', bill));
      return false;
    }
    case 'walk':
    case 'walk_addition':
    case 'photo':
      return (await import('./send-walk.ts')).sendWalk(kept);
  }
}

type Body<E extends Endpoint> = RequestOf<E>['body'];

/** The person has seen a refused press and settles it another way. */
export async function dismiss(key: string): Promise<void> {
  await dropPress(key);
  await reload();
}

/** What waits now, for a question that is asked outside of a screen. */
export function waitingPresses(): KeptPress[] {
  return state.waiting;
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
