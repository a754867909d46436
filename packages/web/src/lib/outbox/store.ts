import { openDB } from 'idb';
import type { DBSchema, IDBPDatabase } from 'idb';

/** A press that waits to be sent, or one that the server refused and somebody must look at. */
export interface KeptPress {
  /** The idempotency key: the server takes it once, however often it is sent. */
  key: string;
  userId: string;
  /** Order of pressing on this phone. */
  at: number;
  path: 'visit' | 'clock' | 'tip' | 'work' | 'change';
  /** The visit or job it belongs to. */
  targetId: string;
  body: Record<string, unknown>;
  /** What a person reads: "Done, Nakagawa". */
  words: string;
  /** Why the server refused it; null while it waits. */
  refused: string | null;
}

export interface Kept<T> {
  value: T;
  keptAt: string;
}

interface PhoneSchema extends DBSchema {
  presses: { key: string; value: KeptPress; indexes: { byUser: string } };
  /** Copies for a dead zone, named by user and what they are. */
  copies: { key: string; value: Kept<unknown> };
}

let opened: Promise<IDBPDatabase<PhoneSchema>> | null = null;

function phone(): Promise<IDBPDatabase<PhoneSchema>> {
  opened ??= openDB<PhoneSchema>('driprail-phone', 1, {
    upgrade(db) {
      db.createObjectStore('presses', { keyPath: 'key' }).createIndex('byUser', 'userId');
      db.createObjectStore('copies');
    },
  });
  return opened;
}

export async function keepPress(press: KeptPress): Promise<void> {
  await (await phone()).put('presses', press);
}

/** One user's presses in the order in which they were made; another's on the same phone are never touched. */
export async function keptPresses(userId: string): Promise<KeptPress[]> {
  const own = await (await phone()).getAllFromIndex('presses', 'byUser', userId);
  return own.sort((a, b) => a.at - b.at);
}

export async function dropPress(key: string): Promise<void> {
  await (await phone()).delete('presses', key);
}

/** A local copy is good for a day and a half; then it is gone, as on a lost phone. */
const COPY_LASTS_MS = 36 * 3_600_000;

export async function keepCopy(name: string, value: unknown): Promise<void> {
  await (await phone()).put('copies', { value, keptAt: new Date().toISOString() }, name);
}

export async function readCopy<T>(name: string): Promise<Kept<T> | null> {
  const db = await phone();
  const kept = (await db.get('copies', name)) as Kept<T> | undefined;
  if (!kept) return null;
  if (Date.now() - Date.parse(kept.keptAt) < COPY_LASTS_MS) return kept;
  await db.delete('copies', name);
  return null;
}

/** Takes every copy off the phone; presses that wait stay for their user. */
export async function wipeCopies(): Promise<void> {
  await (await phone()).clear('copies');
}
