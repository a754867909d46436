import { ApiError } from '../call.ts';
import { keepCopy, readCopy } from './store.ts';

/** Fetches and keeps a copy on the phone; without signal the copy answers, while it is good. */
export async function orKept<T>(name: string, fetch: () => Promise<T>): Promise<T> {
  try {
    const fresh = await fetch();
    await keepCopy(name, fresh).catch(() => undefined);
    return fresh;
  } catch (error) {
    if (!(error instanceof ApiError) || (error.status !== 0 && error.status < 500)) throw error;
    const kept = await readCopy<T>(name).catch(() => null);
    if (!kept) throw error;
    return kept.value;
  }
}
