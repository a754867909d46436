import { openDB } from 'idb';
import type { DBSchema, IDBPDatabase } from 'idb';

/** A press that waits to be sent, or one that the server refused and somebody must look at. */
export interface KeptPress {
  /** The idempotency key: the server takes it once, however often it is sent. */
  key: string;
  userId: string;
  /** Order of pressing on this phone. */
  at: number;
  path: 'visit' | 'clock' | 'tip' | 'payment' | 'work' | 'change' | 'walk' | 'walk_addition' | 'photo';
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
  /** Photos that wait, by their press's key. */
  files: { key: string; value: Blob };
  /** What is begun and not pressed yet, named by user and what it is. */
  drafts: { key: string; value: Kept<unknown> };
}

let opened: Promise<IDBPDatabase<PhoneSchema>> | null = null;

/** The phone's own store. */
export function phone(): Promise<IDBPDatabase<PhoneSchema>> {
  opened ??= openDB<PhoneSchema>('driprail-phone', 2, {
    upgrade(db, from) {
      if (from < 1) {
        db.createObjectStore('presses', { keyPath: 'key' }).createIndex('byUser', 'userId');
        db.createObjectStore('copies');
      }
      db.createObjectStore('files');
      db.createObjectStore('drafts');
    },
    // Another tab brings a newer shape: it must not wait for this one.
    blocking: (_from, _to, event) => {
      (event.target as IDBDatabase).close();
      opened = null;
    },
  });
  return opened;
}

/** Keeps a press, and its file if it has one: both or neither. @throws QuotaExceededError when the phone is full */
export async function keepPress(press: KeptPress, file?: Blob): Promise<void> {
  const db = await phone();
  const tx = db.transaction(['presses', 'files'], 'readwrite');
  const writes: Promise<unknown>[] = [tx.objectStore('presses').put(press)];
  if (file) writes.push(tx.objectStore('files').put(file, press.key));
  // All are watched: an unwatched one would be reported as unhandled when the phone is full.
  await Promise.all([...writes, tx.done]);
}

/** One user's presses in the order in which they were made; another's on the same phone are never touched. */
export async function keptPresses(userId: string): Promise<KeptPress[]> {
  const own = await (await phone()).getAllFromIndex('presses', 'byUser', userId);
  return own.sort((a, b) => a.at - b.at);
}

export async function dropPress(key: string): Promise<void> {
  const tx = (await phone()).transaction(['presses', 'files'], 'readwrite');
  await Promise.all([tx.objectStore('presses').delete(key), tx.objectStore('files').delete(key), tx.done]);
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
