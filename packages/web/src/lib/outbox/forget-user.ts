import type { KeptPress } from './store.ts';
import { keptPresses, phone } from './store.ts';

/** Presses that show a customer's car or signature. */
const shows: readonly KeptPress['path'][] = ['walk', 'walk_addition', 'photo'];

/**
 * As on a lost phone: copies, and one user's drafts, photos, and presses with marks or initials go. Their presses of
 * progress and hours stay for their next sign-in, since pay stands on them; another's are never touched.
 */
export async function forgetUser(userId: string): Promise<void> {
  const shown = (await keptPresses(userId)).filter(({ path }) => shows.includes(path));
  const tx = (await phone()).transaction(['copies', 'drafts', 'presses', 'files'], 'readwrite');
  const drafts = tx.objectStore('drafts');
  await Promise.all([
    tx.objectStore('copies').clear(),
    drafts.delete(IDBKeyRange.bound(`${userId}:`, `${userId};`, false, true)),
    ...shown.flatMap(({ key }) => [tx.objectStore('presses').delete(key), tx.objectStore('files').delete(key)]),
    tx.done,
  ]);
}
