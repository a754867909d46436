import type { Kept } from './store.ts';
import { phone } from './store.ts';

/** The photo of a press that waits. */
export async function fileOf(key: string): Promise<Blob | undefined> {
  return (await phone()).get('files', key);
}

/** Keeps what is begun, also when the app is closed; it leaves by being pressed. */
export async function keepDraft(name: string, value: unknown): Promise<void> {
  await (await phone()).put('drafts', { value, keptAt: new Date().toISOString() }, name);
}

export async function readDraft<T>(name: string): Promise<T | null> {
  const kept = (await (await phone()).get('drafts', name)) as Kept<T> | undefined;
  return kept?.value ?? null;
}

export async function dropDraft(name: string): Promise<void> {
  await (await phone()).delete('drafts', name);
}
